// All checks of the house, and one closing line over them.
import { spawn } from "node:child_process";
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { ensureWebClient } from "./webClient.mjs";

/** More failed files than this, of the thirty and more that share two cores, are no matter of load. */
const mostAskedAgain = 6;

/** Runs every check (or only those named) and prints the closing line; returns the exit code. */
export async function runChecks({ root, say, databaseUrl, only }) {
  const env = {
    ...process.env,
    TEST_DATABASE_URL: databaseUrl,
    NODE_ENV: "test",
    EXPO_NO_TELEMETRY: "1",
    EXPO_OFFLINE: "1",
  };
  const bin = (...parts) => path.join(root, "node_modules", ...parts);
  const tally = { passed: 0, failed: 0 };
  const failures = [];

  const node = (args) =>
    new Promise((done) => {
      const child = spawn(process.execPath, args, { cwd: root, env, stdio: ["ignore", "pipe", "pipe"] });
      let output = "";
      for (const stream of [child.stdout, child.stderr]) stream.on("data", (data) => (output += data));
      child.on("exit", (code) => done({ code, output }));
    });

  const step = (name, run) => ({ name, run });
  const plain = (name, ...args) =>
    step(name, async () => {
      const { code, output } = await node(args);
      return { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1, output };
    });
  const askJest = async (projects, more) => {
    const report = path.join(os.tmpdir(), `larkspan-${process.pid}-${projects.join("-")}-${Date.now()}.json`);
    const { code, output } = await node([
      bin("jest", "bin", "jest.js"),
      ...more,
      ...["--selectProjects", ...projects, "--json", "--outputFile", report],
    ]);
    if (!fs.existsSync(report)) return { passed: 0, failed: 1, output, failedFiles: [] };
    const result = JSON.parse(fs.readFileSync(report, "utf8"));
    fs.rmSync(report);
    const failed = result.numFailedTests + result.numRuntimeErrorTestSuites;
    const failedFiles = result.testResults.filter(({ status }) => status === "failed");
    return { passed: result.numPassedTests, failed: failed || (code === 0 ? 0 : 1), output, failedFiles };
  };
  const jest = (name, projects, ...more) => step(name, () => askJest(projects, more));
  // What plays in real time or measures time shares two cores with others. A file that failed then is asked once more,
  // alone, and that counts.
  const timed = (name, projects, ...more) =>
    step(name, async () => {
      const first = await askJest(projects, more);
      const files = first.failedFiles.map((file) => file.name);
      if (first.failed === 0 || files.length === 0 || files.length > mostAskedAgain) return first;
      say(`       ${name}: ${files.map((file) => path.relative(root, file)).join(", ")} once more, alone`);
      const again = await askJest(projects, ["-w", "1", "--runTestsByPath", ...files]);
      const passedThere = first.failedFiles
        .flatMap((file) => file.assertionResults)
        .filter(({ status }) => status === "passed").length;
      return {
        passed: first.passed - passedThere + again.passed,
        failed: again.failed,
        output: again.failed === 0 ? again.output : `${first.output}\n--- once more, alone ---\n${again.output}`,
      };
    });

  // The longest first: two at a time on two cores.
  const sideBySide = [
    timed("engine", ["engine"], "-w", "1"),
    jest("client", ["client"], "-w", "1"),
    timed("server", ["server"], "-w", "1"),
    plain("types", bin("typescript", "bin", "tsc"), "--noEmit"),
    plain("types of the pure engine", bin("typescript", "bin", "tsc"), "-p", "tsconfig.shared.json"),
    plain("lint", bin("eslint", "bin", "eslint.js"), ".", "--max-warnings", "0"),
    plain(
      "dependency rules",
      bin("dependency-cruiser", "bin", "dependency-cruise.mjs"),
      "--config",
      ".dependency-cruiser.cjs",
      ...["app", "features", "server", "shared"],
    ),
    plain("dead code", bin("knip", "bin", "knip.js")),
    jest("house", ["house"], "-w", "1"),
    step("web client", async () => {
      try {
        await ensureWebClient({ root, say: () => {} });
        return { passed: 1, failed: 0, output: "" };
      } catch (error) {
        return { passed: 0, failed: 1, output: error.message };
      }
    }),
  ];
  // They need the built client; what measures time runs alone.
  const pace = "capturePace";
  const afterwards = [
    timed("browser journeys", ["journeys"], "-w", "2", "--testPathIgnorePatterns", pace),
    timed("browser pace", ["journeys"], "-w", "1", "--testPathPattern", pace),
  ];

  const take = async (steps) => {
    for (let next = steps.shift(); next; next = steps.shift()) {
      const begun = performance.now();
      const { passed, failed, output } = await next.run();
      tally.passed += passed;
      tally.failed += failed;
      const seconds = ((performance.now() - begun) / 1000).toFixed(1);
      say(`${failed ? "FAILED" : "ok    "} ${next.name}: ${passed} passed, ${failed} failed (${seconds} s)`);
      if (failed) failures.push(`\n--- ${next.name} ---\n${output.trim()}`);
    }
  };
  const wanted = (steps) => steps.filter(({ name }) => only.length === 0 || only.includes(name));
  const queue = wanted(sideBySide);
  await Promise.all([take(queue), take(queue)]);
  await take(wanted(afterwards));
  for (const failure of failures) say(failure);
  process.stdout.write(`${tally.passed} passed, ${tally.failed} failed\n`);
  return tally.failed === 0 && tally.passed > 0 ? 0 : 1;
}
