// Builds the web client into dist/ when its sources changed, and packs its files for the wire.
import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import zlib from "node:zlib";
import { nameByContent } from "./chunkNames.mjs";
import { locked } from "./postgres.mjs";

const sources = ["app", "features", "shared", "assets", "fonts", "public"];
const configs = ["package-lock.json", "app.json", "metro.config.js", "babel.config.js", "tsconfig.json"];
/** Made by metro.config.js from the sources. */
const made = [
  "takeWorker.js",
  "guidedWorker.js",
  "tunerWorker.js",
  "songFileWorker.js",
  "wayWorker.js",
  "pupilsWorker.js",
].map((file) => path.join("public", "worklets", file));
const packed = /\.(js|css|html|svg|json|map|txt|webmanifest)$/;

/** Exports the client unless dist/ was built from the very same sources; returns the folder. */
export async function ensureWebClient({ root, say }) {
  const dist = path.join(root, "dist");
  const stamp = path.join(dist, ".built-from");
  const wanted = fingerprint(root);
  const current = () => fs.existsSync(stamp) && fs.readFileSync(stamp, "utf8") === wanted;
  if (current()) return dist;
  await locked(path.join(root, ".data", "web.lock"), () => {
    if (current()) return;
    say("Building the web client (about a minute when the sources changed)");
    const next = `${dist}.next`;
    fs.rmSync(next, { recursive: true, force: true });
    const run = spawnSync(
      process.execPath,
      [path.join(root, "node_modules", "expo", "bin", "cli"), "export", "-p", "web", "--output-dir", next],
      {
        cwd: root,
        encoding: "utf8",
        maxBuffer: 1 << 26,
        env: {
          ...process.env,
          NODE_ENV: "production",
          CI: "1",
          EXPO_NO_TELEMETRY: "1",
          EXPO_OFFLINE: "1",
          BROWSER: "none",
        },
      },
    );
    if (run.status !== 0) throw new Error(`The web client could not be built:\n${run.stdout}${run.stderr}`);
    nameByContent(next);
    for (const file of walk(next).filter((name) => packed.test(name))) pack(path.join(next, file));
    fs.writeFileSync(path.join(next, ".built-from"), wanted);
    fs.rmSync(dist, { recursive: true, force: true });
    fs.renameSync(next, dist);
  });
  return dist;
}

function pack(file) {
  const bytes = fs.readFileSync(file);
  if (bytes.length < 1024) return;
  fs.writeFileSync(`${file}.gz`, zlib.gzipSync(bytes, { level: 9 }));
  const params = { [zlib.constants.BROTLI_PARAM_QUALITY]: 11, [zlib.constants.BROTLI_PARAM_SIZE_HINT]: bytes.length };
  fs.writeFileSync(`${file}.br`, zlib.brotliCompressSync(bytes, { params }));
}

function fingerprint(root) {
  const hash = createHash("sha256");
  const files = [
    ...configs,
    path.join("server", "setup", "chunkNames.mjs"),
    ...sources.flatMap((dir) => walk(path.join(root, dir)).map((file) => path.join(dir, file))),
  ];
  for (const file of files.filter((name) => !made.includes(name) && !/\.test\.tsx?$/.test(name)).sort()) {
    hash
      .update(file)
      .update("\0")
      .update(fs.readFileSync(path.join(root, file)))
      .update("\0");
  }
  return hash.digest("hex");
}

function walk(dir) {
  if (!fs.existsSync(dir)) return [];
  return fs
    .readdirSync(dir, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(dir, path.join(entry.parentPath ?? entry.path, entry.name)));
}
