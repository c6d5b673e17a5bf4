// Plain Node, nothing installed yet: brings node_modules up to the lock file.
import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import { locked } from "./postgres.mjs";

/** Installs the packages of the lock file when they are not the ones that lie there; the stamp is written last. */
export async function ensurePackages({ root, say }) {
  const lockFile = fs.readFileSync(path.join(root, "package-lock.json"));
  const wanted = createHash("sha256").update(lockFile).update(process.version).digest("hex");
  const stamp = path.join(root, "node_modules", ".larkspan-stamp");
  const current = () => fs.existsSync(stamp) && fs.readFileSync(stamp, "utf8") === wanted;
  if (current()) return;
  fs.mkdirSync(path.join(root, ".data"), { recursive: true });
  await locked(path.join(root, ".data", "install.lock"), () => {
    if (current()) return;
    say("Installing packages (about a minute, once)");
    const args = ["ci", "--include=dev", "--ignore-scripts", "--no-audit", "--no-fund", "--loglevel=error"];
    const npm = process.env.npm_execpath ? [process.execPath, process.env.npm_execpath] : ["npm"];
    const run = spawnSync(npm[0], [...npm.slice(1), ...args], { cwd: root, stdio: ["ignore", 2, 2] });
    if (run.status !== 0) throw new Error("npm could not install the packages; see its message above.");
    fs.writeFileSync(stamp, wanted);
  });
}
