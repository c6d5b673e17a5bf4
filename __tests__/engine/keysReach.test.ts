import fc from "fast-check";
import { noKeyFits } from "@/shared/keys/noKeyFits";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import type { SingingVoice, Tune } from "@/shared/keys/keyScore";
import { parseNoteName } from "@/shared/music/pitch";
import { probableReach } from "@/shared/voice/vocalReach";

const band = (low: string, high: string) => ({ lowMidi: parseNoteName(low)!, highMidi: parseNoteName(high)! });
const tune = (home: string, names: string): Tune => ({
  kind: "melody",
  home,
  notes: names.split(" ").map((name, start) => ({ start, duration: 1, midi: parseNoteName(name)! })),
});
/** A phrase sung from G3 to A4, and nothing else known. */
const phrase: SingingVoice = {
  range: probableReach(band("G3", "A4")),
  comfort: band("A3", "F4"),
  heard: band("G3", "A4"),
};

describe("a voice known from a phrase", () => {
  test("is judged by what it probably reaches: more keys hold the tune than within the phrase alone", () => {
    const song = tune("D", "A3 D4 E4 F#4 A4 B4 A4 F#4 D4");
    const sung = scoreKeys(song, { range: phrase.heard!, comfort: phrase.comfort });
    const reached = scoreKeys(song, phrase);
    const holding = (keys: typeof sung) => keys.filter(({ beyond }) => !beyond).length;
    expect(holding(sung)).toBe(1);
    expect(holding(reached)).toBe(5);
    for (const key of reached) {
      const before = sung.find(({ tonic }) => tonic === key.tonic)!;
      expect(key.score).toBeGreaterThanOrEqual(before.score);
    }
  });

  test("what was heard changes words, never a score", () => {
    const pitch = fc.integer({ min: 48, max: 74 });
    fc.assert(
      fc.property(fc.array(pitch, { minLength: 1, maxLength: 12 }), fc.constantFrom("C", "Eb", "A"), (midis, home) => {
        const song: Tune = { kind: "melody", home, notes: midis.map((midi, start) => ({ start, duration: 1, midi })) };
        const bare = scoreKeys(song, { range: phrase.range, comfort: phrase.comfort });
        const said = scoreKeys(song, phrase);
        expect(said.map(({ tonic, score, parts }) => ({ tonic, score, parts }))).toEqual(
          bare.map(({ tonic, score, parts }) => ({ tonic, score, parts })),
        );
        expect(said.map(({ reason }) => reason).join(" ")).not.toMatch(/note you have|your range \(/);
      }),
      { numRuns: 60 },
    );
  });

  const reasonIn = (names: string, voice: SingingVoice) =>
    scoreKeys(tune("C", names), voice).find(({ tonic }) => tonic === "C")!.reason;

  test.each([
    ["C4 D4 E4 A4", "A4 is the highest note you held so far, four semitones over your band."],
    ["B4 C4 D4 E4", "B4 is over what you have sung so far; it is probably within reach (estimate)."],
    ["F3 C4 D4 E4", "F3 is under what you have sung so far; it is probably within reach (estimate)."],
    [
      "C4 B4 A#4 E4",
      "50 % of the tune lies over what you have sung so far, up to B4; it is probably within reach (estimate).",
    ],
    ["E3 B3 C4 D4 E4 B4", "17 % of the tune lies below what you probably reach (E3)."],
    ["E3 C4 D4 E4 C5 C5", "33 % of the tune lies above what you probably reach (C5), 17 % below it (E3)."],
  ])("the notes %s are told as heard, probable or beyond", (names, reason) => {
    expect(reasonIn(names, phrase)).toBe(reason);
  });

  test("an end that a guided hold has shown is spoken of as measured", () => {
    const held = { ...phrase, range: { ...phrase.range, highMidi: 69 } };
    expect(reasonIn("C4 D4 E4 A4", held)).toBe("A4 is the highest note you have, four semitones over your band.");
  });
});

describe("no key holds the whole tune", () => {
  const voice: SingingVoice = { range: band("A3", "A4"), comfort: band("B3", "G4") };

  test("the first key says what it leaves out, and where an octave would put it", () => {
    const keys = scoreKeys(tune("C", "C4 E4 G4 C5 E5 C5 G4 E4 C4"), voice);
    expect(noKeyFits(keys)).toMatch(
      /^No key holds the whole tune; [A-G][♯♭]? (leaves out least|comes nearest): \S+( and \S+| to \S+)? (above|below) (your voice|it).*, \d+ % of the tune\. Sing /,
    );
  });

  test("a span alone gives no shares", () => {
    const keys = scoreKeys({ kind: "span", ...band("C4", "E5"), home: "C" }, voice);
    expect(noKeyFits(keys)).toMatch(/^No key holds the whole tune; /);
    expect(noKeyFits(keys)).not.toContain("%");
  });

  test("is not said while one key holds it", () => {
    expect(noKeyFits(scoreKeys(tune("C", "C4 E4 G4"), voice))).toBeNull();
    expect(noKeyFits([])).toBeNull();
  });

  test("the key named leaves out least wherever that is claimed", () => {
    const notes = fc.array(fc.integer({ min: 50, max: 80 }), { minLength: 2, maxLength: 12 });
    fc.assert(
      fc.property(notes, (midis) => {
        const song: Tune = {
          kind: "melody",
          home: "C",
          notes: midis.map((midi, start) => ({ start, duration: 1, midi })),
        };
        const keys = scoreKeys(song, voice);
        const words = noKeyFits(keys);
        expect(words === null).toBe(keys.some(({ beyond }) => !beyond));
        if (!words?.includes("leaves out least")) return;
        const left = (key: (typeof keys)[number]) =>
          key.marks.reduce((sum, { zone, share }) => (zone === "beyond" ? sum + share : sum), 0);
        expect(left(keys[0]!)).toBeLessThanOrEqual(Math.min(...keys.map(left)) + 1e-9);
      }),
      { numRuns: 80 },
    );
  });
});

test("where no octave holds the tune, the one that leaves out least is taken", () => {
  const song = tune("C", "E3 B3 C4 D4 E4 B4");
  const inC = scoreKeys(song, phrase).find(({ tonic }) => tonic === "C")!;
  expect(inC.octave).toBe(0);
  expect(inC.marks.filter(({ zone }) => zone === "beyond").map(({ midi }) => midi)).toEqual([52]);
});

test("no octave below C1 or above C7 is chosen while another is there", () => {
  const wide = fc.record({ low: fc.integer({ min: 20, max: 70 }), width: fc.integer({ min: 0, max: 56 }) });
  fc.assert(
    fc.property(wide, ({ low, width }) => {
      const voice: SingingVoice = { range: band("E2", "E4"), comfort: band("A2", "C4") };
      const keys = scoreKeys({ kind: "span", lowMidi: low, highMidi: low + width, home: "C" }, voice);
      for (const { lowMidi, highMidi } of keys) {
        expect(lowMidi).toBeGreaterThanOrEqual(24);
        expect(highMidi).toBeLessThanOrEqual(96);
      }
    }),
    { numRuns: 60 },
  );
});
