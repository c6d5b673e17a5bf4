import { execFileSync } from "node:child_process";
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { pathToFileURL } from "node:url";

const program = pathToFileURL(path.resolve(__dirname, "../../server/setup/chunkNames.mjs")).href;
const hash = (letter: string) => letter.repeat(32);
const made: string[] = [];

afterAll(() => {
  for (const folder of made) fs.rmSync(folder, { recursive: true });
});

/** A client as the bundler leaves it, named anew: its page, and its scripts by name. */
function built(scripts: Readonly<Record<string, string>>) {
  const dist = fs.mkdtempSync(path.join(os.tmpdir(), "larkspan-chunks-"));
  made.push(dist);
  const folder = path.join(dist, "_expo", "static", "js", "web");
  fs.mkdirSync(folder, { recursive: true });
  fs.writeFileSync(path.join(dist, "index.html"), `<script src="/_expo/static/js/web/entry-${hash("a")}.js"></script>`);
  for (const [name, text] of Object.entries(scripts)) fs.writeFileSync(path.join(folder, name), text);
  execFileSync(process.execPath, [
    "--input-type=module",
    "-e",
    `import { nameByContent } from "${program}"; nameByContent(${JSON.stringify(dist)});`,
  ]);
  const names = fs.readdirSync(folder).sort();
  return {
    page: fs.readFileSync(path.join(dist, "index.html"), "utf8"),
    scripts: Object.fromEntries(names.map((name) => [name, fs.readFileSync(path.join(folder, name), "utf8")])),
  };
}

/** Entry and layout lead to each other and to a page; what the bundler names them does not tell. */
const client = (page: string, pageHash: string) =>
  built({
    [`entry-${hash("a")}.js`]: `load("/_expo/static/js/web/_layout-${hash("b")}.js")`,
    [`_layout-${hash("b")}.js`]: `load("[id]-${hash(pageHash)}.js"),load("entry-${hash("a")}.js"),font("${hash("f")}")`,
    [`[id]-${hash(pageHash)}.js`]: page,
    [`words-${hash("e")}.js`]: "words()",
  });
const named = (scripts: object, stem: string) => Object.keys(scripts).find((name) => name.startsWith(stem))!;

test("a script that leads to another one has another name when that one has changed, and a browser keeps no old one", () => {
  const [before, after] = [client("sheet()", "c"), client("stage()", "d")];
  for (const stem of ["entry-", "_layout-", "[id]-"])
    expect(named(after.scripts, stem)).not.toBe(named(before.scripts, stem));
  expect(named(after.scripts, "words-")).toBe(named(before.scripts, "words-"));
  expect(client("sheet()", "c")).toEqual(before);
});

test("page and scripts lead to what is there, and nothing else is touched", () => {
  const { page, scripts } = client("sheet()", "c");
  expect(page).toContain(`/${named(scripts, "entry-")}"`);
  expect(scripts[named(scripts, "entry-")]).toBe(`load("/_expo/static/js/web/${named(scripts, "_layout-")}")`);
  expect(scripts[named(scripts, "_layout-")]).toBe(
    `load("${named(scripts, "[id]-")}"),load("${named(scripts, "entry-")}"),font("${hash("f")}")`,
  );
  expect(Object.keys(scripts)).toHaveLength(4);
});
