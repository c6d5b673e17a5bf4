import { anInstrument } from "./belongings";
import { Person, startTestServer, type TestServer } from "./testServer";

let server: TestServer;
let owner: Person;
let stranger: Person;

beforeAll(async () => {
  server = await startTestServer();
  owner = await Person.signUp(server.app);
  stranger = await Person.signUp(server.app);
});
afterAll(() => server.close());

const at = (id: string) => `/api/instruments/${id}`;
const dataOf = (type: string, bytes: Buffer) => `data:image/${type};base64,${bytes.toString("base64")}`;
const jpeg = Buffer.concat([Buffer.from([0xff, 0xd8, 0xff, 0xe0]), Buffer.alloc(61, 7), Buffer.from([0xff, 0xd9])]);
const webp = Buffer.concat([
  Buffer.from("RIFF"),
  Buffer.from([60, 0, 0, 0]),
  Buffer.from("WEBPVP8 "),
  Buffer.alloc(52),
]);

it.each([
  ["a JPEG", dataOf("jpeg", jpeg)],
  ["a WebP", dataOf("webp", webp)],
])("keeps %s with the instrument, and lets go of it", async (_, photo) => {
  const item = anInstrument({ photo });
  expect((await owner.put(at(item.id), item).expect(201)).body).toEqual(item);
  expect((await owner.get(at(item.id)).expect(200)).body.photo).toBe(photo);
  const { photo: _gone, ...without } = item;
  expect((await owner.put(at(item.id), without).expect(200)).body).toEqual(without);
});

it.each([
  ["an SVG", dataOf("svg+xml", Buffer.from('<svg onload="alert(1)"/>'))],
  ["a page that says it is a JPEG", dataOf("jpeg", Buffer.from("<html><script>alert(1)</script></html>"))],
  ["a PNG that says it is a WebP", dataOf("webp", Buffer.from([0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, 0, 0, 0, 0]))],
  ["an address elsewhere", "https://orlow-quay.example/banjo.jpg"],
  ["what is not base64", "data:image/jpeg;base64,/9j/<<>>"],
  ["a photo of more than 90 KB", dataOf("jpeg", Buffer.concat([jpeg, Buffer.alloc(90_000)]))],
  ["a number", 7 as unknown as string],
])("refuses %s as a photo, and saves nothing", async (_, photo) => {
  const item = anInstrument({ photo });
  const refused = await owner.put(at(item.id), item).expect(422);
  expect(refused.body).toMatchObject({ code: "invalid", fields: [{ path: "photo" }] });
  await owner.get(at(item.id)).expect(404);
});

it("keeps what its strings were made for, courses and a short string, and refuses what no neck has", async () => {
  const strings = [
    { note: "D2", gaugeIn: 0.053, material: "phosphor-bronze" as const, madeFor: "E2" },
    { note: "G3", gaugeIn: null, material: "unknown" as const, inCourse: 2 },
  ];
  const item = anInstrument({ strings });
  expect((await owner.put(at(item.id), item).expect(201)).body).toEqual(item);
  for (const spoil of [
    { strings: [{ ...strings[0], madeFor: "low E" }] },
    { strings: [{ ...strings[0], inCourse: 9 }] },
    { fretMap: [2, 4, 4, 7] },
    { strings: [] },
    { scaleMm: 20 },
  ])
    await owner.put(at(item.id), { ...item, ...spoil }).expect(422);
});

it("has one favourite: a new one takes the place of the old, and nobody else's", async () => {
  const [first, second] = [anInstrument({ favourite: true }), anInstrument({ favourite: true })];
  const theirs = anInstrument({ favourite: true });
  await stranger.put(at(theirs.id), theirs).expect(201);
  await owner.put(at(first.id), first).expect(201);
  await owner.put(at(second.id), second).expect(201);
  expect((await owner.get(at(first.id))).body.favourite).toBe(false);
  expect((await owner.get(at(second.id))).body.favourite).toBe(true);
  expect((await stranger.get(at(theirs.id))).body.favourite).toBe(true);
});

it("is as if it did not exist for somebody else, photo and all", async () => {
  const item = anInstrument({ photo: dataOf("jpeg", jpeg) });
  await owner.put(at(item.id), item).expect(201);
  await stranger.get(at(item.id)).expect(404);
  await stranger.put(at(item.id), { ...item, favourite: true, name: "Mine now" }).expect(404);
  await stranger.delete(at(item.id)).expect(404);
  expect((await owner.get(at(item.id)).expect(200)).body).toEqual(item);
});
