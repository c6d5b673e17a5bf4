import { z } from "zod";
import type { Api } from "./api";
import { docsPage } from "./docsPage";
import { type OpenApiDocument, openApiDocument } from "./openApi";

/** The API's description of itself: for programs, and as a page for people. Register it last. */
export function descriptionRoutes(api: Api): void {
  let document: OpenApiDocument | undefined;
  const current = () => (document ??= openApiDocument(api.operations));
  const common = { method: "get", tag: "service", signedIn: false } as const;

  api.route(
    {
      ...common,
      path: "/openapi.json",
      summary: "This description, as OpenAPI 3.1",
      answers: {
        200: {
          description: "The document.",
          schema: { name: "OpenApi", schema: z.looseObject({ openapi: z.string() }) },
        },
      },
    },
    (_req, res) => {
      res.json(current());
    },
  );
  api.route(
    {
      ...common,
      path: "/docs",
      summary: "This description, as a page",
      answers: { 200: { description: "The page, as HTML." } },
    },
    (_req, res) => {
      res.type("html").send(docsPage(current()));
    },
  );
}
