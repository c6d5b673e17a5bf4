const own = "^(app|features|server|shared)/";
const test = "\\.test\\.tsx?$";

/** Files under `from` may reach, inside the project, only `to`. */
const only = (name, comment, from, to) => ({
  name,
  comment,
  severity: "error",
  from: { path: from, pathNot: test },
  to: { path: own, pathNot: to },
});

/** One module of the engine may reach itself and the named ones below it. */
const layer = (name, ...below) => ({
  name: `engine-layer-${name}`,
  comment: "The engine's modules build on one another in one direction only.",
  severity: "error",
  from: { path: `^shared/${name}/`, pathNot: test },
  to: { path: "^shared/", pathNot: `^shared/(${[name, ...below].join("|")})/` },
});

const enginePackages = "node_modules/(pitchy|tonal|@tonaljs|midi-file|saxes|xmlchars|fflate|ts-fsrs)/";
const domain = "^server/(?!http/|database/|cli/|setup/)([^/]+)/";

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    only("shared-sees-shared", "The engine and the contracts know no client and no server.", "^shared/", "^shared/"),
    {
      name: "engine-packages",
      comment: "The engine is pure: of packages only pitch, theory and file parsers.",
      severity: "error",
      from: { path: "^shared/(?!contract/)", pathNot: test },
      to: { dependencyTypes: ["npm", "npm-dev", "core", "npm-no-pkg"], pathNot: enginePackages },
    },
    {
      name: "contract-packages",
      comment: "Contracts are zod schemas and nothing else.",
      severity: "error",
      from: { path: "^shared/contract/", pathNot: test },
      to: { dependencyTypes: ["npm", "npm-dev", "core", "npm-no-pkg"], pathNot: "node_modules/zod/" },
    },
    {
      name: "engine-without-contract",
      comment: "What travels between client and server does not shape the engine.",
      severity: "error",
      from: { path: "^shared/(?!contract/)", pathNot: test },
      to: { path: "^shared/contract/" },
    },
    layer("signal"),
    layer("music"),
    layer("voice", "signal", "music"),
    layer("songs", "signal", "music"),
    layer("keys", "signal", "music", "voice", "songs"),
    layer("instruments", "signal", "music"),
    layer("ways", "signal", "music", "voice", "songs", "keys", "instruments"),
    layer("coach", "signal", "music", "voice", "songs", "keys", "instruments", "ways"),
    layer("sheets", "signal", "music", "voice", "songs", "keys", "instruments", "ways"),
    only("ui-sees-shared", "The kit of parts knows no feature.", "^features/ui/", "^(features/ui|shared)/"),
    only(
      "api-sees-shared",
      "The client's way to the server knows no feature.",
      "^features/api/",
      "^(features/api|shared)/",
    ),
    only(
      "span-sees-ui",
      "The span pictures stand on the kit alone.",
      "^features/span/",
      "^(features/(span|ui)|shared)/",
    ),
    only(
      "features-stay-apart",
      "Where two features meet, the route passes one's result to the other.",
      "^features/(?!ui/|api/|span/)([^/]+)/",
      "^(features/($1|ui|api|span)|shared)/",
    ),
    only("app-composes-features", "Routes place features on a page.", "^app/", "^(app|features|shared)/"),
    only("server-sees-shared", "The server knows no client code.", "^server/", "^(server|shared)/"),
    {
      name: "server-domains-meet-at-services",
      comment: "A domain reaches another only through its service or entity.",
      severity: "error",
      from: { path: domain, pathNot: test },
      to: { path: domain, pathNot: ["^server/$1/", "\\.(service|entity)\\.ts$"] },
    },
    {
      name: "http-knows-no-domain",
      comment: "What every route shares depends on none of them.",
      severity: "error",
      from: { path: "^server/http/", pathNot: test },
      to: { path: domain },
    },
    {
      name: "no-cycle",
      comment: "No file depends on itself by a detour.",
      severity: "error",
      from: {},
      to: { circular: true },
    },
  ],
  options: {
    doNotFollow: { path: "node_modules" },
    exclude: { path: "^(dist|build|\\.expo)/" },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: "tsconfig.json" },
    enhancedResolveOptions: {
      exportsFields: ["exports"],
      conditionNames: ["import", "require", "node", "default", "types"],
    },
  },
};
