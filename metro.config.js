const http = require("node:http");
const path = require("node:path");
const esbuild = require("esbuild");
const { getDefaultConfig } = require("expo/metro-config");

const config = getDefaultConfig(__dirname);
config.resolver.assetExts.push("woff2");

// zod re-exports some 60 locale files; the app needs English only.
const inherited = config.resolver.resolveRequest;
config.resolver.resolveRequest = (context, name, platform) =>
  /[\\/]zod[\\/]v4[\\/]/.test(context.originModulePath) && /locales\/index\.c?js$/.test(name)
    ? { type: "empty" }
    : (inherited ?? context.resolveRequest)(context, name, platform);

// Metro moves modules that a worker shares with a page into the page's chunk, where the worker cannot reach them.
const workers = {
  "/worklets/takeWorker.js": "features/voice/recorder/worker/takeWorker.ts",
  "/worklets/guidedWorker.js": "features/voice/guided/hearing/guidedWorker.ts",
  "/worklets/tunerWorker.js": "features/instruments/tuner/hearing/tunerWorker.ts",
  "/worklets/songFileWorker.js": "features/songs/files/songFileWorker.ts",
  "/worklets/wayWorker.js": "features/ways/search/wayWorker.ts",
  "/worklets/pupilsWorker.js": "features/studio/judge/pupilsWorker.ts",
};
const bundleWorker = (address) =>
  esbuild.buildSync({
    absWorkingDir: __dirname,
    entryPoints: [workers[address]],
    outfile: path.join("public", address),
    bundle: true,
    minify: true,
    format: "iife",
    target: ["es2022"],
    logLevel: "error",
  });
for (const address of Object.keys(workers)) bundleWorker(address);

// In development /api goes to the Express server, so that the client needs no base address in either mode.
const apiPort = process.env.API_PORT ?? "8401";
config.server.enhanceMiddleware = (metro) => (req, res, next) => {
  if (Object.hasOwn(workers, req.url)) bundleWorker(req.url);
  if (!req.url.startsWith("/api/")) return metro(req, res, next);
  const onward = http.request(
    { host: "127.0.0.1", port: apiPort, path: req.url, method: req.method, headers: req.headers },
    (answer) => {
      res.writeHead(answer.statusCode, answer.headers);
      answer.pipe(res);
    },
  );
  onward.on("error", () => {
    res.statusCode = 502;
    res.end("The API is not running.");
  });
  req.pipe(onward);
};
module.exports = config;
