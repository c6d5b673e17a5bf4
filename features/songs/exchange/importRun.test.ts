import { TextDecoder, TextEncoder } from "node:util";
import { aSong } from "@/__tests__/client/belongings";
import { kept } from "@/__tests__/client/memoryIdb";
import { shelf } from "@/features/api/shelf";
import { importFiles, type ImportProgress } from "./importRun";
import { writeSongsFile } from "./songsFile";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("../files/lazyReaders", () => ({
  lazyReaders: { melodyFile: async () => jest.requireActual<object>("@/shared/songs/melodyFile") },
}));
// The DOM of the tests lacks these of the browser.
Object.assign(globalThis, { TextDecoder, TextEncoder });
AbortSignal.prototype.throwIfAborted ??= function (this: AbortSignal) {
  if (this.aborted) throw new DOMException("Ended.", "AbortError");
};
Blob.prototype.arrayBuffer ??= function (this: Blob) {
  return new Promise((done) => {
    const reader = new FileReader();
    reader.onload = () => done(reader.result as ArrayBuffer);
    reader.readAsArrayBuffer(this);
  });
};

const abcBook = `X:1\nT:Quay Steps\nM:3/4\nL:1/4\nK:D\nDFA|d3|\n\nX:2\nT:Net Loft\nM:4/4\nL:1/4\nQ:1/4=100\nK:G\nGBdG|G4|\n`;
const file = (name: string, text: string) => new File([text], name);
const quiet = new AbortController().signal;

beforeEach(() => kept.clear());

test("many files of all kinds at once, each with what became of it", async () => {
  const was = aSong({ title: "Gulls", chart: "D  A\nlow water" });
  await shelf.put("songs", was);
  const outcome = await importFiles(
    [
      file("slack_water.txt", "G  D\nslack water stands"),
      file("book.abc", abcBook),
      file("again.txt", "D  A\nlow water\n"),
      file("holiday.jpg", "no song"),
      file(
        "shelf.larkspan.json",
        writeSongsFile([aSong({ title: "Storm Glass", chart: "Am\nfalling", tags: ["slow"] })]),
      ),
    ],
    quiet,
    () => undefined,
  );
  expect(outcome.results.map((each) => [each.title ?? each.file, each.outcome])).toEqual([
    ["slack water", "imported"],
    ["Quay Steps", "imported"],
    ["Net Loft", "imported"],
    ["again", "known"],
    ["holiday.jpg", "refused"],
    ["Storm Glass", "imported"],
  ]);
  const songs = await shelf.list("songs");
  expect(songs.map(({ title }) => title).sort()).toEqual([
    "Gulls",
    "Net Loft",
    "Quay Steps",
    "Storm Glass",
    "slack water",
  ]);
  expect(songs.find(({ title }) => title === "Storm Glass")?.tags).toEqual(["slow"]);
  expect(songs.find(({ title }) => title === "Net Loft")).toMatchObject({
    writtenKey: { tonic: "G", mode: "major" },
    beatsPerBar: 4,
    tempo: 100,
    tune: { kind: "melody", home: "G" },
  });
  expect(songs.find(({ title }) => title === "slack water")?.writtenKey?.tonic).toBe("G");
});

test("what a melody file holds beyond what is read is said with its song", async () => {
  const faster = "X:1\nT:Two Paces\nM:4/4\nL:1/4\nQ:1/4=90\nK:G\nGABc|d2G2|[Q:1/4=120]GABc|G4|\n";
  const { results } = await importFiles(
    [file("paces.abc", faster), file("plain.txt", "D A\nlow tides")],
    quiet,
    () => {},
  );
  expect(results.map((each) => each.outcome === "imported" && each.cautions)).toEqual([
    [expect.stringMatching(/speed/)],
    [],
  ]);
});

test("cancelled while songs are being kept, nothing stays", async () => {
  const stop = new AbortController();
  const seen: ImportProgress["status"][] = [];
  const outcome = await importFiles(
    ["one", "two", "three"].map((word) => file(`${word}.txt`, `D A\n${word} tides`)),
    stop.signal,
    ({ status, done }) => {
      seen.push(status);
      if (status === "keeping" && done === 1) stop.abort();
    },
  );
  expect(seen).toContain("keeping");
  expect(outcome).toMatchObject({ status: "cancelled", results: [] });
  expect(await shelf.list("songs")).toEqual([]);
});

test("the same words in two of the files are kept once", async () => {
  const outcome = await importFiles(
    [file("a.txt", "D A\nlow tides"), file("b.txt", "D A\r\nlow tides\r\n")],
    quiet,
    () => undefined,
  );
  expect(outcome.results.map((each) => each.outcome)).toEqual(["imported", "known"]);
  expect(await shelf.list("songs")).toHaveLength(1);
});
