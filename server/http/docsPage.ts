import type { DescribedOperation, OpenApiDocument } from "./openApi";

const style = `
:root{color-scheme:light dark;--paper:#FBF6EC;--card:#FFFFFF;--ink:#241C33;--soft:#5D5370;--line:#E3DACB;--plum:#6A2C70;--lagoon:#1F7A74;--honey:#8A5A08;--brick:#A63A2B}
@media(prefers-color-scheme:dark){:root{--paper:#17131F;--card:#221C2D;--ink:#F3ECDF;--soft:#B9AEC9;--line:#3A3148;--plum:#D79AE0;--lagoon:#63CFC4;--honey:#F0BE5A;--brick:#FF9C8B}}
*{box-sizing:border-box}
body{margin:0;background:var(--paper);color:var(--ink);font:16px/1.45 Figtree,system-ui,sans-serif}
main{max-width:860px;margin:0 auto;padding:32px 16px 64px}
h1,h2{font-family:"Bricolage Grotesque",Figtree,system-ui,sans-serif;line-height:1.1;margin:0}
h1{font-size:36px}
h2{font-size:26px;margin:36px 0 12px;padding-top:14px;border-top:1.5px solid var(--ink)}
p{margin:8px 0;max-width:68ch}
a{color:var(--plum)}
nav{display:flex;flex-wrap:wrap;gap:4px 16px;margin-top:16px}
nav a{padding:8px 0}
code,pre{font-family:"Sometype Mono",ui-monospace,monospace;font-size:14px}
pre{margin:8px 0 0;padding:12px;overflow-x:auto;background:var(--paper);border:1px solid var(--line);border-radius:10px}
details{background:var(--card);border:1px solid var(--line);border-radius:14px;margin-bottom:8px}
summary{display:grid;grid-template-columns:68px minmax(0,1fr);gap:0 12px;padding:12px 16px;min-height:48px;cursor:pointer;border-radius:14px}
summary::-webkit-details-marker{display:none}
summary b{font:600 14px/23px "Sometype Mono",ui-monospace,monospace;text-transform:uppercase}
summary code{font-weight:600;overflow-wrap:anywhere}
summary span{grid-column:2;color:var(--soft);font-size:14px}
:focus-visible{outline:2px solid var(--plum);outline-offset:3px}
.get{color:var(--lagoon)}.post{color:var(--plum)}.put{color:var(--honey)}.delete{color:var(--brick)}
.inside{padding:0 16px 16px}
table{border-collapse:collapse;width:100%;margin-top:8px;font-size:14px}
th,td{text-align:left;vertical-align:top;padding:8px 12px 8px 0;border-top:1px solid var(--line)}
th{font-weight:600;white-space:nowrap;width:68px}
@media(min-width:640px){summary{grid-template-columns:68px 250px minmax(0,1fr)}summary span{grid-column:3}}
`;

/** The API for people to read: one page of HTML without scripts. */
export function docsPage(document: OpenApiDocument): string {
  const { info, tags } = document;
  const operations = Object.entries(document.paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, operation]) => ({ path, method, operation })),
  );
  const sections = tags.map(({ name }) => {
    const own = operations.filter(({ operation }) => operation.tags.includes(name));
    return `<section><h2 id="${text(name)}">${title(name)}</h2>${own.map((one) => described(one.method, one.path, one.operation)).join("")}</section>`;
  });
  const schemas = Object.entries(document.components.schemas).map(
    ([name, schema]) => `<details id="schema-${text(name)}"><summary><b>JSON</b><code>${text(name)}</code></summary>
<div class="inside"><pre tabindex="0">${text(JSON.stringify(schema, null, 2))}</pre></div></details>`,
  );
  const links = tags.map(({ name }) => `<a href="#${text(name)}">${title(name)}</a>`);
  return `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">
<title>${text(info.title)}: the API</title><style>${style}</style></head>
<body><main><h1>${text(info.title)}: the API</h1>
<p>${text(info.description)}</p>
<p>Everything is JSON, unless it says otherwise. Errors say a stable code, a sentence, and the fields to mend. The same for programs: <a href="openapi.json">openapi.json</a>.</p>
<nav aria-label="Parts">${links.join("")}<a href="#schemas">Schemas</a></nav>
${sections.join("\n")}
<section><h2 id="schemas">Schemas</h2>${schemas.join("\n")}</section>
</main></body></html>
`;
}

function described(method: string, path: string, operation: DescribedOperation): string {
  const access = operation.security.length > 0 ? "Needs an access token." : "Open to everybody.";
  const body = operation.requestBody ? `<p>Send ${schemaLink(operation.requestBody.content)}.</p>` : "";
  const asked = (operation.parameters ?? []).filter((parameter) => parameter.in === "query");
  const query =
    asked.length > 0
      ? `<p>May be asked for: ${asked.map(({ name }) => `<code>${text(String(name))}</code>`).join(", ")}.</p>`
      : "";
  const answers = Object.entries(operation.responses).map(
    ([status, { description, content }]) =>
      `<tr><th scope="row">${status}</th><td>${text(description)}</td><td>${content ? schemaLink(content) : ""}</td></tr>`,
  );
  return `<details id="${text(operation.operationId)}"><summary><b class="${method}">${method}</b><code>/api${text(path)}</code><span>${text(operation.summary)}</span></summary>
<div class="inside"><p>${access}</p>${query}${body}<table>${answers.join("")}</table></div></details>`;
}

/** Schemas stand in the text by name; "all of" names a list. */
function schemaLink(content: Record<string, unknown>): string {
  const name = /#\/components\/schemas\/(\w+)/.exec(JSON.stringify(content))?.[1];
  if (name === undefined) return text(Object.keys(content).join(", "));
  const many = JSON.stringify(content).includes('"array"');
  return `${many ? "a list of " : ""}<a href="#schema-${name}">${name}</a>`;
}

const title = (name: string) => text(name.charAt(0).toUpperCase() + name.slice(1));

function text(raw: string): string {
  return raw.replace(/[&<>"]/g, (character) => `&#${character.charCodeAt(0)};`);
}
