// The commands of package.json. Each does its own set-up, so that a machine with only Node can run it.
import { spawn } from "node:child_process";
import { randomBytes } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import { fileURLToPath, pathToFileURL } from "node:url";
import { runChecks } from "./checks.mjs";
import { ensureDebianPackages } from "./debian.mjs";
import { ensurePackages } from "./packages.mjs";
import { CLUSTERS, ensureCluster, stopCluster } from "./postgres.mjs";
import { ensureWebClient } from "./webClient.mjs";

const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), "..", "..");
const say = (text) => process.stderr.write(`${text}\n`);
const typescript = ["--import", pathToFileURL(path.join(root, "node_modules", "tsx", "dist", "loader.mjs")).href];
const server = [...typescript, path.join(root, "server", "main.ts")];

const commands = {
  async start() {
    await ensurePackages({ root, say });
    const database = await ownDatabase();
    await ensureWebClient({ root, say });
    await together([{ args: server, env: settings(database) }], database);
  },

  async dev() {
    await ensurePackages({ root, say });
    const database = await ownDatabase();
    const port = Number(process.env.PORT ?? 8400);
    const api = String(port + 1);
    const expo = path.join(root, "node_modules", "expo", "bin", "cli");
    const quiet = { EXPO_NO_TELEMETRY: "1", EXPO_OFFLINE: "1", BROWSER: "none", API_PORT: api };
    say(`The client will be at http://localhost:${port}; it passes /api on to port ${api}.`);
    await together(
      [
        {
          args: ["--watch", ...server],
          env: { PUBLIC_URL: `http://localhost:${port}`, ...settings(database), PORT: api },
        },
        { args: [expo, "start", "--web", "--localhost", "--port", String(port)], env: quiet },
      ],
      database,
    );
  },

  async test() {
    await ensurePackages({ root, say });
    if (ensureDebianPackages(["chromium"], say).length > 0 && !fs.existsSync("/usr/bin/chromium")) {
      throw new Error("The browser journeys need Debian's package chromium: sudo apt-get install chromium");
    }
    const instruments = [
      "fluidsynth",
      "fluid-soundfont-gm",
      "espeak-ng",
      "ffmpeg",
      "abcmidi",
      "abcm2ps",
      "poppler-utils",
    ];
    const absent = ensureDebianPackages(instruments, say);
    if (absent.length > 0) say(`Not to be had here, so the tests that need them do not run: ${absent.join(", ")}`);
    const cluster = await ensureCluster({ root, ...CLUSTERS.test });
    try {
      process.exitCode = await runChecks({
        root,
        say,
        databaseUrl: cluster.url("postgres"),
        only: process.argv.slice(3),
      });
    } finally {
      if (!cluster.up) stopCluster({ root, name: "test" });
    }
  },

  pictures: () => onStage("takePictures.ts"),
  "bench:shelf": () => onStage("shelfBench.ts"),

  async engine() {
    await ensurePackages({ root, say });
    const args = [...typescript, path.join(root, "server", "cli", "engine.ts"), ...process.argv.slice(3)];
    await together([{ args, env: {}, cwd: process.env.INIT_CWD ?? process.cwd() }]);
  },

  async "bench:voice"() {
    await ensurePackages({ root, say });
    const programs = ["praat", "aubio-tools", "fluidsynth", "fluid-soundfont-gm", "espeak-ng", "ffmpeg"];
    const absent = ensureDebianPackages(programs, say);
    if (absent.length > 0) say(`Not to be had here, so what needs them is left out: ${absent.join(", ")}`);
    const args = [...typescript, path.join(root, "__tests__", "bench", "voiceBench.ts"), ...process.argv.slice(3)];
    await together([{ args, env: {} }]);
  },

  async "bench:key"() {
    await ensurePackages({ root, say });
    const absent = ensureDebianPackages(["abcmidi", "abcm2ps"], say);
    if (absent.length > 0) say(`Not to be had here, so what needs them is left out: ${absent.join(", ")}`);
    const args = [...typescript, path.join(root, "__tests__", "bench", "keyBench.ts"), ...process.argv.slice(3)];
    await together([{ args, env: {} }]);
  },

  async "bench:tuner"() {
    await ensurePackages({ root, say });
    const args = [...typescript, path.join(root, "__tests__", "bench", "tunerBench.ts"), ...process.argv.slice(3)];
    await together([{ args, env: {} }]);
  },

  async "bench:keys"() {
    await ensurePackages({ root, say });
    const args = [...typescript, path.join(root, "__tests__", "bench", "keysBench.ts"), ...process.argv.slice(3)];
    await together([{ args, env: {} }]);
  },

  async "bench:ways"() {
    await ensurePackages({ root, say });
    const args = [...typescript, path.join(root, "__tests__", "bench", "waysBench.ts"), ...process.argv.slice(3)];
    await together([{ args, env: {} }]);
  },
};

/** Runs a program that plays with the whole product in a browser. */
async function onStage(program) {
  await ensurePackages({ root, say });
  const cluster = await ensureCluster({ root, ...CLUSTERS.test });
  await ensureWebClient({ root, say });
  const args = [...typescript, path.join(root, "__tests__", "journeys", program)];
  const stop = () => cluster.up || stopCluster({ root, name: "test" });
  await together([{ args, env: { TEST_DATABASE_URL: cluster.url("postgres") } }], { stop });
}

/** The database that the environment names, else one of our own on loopback. */
async function ownDatabase() {
  if (process.env.DATABASE_URL) return { url: process.env.DATABASE_URL, stop: () => {} };
  say("Starting PostgreSQL");
  const cluster = await ensureCluster({ root, ...CLUSTERS.dev });
  return { url: cluster.url(CLUSTERS.dev.databases[0]), stop: () => cluster.up || stopCluster({ root, name: "dev" }) };
}

function settings(database) {
  return { DATABASE_URL: database.url, TOKEN_SECRET: process.env.TOKEN_SECRET ?? keptSecret() };
}

/** A signing key of this checkout, so that people stay signed in over a restart. */
function keptSecret() {
  const file = path.join(root, ".data", "token-secret");
  if (!fs.existsSync(file)) fs.writeFileSync(file, randomBytes(48).toString("base64url"), { mode: 0o600 });
  return fs.readFileSync(file, "utf8");
}

/** Runs programs side by side until one ends or a signal comes; then ends the others and what we started for them. */
async function together(programs, database) {
  const children = programs.map(({ args, env, cwd = root }) =>
    spawn(process.execPath, args, {
      cwd,
      stdio: "inherit",
      env: { ...process.env, TSX_TSCONFIG_PATH: path.join(root, "tsconfig.json"), ...env },
    }),
  );
  const endAll = (signal) => children.forEach((child) => child.exitCode === null && child.kill(signal));
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(signal, () => endAll("SIGTERM"));
  const ends = children.map((child) => new Promise((done) => child.on("exit", (code) => done(code ?? 0))));
  process.exitCode = await Promise.race(ends);
  endAll("SIGTERM");
  await Promise.all(ends);
  database?.stop();
}

const command = commands[process.argv[2]];
try {
  if (!command) throw new Error(`Name a command: ${Object.keys(commands).join(", ")}`);
  await command();
} catch (error) {
  say(error.message);
  process.exitCode = 1;
}
