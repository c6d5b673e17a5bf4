import guitarData from "@tombatossals/chords-db/lib/guitar.json";
import ukuleleData from "@tombatossals/chords-db/lib/ukulele.json";
import type { Instrument } from "@/shared/instruments/instrument";
import { findPreset } from "@/shared/instruments/presets";
import { stringMidi } from "@/shared/instruments/tension";
import { chordPitchClasses, parseChord, type Chord } from "@/shared/music/chord";
import { tonicPitchClass } from "@/shared/music/keyName";
import { findShapes } from "@/shared/ways/findShapes";
import type { Shape } from "@/shared/ways/way";

const fretsOf = (shapes: readonly Shape[]) => shapes.map(({ frets }) => frets.map((fret) => fret ?? "x").join(" "));

interface Fingerings {
  chords: Record<string, { key: string; suffix: string; positions: { frets: number[]; baseFret: number }[] }[]>;
}

/** Suffixes of the data set and how a chord symbol is written; "/" bass entries and rarities are left out. */
const suffixes: Record<string, string> = {
  major: "",
  minor: "m",
  "7": "7",
  maj7: "maj7",
  m7: "m7",
  sus4: "sus4",
  sus2: "sus2",
  dim: "dim",
  aug: "aug",
  dim7: "dim7",
  m7b5: "m7b5",
  "6": "6",
  m6: "m6",
  "7sus4": "7sus4",
  mmaj7: "mmaj7",
  add9: "add9",
  "9": "9",
  m9: "m9",
  maj9: "maj9",
};

// @tombatossals/chords-db 0.5.1 (MIT): every position printed there, but for those that do not sound their chord.
describe("coverage of the open fingering data", () => {
  test.each([
    ["guitar", guitarData as unknown as Fingerings, 900],
    ["ukulele", ukuleleData as unknown as Fingerings, 900],
  ])("every position for %s that sounds its chord is found", (id, data, least) => {
    const instrument: Instrument = { ...findPreset(id)!, frets: 24 };
    let found = 0;
    const wrong: string[] = [];
    const missed: string[] = [];
    for (const { key, suffix, positions } of Object.values(data.chords).flat()) {
      const quality = suffixes[suffix];
      if (quality === undefined) continue;
      const target = parseChord(key.replace("sharp", "#") + quality)!;
      const known = new Set(fretsOf(findShapes(target, instrument, { all: true, maxFret: 16 })));
      for (const position of positions) {
        const frets = position.frets.map((fret) => (fret < 0 ? "x" : fret === 0 ? 0 : fret + position.baseFret - 1));
        if (known.has(frets.join(" "))) found++;
        else (soundsAs(target, frets, instrument) ? missed : wrong).push(`${key}${suffix} ${frets.join(" ")}`);
      }
    }
    expect(missed).toEqual([]);
    expect(found).toBeGreaterThanOrEqual(least);
    // Wrong tones, or a chord without its third or seventh, in the data itself.
    expect(wrong.sort()).toEqual(
      id === "ukulele"
        ? []
        : [
            "Adim 5 3 x 4 3 x",
            "Baug x 14 13 12 12 0",
            "Bb6 x 13 11 11 10 x",
            "C#aug 4 4 6 4 7 4",
            "C#aug x 4 4 4 2 2",
            "C9 0 3 2 0 3 0",
            "C9 8 10 8 7 8 10",
            "Dmaj9 x 5 4 6 4 x",
            "Dmmaj7 x 5 3 2 2 0",
            "Gadd9 x x 3 2 1 4",
          ].sort(),
    );
  });
});

/** Only chord tones, and what makes the chord that chord: its third (or what stands for it) and its seventh. */
function soundsAs(target: Chord, frets: readonly (number | "x")[], instrument: Instrument): boolean {
  const root = tonicPitchClass(target.root);
  const allowed = new Set(chordPitchClasses(target));
  const heard = new Set(
    frets.flatMap((fret, k) => (fret === "x" ? [] : [(stringMidi(instrument.strings[k]!) + fret) % 12])),
  );
  const carrying = target.intervals.filter((interval) => [2, 3, 4, 5, 9, 10, 11].includes(interval));
  return [...heard].every((pc) => allowed.has(pc)) && carrying.every((interval) => heard.has((root + interval) % 12));
}
