import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { S3 } from "@aws-sdk/client-s3";
import { FakeS3 } from "./fake/fakeS3";
import { clientConfig, ObjectStore, storageOrigin } from "./objectStore.service";

const folder = mkdtempSync(path.join(tmpdir(), "larkspan-storage-"));
let s3: FakeS3;
let store: ObjectStore;
let client: S3;
beforeAll(async () => {
  s3 = await FakeS3.start(folder);
  store = new ObjectStore(s3.settings);
  client = new S3(clientConfig(s3.settings));
});
afterAll(async () => {
  client.destroy();
  await s3.stop();
  rmSync(folder, { recursive: true });
});
afterEach(() => {
  s3.down = false;
  s3.now = () => Date.now();
});

const put = (key: string, text: string) =>
  client.putObject({ Bucket: s3.settings.bucket, Key: key, Body: text, ContentType: "audio/webm" });

it("plays by a signed link for five minutes and not a second longer, in any part of the sound", async () => {
  await put("a take/é+&", "0123456789");
  const { url, expiresAt } = await store.signedLink("a take/é+&", "audio/webm");
  const left = (Date.parse(expiresAt) - Date.now()) / 1000;
  expect(left).toBeGreaterThan(290);
  expect(left).toBeLessThanOrEqual(300);
  const whole = await fetch(url);
  expect([whole.status, whole.headers.get("content-type"), await whole.text()]).toEqual([
    200,
    "audio/webm",
    "0123456789",
  ]);
  const part = await fetch(url, { headers: { Range: "bytes=4-6" } });
  expect([part.status, part.headers.get("content-range"), await part.text()]).toEqual([206, "bytes 4-6/10", "456"]);
  s3.now = () => Date.parse(expiresAt) + 1000;
  expect((await fetch(url)).status).toBe(403);
});

it("gives nothing to anybody who has no link, or one to something else", async () => {
  await Promise.all([put("mine", "mine"), put("other", "other")]);
  const { url } = await store.signedLink("mine", "audio/webm");
  const changes = [
    (address: URL) => (address.search = ""),
    (address: URL) => (address.pathname = address.pathname.replace("mine", "other")),
    (address: URL) => address.searchParams.set("X-Amz-Expires", "86400"),
  ];
  for (const change of changes) {
    const address = new URL(url);
    change(address);
    expect((await fetch(address)).status).toBe(403);
  }
  expect((await fetch(url, { method: "DELETE" })).status).toBe(403);
});

it("deletes an object with all that its upload left behind, and knows when it is gone", async () => {
  await Promise.all([put("gone", "x"), put("gone.info", "x"), put("gone.part", "x"), put("gone-not", "stays")]);
  await client.createMultipartUpload({ Bucket: s3.settings.bucket, Key: "gone" });
  await store.remove("gone");
  await store.remove("gone");
  expect((await s3.keys()).filter((key) => key.startsWith("gone"))).toEqual(["gone-not"]);
  expect(await store.size("gone")).toBeNull();
  expect(await store.read("gone")).toBeNull();
});

it("puts parts together in their order, and reads only the beginning where that is enough", async () => {
  const at = { Bucket: s3.settings.bucket, Key: "parts" };
  const { UploadId } = await client.createMultipartUpload(at);
  for (const [PartNumber, Body] of [
    [2, "second"],
    [1, "first "],
  ] as const) {
    await client.uploadPart({ ...at, UploadId, PartNumber, Body });
  }
  const { Parts } = await client.listParts({ ...at, UploadId });
  expect(Parts?.map(({ PartNumber, Size }) => [PartNumber, Size])).toEqual([
    [1, 6],
    [2, 6],
  ]);
  await client.completeMultipartUpload({ ...at, UploadId, MultipartUpload: { Parts } });
  expect(Buffer.from((await store.read("parts"))!).toString()).toBe("first second");
  await expect(client.listParts({ ...at, UploadId })).rejects.toMatchObject({ name: "NoSuchUpload" });
});

it("says whether it is up", async () => {
  expect(await store.isUp()).toBe(true);
  s3.down = true;
  await expect(store.isUp()).rejects.toThrow();
});

it("refuses a client that signs with another secret", async () => {
  const stranger = new ObjectStore({ ...s3.settings, secretAccessKey: "guessed" });
  await expect(stranger.read("mine")).rejects.toMatchObject({
    ...{ status: 503, code: "storage-down" },
    cause: { name: "SignatureDoesNotMatch" },
  });
});

it.each([
  [true, "https://s3.example/", "https://s3.example"],
  [false, "https://s3.example", "https://takes.s3.example"],
])("names the one place beside itself from which a page may play sound", (pathStyle, publicEndpoint, origin) => {
  expect(storageOrigin({ ...s3.settings, pathStyle, publicEndpoint, bucket: "takes" })).toBe(origin);
});
