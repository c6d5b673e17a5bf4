import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { deviceShelf } from "@/features/api/deviceShelf";
import { shelf } from "@/features/api/shelf";
import { song as songContract } from "@/shared/contract/song";
import { demoSongs } from "@/shared/songs/demoSongs";
import { seedDemoSongs } from "./demoShelf";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

// Jest runs no import() at run time; the songs themselves are the real ones.
jest.mock("../files/lazyReaders", () => ({
  lazyReaders: { demoSongs: async () => jest.requireActual<object>("@/shared/songs/demoSongs") },
}));

const markName = "larkspan.demo-songs";
interface Mark {
  ids: Record<string, string>;
}
const mark = () => JSON.parse(localStorage.getItem(markName) ?? "") as Mark;
const titles = async () => (await shelf.list("songs")).map((song) => song.demo).sort();
const everySong = demoSongs.map(({ id }) => id).sort();

beforeEach(() => {
  localStorage.clear();
  kept.clear();
  refuseStorage(null);
});

test("a visitor finds the demonstration with its tunes, as the contract wants it", async () => {
  await seedDemoSongs();
  const songs = await shelf.list("songs");
  expect(await titles()).toEqual(everySong);
  for (const song of songs) {
    expect(songContract.parse(song)).toEqual(song);
    expect(song.tune?.kind).toBe("melody");
  }
});

test("one of its songs has a history, and counts as untouched all the same", async () => {
  await seedDemoSongs();
  const song = (await shelf.list("songs")).find(({ demo }) => demo === "lantern")!;
  const versions = await deviceShelf.versions(song.id);
  expect(versions.map(({ by }) => by)).toEqual(["the evening class", "the evening class"]);
  expect(Date.parse(versions[0]!.savedAt)).toBeGreaterThan(Date.parse(versions[1]!.savedAt));
  expect(versions[0]!.song.chart).not.toBe(song.chart);
  expect(await deviceShelf.isAsSeeded(song)).toBe(true);
  await shelf.put("songs", { ...song, tempo: 90 });
  expect((await deviceShelf.versions(song.id))[0]!.song).toEqual(song);
});

test("asked for by several pages at once, it comes once", async () => {
  await Promise.all([seedDemoSongs(), seedDemoSongs()]);
  await seedDemoSongs();
  expect(await titles()).toEqual(everySong);
});

test("a song that was taken off stays off", async () => {
  await seedDemoSongs();
  const [first] = await shelf.list("songs");
  await shelf.remove("songs", first!.id);
  await seedDemoSongs();
  expect(await titles()).toEqual(everySong.filter((id) => id !== first!.demo));
});

test("a try that broke off is taken up again without second copies", async () => {
  await seedDemoSongs();
  const { ids } = mark();
  kept.delete(`songs/${ids["ferry"]}`);
  localStorage.setItem(markName, JSON.stringify({ ids, done: false, left: ["ferry"] }));
  await seedDemoSongs();
  expect(await titles()).toEqual(everySong);
  expect((await shelf.list("songs")).map((song) => song.id)).toContain(ids["ferry"]);
});

test("who had the first two gets the others once, and none of those that were taken off", async () => {
  await seedDemoSongs();
  const { ids } = mark();
  const first = { lantern: ids["lantern"], ferry: ids["ferry"] };
  kept.clear();
  // As the mark was left by those who had two songs, and took one of them off.
  localStorage.setItem(markName, JSON.stringify({ ids: first, done: true }));
  await seedDemoSongs();
  const later = everySong.filter((id) => id !== "lantern" && id !== "ferry");
  expect(await titles()).toEqual(later);
  kept.clear();
  await seedDemoSongs();
  expect(await titles()).toEqual([]);
});
