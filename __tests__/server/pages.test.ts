import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { brotliCompressSync, gzipSync } from "node:zlib";
import request from "supertest";
import { clientRoutes } from "../../server/http/clientRoutes";
import { startTestServer, type TestServer } from "./testServer";

const page = "<!doctype html><title>Larkspan</title><div id=root></div>";
const script = `console.log(${JSON.stringify("span ".repeat(400))})`;
const entry = "/_expo/static/js/web/entry-0123456789abcdef0123456789abcdef.js";

let directory: string;
let server: TestServer;
beforeAll(async () => {
  directory = mkdtempSync(path.join(tmpdir(), "larkspan-client-"));
  const write = (file: string, content: string, packed = false) => {
    const full = path.join(directory, file);
    mkdirSync(path.dirname(full), { recursive: true });
    writeFileSync(full, content);
    if (packed) writeFileSync(`${full}.br`, brotliCompressSync(content));
    if (packed) writeFileSync(`${full}.gz`, gzipSync(content));
  };
  write("index.html", page, true);
  write(entry, script, true);
  write("worklets/listen.js", "registerProcessor()");
  write("assets/fonts/music.0123456789abcdef0123456789abcdef.woff2", "font");
  write("assets/close.0123456789abcdef0123456789abcdef@2x.png", "image");
  write(".secret", "hidden");
  writeFileSync(`${directory}-beside`, "outside");
  server = await startTestServer({ staticDir: directory });
});
afterAll(async () => {
  await server.close();
  rmSync(directory, { recursive: true });
  rmSync(`${directory}-beside`);
});

const get = (address: string, encoding = "identity") =>
  request(server.app).get(address).set("Accept-Encoding", encoding);

const shared = clientRoutes.filter((route) => route.includes(":token"));

it.each(clientRoutes.filter((route) => !shared.includes(route)))("shows the client's page at %s", async (route) => {
  const address = route.replaceAll(":id", "6b273a3d-f63c-4f39-8493-f88da85a1e6a").replace(":arrangement", "root-2");
  const response = await get(address).expect(200).expect("Content-Type", /html/);
  expect(response.text).toBe(page);
  expect(response.headers["cache-control"]).toBe("no-cache");
  await get(`${address}?from=home`).expect(200);
  await request(server.app).head(address).expect(200);
});

it.each(shared)("says by the status of %s that a link leads nowhere, on the client's page", async (route) => {
  const response = await get(route.replace(":token", "x".repeat(32)))
    .expect(404)
    .expect("Content-Type", /html/);
  expect(response.text).toBe(page);
});

it.each([
  "/nowhere",
  "/songs/not-a-uuid",
  "/songs/not-a-uuid/keys",
  "/songs/a/b",
  "/songs/a/keys/b",
  "/voice/sing/loud",
  "/_sitemap",
  "/index",
  "//songs",
  "/%zz",
])("answers 404 at %s, with the page so that the client can say so", async (address) => {
  const response = await get(address).expect(404).expect("Content-Type", /html/);
  expect(response.text).toBe(page);
  await request(server.app).head(address).expect(404);
});

it("does not let a condition of the asker's turn the 404 into a 304", async () => {
  const known = await get("/songs").expect(200);
  await get("/songs")
    .set("If-None-Match", known.headers.etag ?? "")
    .expect(304);
  await get("/nowhere")
    .set("If-None-Match", known.headers.etag ?? "*")
    .set("If-Modified-Since", new Date().toUTCString())
    .expect(404);
  await get("/nowhere").set("Range", "bytes=0-3").expect(404);
});

it("answers a missing file with a plain 404, never with the page", async () => {
  const response = await get("/_expo/static/js/web/entry-ffffffffffffffffffffffffffffffff.js")
    .expect(404)
    .expect("Content-Type", /text\/plain/);
  expect(response.text).not.toContain("<");
});

it.each([
  ["br", "br"],
  ["gzip, deflate, br", "br"],
  ["gzip", "gzip"],
  ["identity", undefined],
  ["br;q=0, gzip;q=0", undefined],
])("packs files for whoever accepts %s", async (accepted, used) => {
  const response = await get(entry, accepted)
    .buffer(true)
    .expect(200)
    .expect("Content-Type", /^text\/javascript/);
  expect(response.headers["content-encoding"]).toBe(used);
  expect(response.headers.vary).toMatch(/Accept-Encoding/);
  expect(response.headers["cache-control"]).toBe("public, max-age=31536000, immutable");
  expect(Number(response.headers["content-length"]) < script.length).toBe(used !== undefined);
  expect(response.text).toBe(script);
  const home = await get("/", accepted).expect(200);
  expect(home.headers["content-encoding"]).toBe(used);
  expect(home.text).toBe(page);
});

it("lets only files whose name changes with their content be kept for ever", async () => {
  expect(
    (await get("/assets/fonts/music.0123456789abcdef0123456789abcdef.woff2").expect(200)).headers["cache-control"],
  ).toMatch(/immutable/);
  expect(
    (await get("/assets/close.0123456789abcdef0123456789abcdef@2x.png").expect(200)).headers["cache-control"],
  ).toMatch(/immutable/);
  expect((await get("/worklets/listen.js").expect(200)).headers["cache-control"]).toBe("no-cache");
});

it.each(["/../secret", "/.secret", "/%2e%2e/%2e%2e/etc/passwd", "/..%2f..%2fetc%2fpasswd", "/%00", "/worklets/"])(
  "gives nothing away at %s",
  async (address) => {
    const response = await get(address).expect(404);
    expect(response.text).not.toMatch(/hidden|root:/);
  },
);

it("never leaves its directory for one whose name begins alike", async () => {
  const beside = `/..%2f${path.basename(directory)}-beside`;
  expect((await get(beside).expect(404)).text).not.toContain("outside");
});

it("only shows pages: other methods are refused", async () => {
  const response = await request(server.app).post("/songs").expect(405);
  expect(response.headers.allow).toBe("GET, HEAD");
});

it("allows scripts, workers, fonts and connections of its own only, and its own pages the microphone", async () => {
  for (const address of ["/", entry, "/nowhere", "/api/health", "/api/docs"]) {
    const { headers } = await get(address);
    expect(headers["content-security-policy"]?.split(";").sort()).toEqual(
      [
        "default-src 'self'",
        "script-src 'self'",
        "style-src 'self' 'unsafe-inline'",
        "img-src 'self' data: blob:",
        `media-src 'self' blob: ${server.s3.settings.publicEndpoint}`,
        "connect-src 'self' blob:",
        "worker-src 'self'",
        "font-src 'self'",
        "object-src 'none'",
        "base-uri 'none'",
        "form-action 'self'",
        "frame-ancestors 'none'",
      ].sort(),
    );
    expect(headers["permissions-policy"]).toBe("microphone=(self)");
    expect(headers["x-content-type-options"]).toBe("nosniff");
    expect(headers).not.toHaveProperty("x-powered-by");
    expect(headers).not.toHaveProperty("strict-transport-security");
  }
});

it("lets nobody keep what the API says", async () => {
  expect((await get("/api/health")).headers["cache-control"]).toBe("no-store");
});

it("says so while there is no client yet", async () => {
  const bare = await startTestServer();
  try {
    expect((await request(bare.app).get("/songs").expect(503)).text).toMatch(/has not been built/);
    await request(bare.app).get("/nowhere").expect(404);
  } finally {
    await bare.close();
  }
});
