import { scoreKeys } from "@/shared/keys/scoreKeys";
import type { SingingVoice, Tune } from "@/shared/keys/keyScore";
import { parseNoteName } from "@/shared/music/pitch";

const midi = (name: string) => parseNoteName(name)!;
const voice = (low: string, high: string, comfortLow: string, comfortHigh: string): SingingVoice => ({
  range: { lowMidi: midi(low), highMidi: midi(high) },
  comfort: { lowMidi: midi(comfortLow), highMidi: midi(comfortHigh) },
});
/** "G4:2 A4" = G4 for two beats, A4 for one. */
function tune(home: string, text: string): Tune {
  let start = 0;
  const notes = text.split(" ").map((token) => {
    const [name = "", beats = "1"] = token.split(":");
    const note = { start, duration: Number(beats), midi: midi(name) };
    start += note.duration;
    return note;
  });
  return { kind: "melody", notes, home };
}

// Traditional French tune "Ah! vous dirai-je, maman", in C4 major.
const twinkle = tune(
  "C",
  "C4 C4 G4 G4 A4 A4 G4:2 F4 F4 E4 E4 D4 D4 C4:2 G4 G4 F4 F4 E4 E4 D4:2 " +
    "G4 G4 F4 F4 E4 E4 D4:2 C4 C4 G4 G4 A4 A4 G4:2 F4 F4 E4 E4 D4 D4 C4:2",
);

// "Old Hundredth" (Genevan psalter, 1551), as hymnals print it in G; pitches from memory, dominant to dominant.
const oldHundredth = tune(
  "G",
  "G4:2 G4 F#4 E4 D4:2 G4 A4 B4:2 B4 B4 B4 A4 G4:2 C5 B4 A4:2 " +
    "G4 A4 B4 A4 G4:2 E4 F#4 G4:2 D5 B4 G4 A4:2 C5 B4 A4 G4:2",
);

describe("reserves", () => {
  // C. Herbst et al., Int. J. Research in Choral Singing 4(1), 2012: UR, LR and TS = (LR - UR)/2.
  test("for a voice A2 to E4 the tune C3 to A3 leaves 3 below and 7 above, so it lies 2 low", () => {
    const keys = scoreKeys(twinkle, voice("A2", "E4", "B2", "C4"));
    const inC = keys.find(({ tonic }) => tonic === "C")!;
    expect(inC).toMatchObject({ octave: -1, shift: -12, lowMidi: 48, highMidi: 57 });
    expect(inC.reserves).toEqual({ upper: 7, lower: 3, tessituraShift: -2 });
    const inD = keys.find(({ tonic }) => tonic === "D")!;
    expect(inD.reserves.tessituraShift).toBe(0);
    expect(inD.score).toBeGreaterThanOrEqual(inC.score);
  });

  test("a tune's marks carry its tessituragram: eighth notes of the worked histogram over 48 beats", () => {
    const inC = scoreKeys(twinkle, voice("A3", "E5", "B3", "C5")).find(({ tonic }) => tonic === "C")!;
    const beats = Object.fromEntries(
      inC.marks.map(({ midi: pitch, share }) => [pitch, Math.round(share * 48 * 1e9) / 1e9]),
    );
    expect(beats).toEqual({ 60: 8, 62: 8, 64: 8, 65: 8, 67: 12, 69: 4 });
    expect(inC.marks.filter(({ home }) => home).map(({ midi: pitch }) => pitch)).toEqual([60]);
  });
});

