import fc from "fast-check";
import { findPreset, presets } from "../../instruments/presets";
import { chordPitchClasses, parseChord } from "../../music/chord";
import { pitchClass } from "../../music/pitch";
import { findShapes } from "../findShapes";
import { soundedStrings } from "../neck/soundedStrings";
import { arrangementMark, type ArrangementProposal, type ArrangementQuestion } from "./arrangement";
import { arrangementTitle, placeWords } from "./arrangementWords";
import { proposeArrangements } from "./proposeArrangements";

const songs = [
  ["G", "C", "D"],
  ["C", "F", "G", "Am"],
  ["D", "G", "A", "Bm"],
  ["A", "D", "E7"],
  ["Am", "Dm", "E", "G"],
  ["E", "A", "B7", "C#m"],
  ["Bb", "Eb", "F7"],
];
const question = (chords: readonly string[], id: string, capo: number): ArrangementQuestion => ({
  chords: chords.map((name) => ({ written: name, sounding: name, played: name, shape: null })),
  sequence: [...chords, chords[0]!, ...[...chords].reverse()],
  instrument: findPreset(id)!,
  capo,
});
const anything = fc.record({
  chords: fc.constantFrom(...songs),
  id: fc.constantFrom(...presets.filter(({ fretMap }) => !fretMap).map(({ id }) => id)),
  capo: fc.constantFrom(0, 0, 2, 4),
});
const each = (law: (found: ArrangementProposal[], asked: ArrangementQuestion) => void, numRuns = 60) => {
  const property = fc.property(anything, ({ chords, id, capo }) => {
    const asked = question(chords, id, capo);
    law(proposeArrangements(asked), asked);
  });
  fc.assert(property, { numRuns });
};
const known = (found: readonly ArrangementProposal[], kind: string) =>
  found.find(({ kinds }) => (kinds as string[]).includes(kind));

describe("laws of arrangements", () => {
  test("every shape of every arrangement sounds its chord and nothing else", () => {
    each((found, { instrument, capo }) => {
      for (const { chords } of found)
        for (const { played, shape } of chords) {
          if (shape === null) {
            // Some chords are not on some instruments: three strings of root and fifth have no third in reach.
            expect(findShapes(parseChord(played)!, instrument, { capo, maxFret: 12 })).toEqual([]);
            continue;
          }
          const wanted = new Set(chordPitchClasses(parseChord(played)!).map((pc) => (pc + capo) % 12));
          const heard = soundedStrings(shape.frets, instrument, { retune: 0, capo }).map(({ midi }) =>
            pitchClass(midi),
          );
          expect(heard.every((pc) => wanted.has(pc))).toBe(true);
          // Three strings cannot hold all of F7: the root may be what is left out, where no shape at all has it.
          const root = (chordPitchClasses({ ...parseChord(played)!, intervals: [0], bass: null })[0]! + capo) % 12;
          const rooted = findShapes(parseChord(played)!, instrument, { capo, maxFret: 12 }).some((each) =>
            soundedStrings(each.frets, instrument, { retune: 0, capo }).some(({ midi }) => pitchClass(midi) === root),
          );
          if (rooted) expect(heard).toContain(root);
        }
    });
  });

  test("the plainest is never harder than another, the closest never travels more, the fullest never sounds fewer strings", () => {
    each((found) => {
      for (const { weight } of found) {
        expect(known(found, "plainest")!.weight.ease).toBeGreaterThanOrEqual(weight.ease - 1e-9);
        expect(known(found, "closest")!.weight.travelMm).toBeLessThanOrEqual(weight.travelMm);
        const fullest = known(found, "fullest") ?? found[0]!;
        expect(fullest.weight.strings).toBeGreaterThanOrEqual(weight.strings - 1e-9);
      }
    });
  });

  test("they differ, and there are three at least wherever the instrument has three", () => {
    each((found, { chords, instrument, capo }) => {
      const marks = found.map((arrangement) => arrangementMark(arrangement.chords));
      expect(new Set(marks).size).toBe(marks.length);
      expect(new Set(found.map(({ id }) => id)).size).toBe(found.length);
      const lines = chords.reduce(
        (product, { played }) => product * findShapes(parseChord(played)!, instrument, { capo, maxFret: 12 }).length,
        1,
      );
      expect(found.length).toBeGreaterThanOrEqual(Math.min(3, lines));
    });
  });

  test("what lies up the neck lies higher than the plainest", () => {
    each((found) => {
      const [high, plain] = [known(found, "highest"), known(found, "plainest")];
      if (!high || !plain || high === plain) return;
      const sum = (arrangement: ArrangementProposal) =>
        arrangement.chords.reduce(
          (all, { shape }) => all + Math.max(0, ...(shape?.frets ?? []).map((fret) => fret ?? 0)),
          0,
        );
      expect(sum(high)).toBeGreaterThanOrEqual(sum(plain));
    });
  });
});

test("on a box guitar in A D F♯ the songs of the class get arrangements by the string that carries the root", () => {
  const asked = question(["D", "G", "A"], "box-adf", 0);
  const names = asked.instrument.strings.map(({ note }) => note);
  const found = proposeArrangements(asked);
  const said = found.map(
    (arrangement) => `${arrangementTitle(arrangement, names)}: ${placeWords(arrangement.weight, names)}`,
  );
  expect(said).toEqual([
    "Plainest: Open strings to fret 7. Roots mostly on the D string.",
    "Closest together: Open strings to fret 10. Roots mostly on the D string.",
    "Plain and near together: Open strings to fret 4. Roots mostly on the F♯ string.",
    "Up the neck: Frets 5 to 9. Roots mostly on the D string.",
    "Roots on the A string: Frets 3 to 12. Roots on the A string.",
  ]);
});

test("what is no chord is left alone, and without any playable chord there is nothing to propose", () => {
  const asked = question(["N.C.", "D"], "box-adf", 0);
  expect(proposeArrangements(asked)[0]!.chords[0]!.shape).toBeNull();
  expect(proposeArrangements(question(["N.C."], "box-adf", 0))).toEqual([]);
});
