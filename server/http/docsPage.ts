import type { DescribedOperation, OpenApiDocument } from "./openApi";

export function docsPage(document: OpenApiDocument): string {
  return (
    `<!doctype html><title>${document.info.title}</title>` +
    String(Object.values(document.paths).flatMap((p) => Object.values<DescribedOperation>(p)).length)
  );
}
