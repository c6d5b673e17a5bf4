import { TextDecoder, TextEncoder } from "node:util";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { shelf } from "@/features/api/shelf";
import { song as songContract } from "@/shared/contract/song";
import { seedDemoSongs } from "./demoShelf";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

// The DOM of the tests lacks these two of the browser.
Object.assign(globalThis, { TextDecoder, TextEncoder });

// Jest runs no import() at run time; the readers themselves are the real ones.
jest.mock("../files/lazyReaders", () => ({
  lazyReaders: {
    melodyFile: async () => jest.requireActual<object>("@/shared/songs/melodyFile"),
    demoSongs: async () => jest.requireActual<object>("@/shared/songs/demoSongs"),
  },
}));

beforeEach(() => {
  localStorage.clear();
  kept.clear();
  refuseStorage(null);
});

test("a visitor finds two songs with their tunes, as the contract wants them", async () => {
  await seedDemoSongs();
  const songs = await shelf.list("songs");
  expect(songs.map((song) => song.demo).sort()).toEqual(["ferry", "lantern"]);
  for (const song of songs) {
    expect(songContract.parse(song)).toEqual(song);
    expect(song.tune?.kind).toBe("melody");
  }
}, 60_000);

test("asked for by several pages at once, they come once", async () => {
  await Promise.all([seedDemoSongs(), seedDemoSongs()]);
  await seedDemoSongs();
  expect(await shelf.list("songs")).toHaveLength(2);
}, 60_000);

test("a song that was taken off stays off", async () => {
  await seedDemoSongs();
  const [first] = await shelf.list("songs");
  await shelf.remove("songs", first!.id);
  await seedDemoSongs();
  expect(await shelf.list("songs")).toHaveLength(1);
}, 60_000);

test("a try that broke off is taken up again without second copies", async () => {
  await seedDemoSongs();
  const [first] = await shelf.list("songs");
  kept.delete(`songs/${first!.id}`);
  const mark = JSON.parse(localStorage.getItem("larkspan.demo-songs") ?? "") as object;
  localStorage.setItem("larkspan.demo-songs", JSON.stringify({ ...mark, done: false }));
  await seedDemoSongs();
  expect((await shelf.list("songs")).map((song) => song.id)).toContain(first!.id);
  expect(await shelf.list("songs")).toHaveLength(2);
}, 60_000);
