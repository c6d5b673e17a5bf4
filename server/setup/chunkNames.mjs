// Gives the client's scripts names that change with their content. Plain Node: it runs as a part of the set-up.
import { createHash } from "node:crypto";
import fs from "node:fs";
import path from "node:path";

const named = /-([0-9a-f]{32})\.js$/;
const hashOf = (...texts) => createHash("sha256").update(texts.join("\0")).digest("hex").slice(0, 32);

/**
 * Names the scripts of a built client anew. The bundler's own names leave out what a script says of the others: the entry
 * keeps its name though the scripts it leads to have new ones, and a browser that was told to keep it for ever would ask
 * for scripts that are gone.
 *
 * A script that names no other one is named after itself, one that does after itself and all scripts together: so the same
 * name is always the same content, though entry and layout name each other.
 */
export function nameByContent(dist) {
  const folder = path.join(dist, "_expo", "static", "js", "web");
  const scripts = fs
    .readdirSync(folder)
    .filter((name) => named.test(name))
    .sort()
    .map((name) => ({ name, hash: named.exec(name)[1], text: fs.readFileSync(path.join(folder, name), "utf8") }));
  const known = new Set(scripts.map(({ hash }) => hash));
  const all = hashOf(...scripts.flatMap(({ name, text }) => [name, text]));
  const leads = (text) => (text.match(/[0-9a-f]{32}/g) ?? []).some((hash) => known.has(hash));
  const renamed = new Map();
  for (const hash of known) {
    const texts = scripts.filter((script) => script.hash === hash).map(({ text }) => text);
    renamed.set(hash, texts.some(leads) ? hashOf(all, ...texts) : hashOf(...texts));
  }
  const rewrite = (text) => text.replace(/[0-9a-f]{32}/g, (hash) => renamed.get(hash) ?? hash);
  for (const { name, text } of scripts) {
    fs.rmSync(path.join(folder, name));
    fs.writeFileSync(path.join(folder, rewrite(name)), rewrite(text));
  }
  for (const page of fs.readdirSync(dist).filter((name) => name.endsWith(".html"))) {
    const file = path.join(dist, page);
    fs.writeFileSync(file, rewrite(fs.readFileSync(file, "utf8")));
  }
}
