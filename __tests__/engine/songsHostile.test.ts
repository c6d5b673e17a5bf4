import { Midi } from "@tonejs/midi";
import fc from "fast-check";
import { strToU8, zipSync } from "fflate";
import { demoSongs } from "../../shared/songs/demoSongs";
import { type MelodyFile, readMelodyFile } from "../../shared/songs/melodyFile";
import { hostile, oneNote, score } from "./hostileFiles";

/** Processor time that a file may take. */
const patienceMs = 1000;

/** What is read of a file, in time; the better of two goes counts, as whatever else the machine does slows one. */
function readInTime(name: string, bytes: Uint8Array): MelodyFile {
  const go = () => {
    const begun = process.cpuUsage();
    const read = readMelodyFile(name, bytes);
    return { read, ms: process.cpuUsage(begun).user / 1000 };
  };
  const first = go();
  expect(first.ms < patienceMs ? first.ms : go().ms).toBeLessThan(patienceMs);
  return first.read;
}

test.each(hostile)("%s ends in a clear refusal, quickly", (_, name, make, reason) => {
  const read = readInTime(name, make());
  expect(read).toEqual({ ok: false, reason: expect.stringMatching(reason) as string });
});

const harmless: [string, () => string][] = [
  ["a note lengthened without end", () => `X:1\nK:C\nC${">".repeat(100)}D|`],
  ["a hundred thousand grace brackets", () => `X:1\nK:C\nC|${"{".repeat(100_000)}|`],
  ["a hundred thousand chords that never close", () => `X:1\nK:C\nC|${"[".repeat(100_000)}`],
  ["a hundred thousand fields that never close", () => `X:1\nK:C\nC|${"[K:".repeat(100_000)}`],
  ["a hundred thousand tuplets", () => `X:1\nK:C\nC|${"(3".repeat(100_000)}D`],
  ["a hundred thousand ties", () => `X:1\nK:C\n${"C-".repeat(90_000)}`],
  ["words for notes that are not there", () => `X:1\nK:C\nCDEF|\nw:${"la-".repeat(100_000)}`],
  ["thirty thousand voices", () => `X:1\nK:C\nC|\n${Array.from({ length: 30_000 }, (_, k) => `V:${k}\n`).join("")}`],
];
test.each(harmless)("%s harm nobody: what can be read is read, quickly", (_, make) => {
  const read = readInTime("a.abc", strToU8(make()));
  expect(read.ok && read.voices[read.proposed]?.melody.notes.length).toBeGreaterThan(0);
  sane(read);
});

test("a zip whose header says less than it holds is measured by what comes out", () => {
  const bytes = zipSync({ "bomb.xml": new Uint8Array(12_000_000) }, { level: 6 });
  // Local header: uncompressed size at offset 22; central directory: at 24 behind its signature "PK\1\2".
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const central = Buffer.from(bytes).indexOf("PK\x01\x02", 0, "latin1");
  view.setUint32(22, 10, true);
  view.setUint32(central + 24, 10, true);
  const begun = process.cpuUsage();
  expect(readMelodyFile("a.mxl", bytes)).toMatchObject({ ok: false });
  expect(process.cpuUsage(begun).user / 1000).toBeLessThan(patienceMs);
});

function sane(read: MelodyFile): void {
  if (!read.ok) {
    expect(read.reason).toMatch(/^[A-Z].*\.$/);
    return;
  }
  expect(read.voices[read.proposed]).toBeDefined();
  for (const { melody } of read.voices) {
    let end = 0;
    for (const { start, duration, midi } of melody.notes) {
      expect(duration).toBeGreaterThan(0);
      expect(start).toBeGreaterThanOrEqual(end - 1e-6);
      expect(Number.isFinite(midi)).toBe(true);
      end = start + duration;
    }
  }
}

describe("whatever is fed in, a tune or a refusal comes out:", () => {
  const midi = new Midi();
  const track = midi.addTrack();
  [60, 64, 67, 72].forEach((pitch, index) => track.addNote({ midi: pitch, ticks: index * 480, durationTicks: 400 }));
  const seeds: [string, Uint8Array][] = [
    ["a.mid", Uint8Array.from(midi.toArray())],
    ["a.abc", strToU8(demoSongs[0]!.abc)],
    [
      "a.xml",
      strToU8(
        score(
          `<measure><attributes><divisions>2</divisions></attributes>${oneNote.repeat(4)}<barline><repeat direction="backward"/></barline></measure>`,
        ),
      ),
    ],
    ["a.mxl", zipSync({ "a.xml": strToU8(score(`<measure>${oneNote}</measure>`)) })],
  ];

  test.each(seeds)("%s with some bytes changed, dropped or doubled", (name, bytes) => {
    const change = fc.tuple(fc.nat(bytes.length - 1), fc.nat(255), fc.constantFrom("set", "drop", "double"));
    fc.assert(
      fc.property(fc.array(change, { minLength: 1, maxLength: 8 }), (changes) => {
        let data = [...bytes];
        for (const [place, byte, kind] of changes) {
          if (kind === "set") data[place] = byte;
          else if (kind === "drop") data.splice(place, 3);
          else data = [...data.slice(0, place), ...data.slice(Math.max(0, place - 20))];
        }
        sane(readMelodyFile(name, Uint8Array.from(data.map((each) => each ?? 0))));
      }),
      { numRuns: name === "a.abc" ? 100 : 700 },
    );
  });

  test("random bytes and random notation", () => {
    const sign = fc.constantFrom(
      "C",
      "d'",
      "E,",
      "|",
      ":|",
      "|:",
      "|1",
      "|2",
      "(3",
      "-",
      "[CE]",
      "{g}",
      "^",
      "_",
      "z",
      "/2",
      "3",
      "\n",
      "V:2\n",
      "K:G\n",
      "w:la la\n",
      '"Am"',
      "!trill!",
      "[K:D]",
      "&",
      "%x\n",
      "M:3/4\n",
      "<",
      ">",
    );
    fc.assert(
      fc.property(
        fc.constantFrom("a.mid", "a.mxl", "a.xml", "a.abc"),
        fc.uint8Array({ maxLength: 300 }),
        (name, bytes) => {
          sane(readMelodyFile(name, bytes));
        },
      ),
      { numRuns: 800 },
    );
    fc.assert(
      fc.property(fc.array(sign, { maxLength: 40 }), (signs) => {
        sane(readMelodyFile("a.abc", strToU8(`X:1\nL:1/8\nK:C\n${signs.join("")}\n`)));
      }),
      { numRuns: 800 },
    );
  });
});
