import fc from "fast-check";
import { fretName } from "@/shared/instruments/frets";
import { findPreset, presets } from "@/shared/instruments/presets";
import { parseChord } from "@/shared/music/chord";
import { spellTonic, type KeyName } from "@/shared/music/keyName";
import { findShapes } from "@/shared/ways/findShapes";
import { findWays } from "@/shared/ways/findWays";
import { insteadOf } from "@/shared/ways/insteadOf";
import { leftOutWords } from "@/shared/ways/leftOutTones";
import { missingShapes, missingWords } from "@/shared/ways/missingShapes";
import { travelWords } from "@/shared/ways/travelWords";
import { defaultPreferences } from "@/shared/ways/wayCandidates";

const major = (tonic: string): KeyName => ({ tonic, mode: "major" });
const dulcimer = findPreset("dulcimer")!;
const everyKey = Array.from({ length: 12 }, (_, pc) => major(spellTonic(pc, "major")));

test("no way lets the strings down only to clamp them up again", () => {
  const chords = fc.uniqueArray(fc.constantFrom("C", "F", "G", "Am", "Dm", "Bb", "E7"), { minLength: 1, maxLength: 4 });
  const instrument = fc.constantFrom(...presets);
  fc.assert(
    fc.property(chords, instrument, fc.constantFrom(...everyKey), (song, played, to) => {
      for (const { retune, capo } of findWays({ chords: song, from: major("C"), to, instrument: played }))
        expect(retune !== 0 && retune + capo === 0).toBe(false);
    }),
    { numRuns: 60 },
  );
});

test("ways stand in the order of missing shapes, the chart as written and the bare instrument at the end where they cost too much", () => {
  const uneven = everyKey.flatMap((to) =>
    presets.map((instrument) =>
      findWays({ chords: ["C", "F", "Ebm", "B7"], from: major("C"), to, instrument }).map((way) => ({
        kind: way.kind,
        missing: missingShapes(way.chords).names.length,
      })),
    ),
  );
  expect(uneven.some((ways) => new Set(ways.map(({ missing }) => missing)).size > 1)).toBe(true);
  for (const ways of uneven) {
    // Behind the ways worth proposing stand those that are shown all the same, again in that order.
    const counts = ways.map(({ missing }) => missing);
    expect(counts).toEqual([...counts].sort((a, b) => a - b));
  }
});

test("shapes that are not there are counted in cost and why, and none of them is praised", () => {
  const ways = findWays({ chords: ["D", "N.C.", "Ebm", "G"], from: major("D"), to: major("D"), instrument: dulcimer });
  const asIs = ways.find(({ kind }) => kind === "as-is")!;
  expect(asIs.cost).toMatch(/^1 of 3 chords has no shape here\. /);
  expect(asIs.why).toMatch(/^Harder: 1 of 3 chords has no shape here; the others /);
  const none = findWays({ chords: ["Ebm"], from: major("D"), to: major("D"), instrument: dulcimer });
  const bare = none.find(({ kind }) => kind === "as-is")!;
  expect(bare.why).toBe("Harder: the chord has no shape here. Nothing to clamp or retune.");
  expect(bare.why).not.toMatch(/open|barre|fret/);
});

test.each([
  [[], null],
  [[{ played: "N.C.", shape: null }], null],
  [
    [
      { played: "C", shape: null },
      { played: "G", shape: null },
    ],
    "none of the chords has a shape here",
  ],
])("what is missing of %j", (chords, words) => {
  expect(missingWords(chords)).toBe(words);
});

// Common practice of players of the mountain dulcimer.
test("the dulcimer's frets are called 1 2 3 4 5 6 6½ 7 8 9 10 11 12 13 13½ 14", () => {
  const names = Array.from({ length: dulcimer.frets }, (_, k) => fretName(dulcimer, k + 1));
  expect(names.join(" ")).toBe("1 2 3 4 5 6 6½ 7 8 9 10 11 12 13 13½ 14");
  expect(fretName(dulcimer, 0)).toBe("0");
  expect(fretName(findPreset("guitar")!, 7)).toBe("7");
});

test("why names the dulcimer's frets as its players do", () => {
  const whys = everyKey.flatMap((to) =>
    findWays({ chords: ["D", "G", "A"], from: major("D"), to, instrument: dulcimer }).map(({ why }) => why),
  );
  expect(whys.join(" ")).toMatch(/up to fret \d+/);
  expect(whys.join(" ")).not.toMatch(/the first \d+ fret/);
});

describe("tones that a shape leaves out", () => {
  const words = (chord: string, id: string) => {
    const instrument = findPreset(id)!;
    return leftOutWords(chord, findShapes(parseChord(chord)!, instrument)[0]!, instrument);
  };

  test.each([
    ["C13", "box-adf", "C13 as C7: the 13th does not fit on three strings."],
    ["C9", "box-adf", "C9 as C7: the 9th does not fit on three strings."],
    ["C7", "box-adf", null],
    ["C", "box-adf", null],
    ["C13", "guitar", null],
    ["Am7", "ukulele", null],
  ])("%s on %s", (chord, id, said) => {
    expect(words(chord, id)).toBe(said);
  });

  test("stand among the cautions of the way", () => {
    const ways = findWays({
      chords: ["C", "C13"],
      from: major("C"),
      to: major("C"),
      instrument: findPreset("box-adf")!,
    });
    expect(ways.find(({ kind }) => kind === "as-is")!.cautions).toContain(
      "C13 as C7: the 13th does not fit on three strings.",
    );
  });
});

test("where a chord has no shape, something to play instead is said", () => {
  // The dulcimer's frets have no E flat at all, and no F.
  const asIs = (chord: string) =>
    findWays({ chords: ["D", chord], from: major("D"), to: major("D"), instrument: dulcimer }).find(
      ({ kind }) => kind === "as-is",
    )!.cautions;
  expect(asIs("Ebm")).toContain("For E♭m, let the strings be silent there.");
  expect(insteadOf("C#", dulcimer, 0)).toMatch(/^(?:play|pluck its root alone: the) /);
  expect(insteadOf("N.C.", dulcimer, 0)).toBeNull();
});

test("one or two new shapes among known ones are named", () => {
  const preferences = { ...defaultPreferences, knownShapes: ["C", "G", "Am"] };
  const ways = findWays({
    chords: ["C", "G", "Am", "F"],
    from: major("C"),
    to: major("C"),
    instrument: findPreset("guitar")!,
    preferences,
  });
  const asIs = ways.find(({ kind }) => kind === "as-is")!;
  expect(asIs.chords.map(({ known }) => known)).toEqual([true, true, true, false]);
  expect(asIs.cautions).toContain("F is the new shape: three minutes with it first.");
});

test.each([
  [0, "The hand stays in one place."],
  [60, "The hand travels 60 mm along the neck, the song through."],
  [384, "The hand travels 38 cm along the neck, the song through."],
  [2310, "The hand travels 2.3 m along the neck, the song through."],
])("a hand that travels %i mm is told so", (mm, words) => {
  expect(travelWords(mm)).toBe(words);
});
