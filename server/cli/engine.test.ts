import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";

const root = resolve(__dirname, "..", "..");
const folder = mkdtempSync(join(tmpdir(), "engine-"));
afterAll(() => rmSync(folder, { recursive: true }));

/** The command as it is called from another folder, without npm. */
function engine(...args: string[]) {
  const env: NodeJS.ProcessEnv = { ...process.env };
  delete env.INIT_CWD;
  const run = join(root, "server", "setup", "run.mjs");
  const { status, stdout, stderr } = spawnSync(process.execPath, [run, "engine", ...args], {
    cwd: folder,
    env,
    encoding: "utf8",
  });
  return { status, lines: stdout.split("\n").filter((line) => line !== ""), told: stderr.trim().split("\n") };
}

test("looks files up where it is called, and prints the good ones beside a bad one", () => {
  writeFileSync(join(folder, "slip.txt"), "D G A D");
  const { status, lines, told } = engine("key", "gone.txt", "slip.txt");
  expect(lines.map((line) => JSON.parse(line) as object)).toMatchObject([{ file: "slip.txt", tonic: "D" }]);
  expect(told).toEqual(["gone.txt: there is no such file. 1 of 2 files could not be used."]);
  expect(status).toBe(2);
}, 60_000);

test("--help tells how every verb is used", () => {
  const { status, lines } = engine("--help");
  expect(status).toBe(0);
  for (const verb of ["take", "melody", "key", "transpose", "keys", "shapes", "ways", "instruments", "tension"])
    expect(lines.some((line) => line.split(" ")[0] === verb)).toBe(true);
}, 60_000);

test.each(["take", "melody", "key"])(
  "a missing file is told in the same words by %s",
  (verb) => {
    expect(engine(verb, "x.wav").told).toEqual(["x.wav: there is no such file."]);
  },
  60_000,
);
