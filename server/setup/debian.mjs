// Debian packages that a command of ours needs, installed when they are missing and we may.
import { spawnSync } from "node:child_process";
import fs from "node:fs";

/** Packages whose examples are read by tests and trials. */
const exampled = ["abcmidi", "abcm2ps"];
/** Small systems keep documents out of every package; the examples come all the same. */
const withExamples = exampled.map((name) => `Dpkg::Options::=--path-include=${examples(name)}*`);

/** Makes sure that the named Debian packages are there; returns the names of those that could not be had. */
export function ensureDebianPackages(names, say) {
  const missing = names.filter((name) => !complete(name));
  if (missing.length === 0) return [];
  const may = process.getuid?.() === 0 ? [] : spawnSync("sudo", ["-n", "true"]).status === 0 ? ["sudo", "-n"] : null;
  if (!may || spawnSync("which", ["apt-get"]).status !== 0) return missing;
  say(`Installing from Debian: ${missing.join(", ")}`);
  const apt = (...args) => {
    const line = [
      ...may,
      "env",
      "DEBIAN_FRONTEND=noninteractive",
      "apt-get",
      "-q",
      ...["DPkg::Lock::Timeout=300", ...withExamples].flatMap((option) => ["-o", option]),
      ...args,
    ];
    return spawnSync(line[0], line.slice(1), { encoding: "utf8", maxBuffer: 1 << 26 });
  };
  apt("update");
  const run = apt("install", "-y", "--no-install-recommends", "--reinstall", ...missing);
  if (run.status !== 0) say(run.stderr.trim().split("\n").slice(-3).join("\n"));
  return missing.filter((name) => !complete(name));
}

function complete(name) {
  return installed(name) && (!exampled.includes(name) || fs.existsSync(examples(name)));
}

function examples(name) {
  return `/usr/share/doc/${name}/examples`;
}

function installed(name) {
  const query = spawnSync("dpkg-query", ["-W", "-f=${Status}", name], { encoding: "utf8" });
  return query.status === 0 && query.stdout.includes("install ok installed");
}