describe("published voice ranges", () => {
  // D. M. Randel (ed.), The New Harvard Dictionary of Music, 1986; comfort taken 2 semitones inside the top, 1 inside the
  // bottom (a default, common practice).
  const harvard = {
    soprano: ["C4", "A5"],
    mezzo: ["A3", "F5"],
    alto: ["F3", "D5"],
    tenor: ["B2", "G4"],
    baritone: ["G2", "E4"],
    bass: ["E2", "C4"],
  } as const;
  const singer = (type: keyof typeof harvard): SingingVoice => {
    const [low, high] = harvard[type].map(midi) as [number, number];
    return { range: { lowMidi: low, highMidi: high }, comfort: { lowMidi: low + 1, highMidi: high - 2 } };
  };

  test.each(Object.keys(harvard) as (keyof typeof harvard)[])(
    "every %s has all of a ninth-wide tune in comfort in some key",
    (type) => {
      const [best] = scoreKeys(twinkle, singer(type));
      expect(best).toMatchObject({ beyond: false, parts: { comfort: 50 } });
      expect(best!.score).toBeGreaterThanOrEqual(90);
    },
  );

  test("editions for high and low voice differ by the difference of the voices: soprano and alto by a fifth", () => {
    const high = scoreKeys(oldHundredth, singer("soprano"));
    const low = scoreKeys(oldHundredth, singer("alto"));
    for (const key of high) {
      const lower = low.find(({ lowMidi, highMidi }) => lowMidi === key.lowMidi - 7 && highMidi === key.highMidi - 7);
      expect(lower?.score).toBe(key.score);
    }
  });

  test("tenors sing an octave under the written tune, sopranos as written", () => {
    const inG = (type: keyof typeof harvard) =>
      scoreKeys(oldHundredth, singer(type)).find(({ tonic }) => tonic === "G")!;
    expect(inG("soprano").octave).toBe(0);
    expect(inG("tenor").octave).toBe(-1);
    expect(inG("baritone").octave).toBe(-1);
  });

  test("Old Hundredth lands where hymnals print it (G, from memory also A in older books) for a unison band to E♭5", () => {
    // Unison band of hymnal editors, B♭3 to E♭5 (common practice), as range; C4 to C5 as comfort.
    const congregation = voice("Bb3", "Eb5", "C4", "D5");
    const ranked = scoreKeys(oldHundredth, congregation);
    const inG = ranked.find(({ tonic }) => tonic === "G")!;
    expect(inG).toMatchObject({ beyond: false, octave: 0, lowMidi: midi("D4"), highMidi: midi("D5") });
    expect(inG.parts.comfort).toBe(50);
    expect(ranked.slice(0, 4).map(({ tonic }) => tonic)).toContain("G");
    expect(ranked.find(({ tonic }) => tonic === "C")!.score).toBeLessThan(inG.score);
  });
});

describe("keys for one singer", () => {
  const maren = voice("Eb3", "D5", "G3", "Bb4");
  const ferry = tune("G", "D4 G4:2 A4 B4:2 A4 G4:2 E4 D4 F#4 G4 A4 B4 C5:2 D5:2 E5 D5:2 B4:2 A4 C5 B4 D5:2 G4:3");

  test("the best key sits in comfort and says so; the written one is beyond and says which notes and how long", () => {
    const keys = scoreKeys(ferry, maren);
    expect(keys).toHaveLength(12);
    expect(keys[0]).toMatchObject({
      tonic: "C",
      octave: -1,
      shift: -7,
      reason: "All of it sits in your comfort band.",
    });
    expect(keys.at(-1)!.beyond).toBe(true);
    const inG = keys.find(({ tonic }) => tonic === "G")!;
    expect(inG.reason).toBe("6 % of the tune lies below your range (D3).");
  });

  test("tonics are spelled with the fewest accidentals, in minor by the minor signature", () => {
    expect(
      scoreKeys(ferry, maren)
        .map(({ tonic }) => tonic)
        .sort(),
    ).toEqual(["A", "Ab", "B", "Bb", "C", "D", "Db", "E", "Eb", "F", "F#", "G"]);
    expect(scoreKeys(ferry, maren, { mode: "minor" }).map(({ tonic }) => tonic)).toEqual(
      expect.arrayContaining(["C#", "G#", "Bb", "F#"]),
    );
  });

  test("with the span alone it is coarse, says so, and agrees on the best key", () => {
    const coarse = scoreKeys({ kind: "span", lowMidi: midi("D4"), highMidi: midi("E5"), home: "G" }, maren);
    expect(coarse.every((key) => key.coarse)).toBe(true);
    expect(coarse[0]!.tonic).toBe("C");
    expect(coarse.every(({ reason }) => reason.endsWith("Judged by the span alone."))).toBe(true);
    expect(coarse.every(({ reason }) => !reason.includes("%"))).toBe(true);
  });

  test("a take that felt hard at the top moves the best key down", () => {
    const eased = scoreKeys(ferry, maren, { evidence: [{ midi: midi("G4"), effort: 5 }] });
    expect(eased[0]!.highMidi).toBeLessThan(scoreKeys(ferry, maren)[0]!.highMidi);
    expect(scoreKeys(ferry, maren, { evidence: [{ midi: midi("G4"), effort: 3 }] })).toEqual(scoreKeys(ferry, maren));
  });

  test("a caller's mistake is refused: no notes, a note without length, bands upside down, no tonic", () => {
    expect(() => scoreKeys({ kind: "melody", notes: [], home: "C" }, maren)).toThrow(RangeError);
    expect(() => scoreKeys(tune("C", "C4:0"), maren)).toThrow(RangeError);
    expect(() => scoreKeys(twinkle, voice("C4", "C3", "C3", "C4"))).toThrow(RangeError);
    expect(() => scoreKeys(twinkle, voice("C3", "C5", "A2", "C4"))).toThrow(RangeError);
    expect(() => scoreKeys({ ...twinkle, home: "H?" }, maren)).toThrow(RangeError);
    expect(() => scoreKeys({ kind: "span", lowMidi: 70, highMidi: 60, home: "C" }, maren)).toThrow(RangeError);
  });
});
