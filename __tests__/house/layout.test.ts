import { execFileSync } from "node:child_process";
import { existsSync, readFileSync } from "node:fs";
import { basename, dirname, join } from "node:path";

const root = join(__dirname, "..", "..");
const files = execFileSync("git", ["ls-files", "--cached", "--others", "--exclude-standard"], {
  cwd: root,
  encoding: "utf8",
})
  .split("\n")
  .filter((file) => file !== "" && existsSync(join(root, file)));
const code = files.filter((file) => /^(app|features|server|shared|__tests__)\/.*\.(tsx?|mjs)$/.test(file));

/** A component is a function with a capital; other functions that hold markup are named like any noun. */
const exportsComponent = (file: string) => /export (function|const) [A-Z]/.test(readFileSync(join(root, file), "utf8"));

const top = new Set([
  ...["app", "features", "server", "shared", "assets", "fonts", "__tests__", "docs", "public", ".ci"],
  ...[
    "package.json",
    "package-lock.json",
    "tsconfig.json",
    "tsconfig.shared.json",
    "app.json",
    "README.md",
    "DEVELOPERS.md",
  ],
  ...[
    "metro.config.js",
    "babel.config.js",
    "jest.config.js",
    "eslint.config.js",
    "knip.json",
    ".dependency-cruiser.cjs",
  ],
  ...[".prettierrc.json", ".npmrc", ".gitignore", ".env.example"],
]);

test("the top level holds what the house names and nothing else", () => {
  expect([...new Set(files.map((file) => file.split("/")[0]))].filter((name) => !top.has(name ?? ""))).toEqual([]);
});

test("no file hides behind a name that says nothing", () => {
  const vague = /^(utils?|helpers?|common|lib|types|misc|index)\.(ts|tsx|mjs)$/;
  expect(code.filter((file) => vague.test(basename(file)) && !file.startsWith("app/"))).toEqual([]);
});

test("components are named in PascalCase, and other code in camelCase or noun.role", () => {
  const wrong = code.filter((file) => {
    if (file.startsWith("app/") || file.endsWith(".d.ts")) return false;
    const name = basename(file).replace(/(\.web)?(\.test)?\.(tsx?|mjs)$/, "");
    return /\.tsx$/.test(file) && exportsComponent(file)
      ? !/^[A-Z][A-Za-z0-9]*$/.test(name)
      : !/^[a-zA-Z][A-Za-z0-9]*(\.(entity|service|router|worker))?$/.test(name);
  });
  expect(wrong).toEqual([]);
});

test("app holds routes only: no tests, at most 80 lines", () => {
  const routes = files.filter((file) => file.startsWith("app/"));
  expect(routes.filter((file) => /\.test\./.test(file))).toEqual([]);
  expect(routes.filter((file) => readFileSync(join(root, file), "utf8").split("\n").length > 81)).toEqual([]);
});

test("no code file is longer than 300 lines", () => {
  expect(code.filter((file) => readFileSync(join(root, file), "utf8").split("\n").length > 301)).toEqual([]);
});

test("each shipped font lies beside its licence", () => {
  const fonts = files.filter((file) => /^fonts\/.*\.woff2$/.test(file));
  expect(fonts.length).toBeGreaterThan(0);
  const licences = files
    .filter((file) => file.startsWith("fonts/LICENSE-"))
    .map((file) => basename(file).slice("LICENSE-".length));
  expect(fonts.filter((file) => !licences.some((licence) => basename(file).startsWith(licence)))).toEqual([]);
});

test("versions are pinned exactly, and the lock file names no host", () => {
  const manifest = JSON.parse(readFileSync(join(root, "package.json"), "utf8")) as Record<
    string,
    Record<string, string>
  >;
  const versions = Object.entries({ ...manifest.dependencies, ...manifest.devDependencies });
  expect(versions.filter(([, version]) => !/^\d+\.\d+\.\d+$/.test(version))).toEqual([]);
  expect(readFileSync(join(root, "package-lock.json"), "utf8")).not.toMatch(/"resolved": "http/);
});

test("unit tests stand beside the file they test", () => {
  const strays = code.filter(
    (file) =>
      /^(features|server|shared)\/.*\.test\.tsx?$/.test(file) &&
      !["", "x"].some((x) =>
        existsSync(join(root, dirname(file), `${basename(file).replace(/\.test\.tsx?$/, "")}.ts${x}`)),
      ),
  );
  expect(strays).toEqual([]);
});
