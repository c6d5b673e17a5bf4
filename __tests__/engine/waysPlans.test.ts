import type { Instrument } from "@/shared/instruments/instrument";
import { findPreset } from "@/shared/instruments/presets";
import { tensionChanges } from "@/shared/instruments/tension";
import type { KeyName } from "@/shared/music/keyName";
import { findWays } from "@/shared/ways/findWays";
import type { Way } from "@/shared/ways/way";
import { defaultPreferences } from "@/shared/ways/wayCandidates";

const major = (tonic: string): KeyName => ({ tonic, mode: "major" });
const box = findPreset("box-adf")!;
const guitar = findPreset("guitar")!;

// Common practice throughout.
describe("ways that players know", () => {
  const find = (ways: readonly Way[], retune: number, capo: number) =>
    ways.find((way) => way.retune === retune && way.capo === capo);

  test("capo 7 with G shapes sounds in D", () => {
    const ways = findWays({ chords: ["G", "C", "D"], from: major("G"), to: major("D"), instrument: guitar });
    const way = find(ways, 0, 7)!;
    expect(way).toMatchObject({ kind: "capo", shapeKey: "G", soundingKey: "D", title: "Capo 7, play shapes in G" });
    expect(way.chords.map(({ played, sounding }) => [played, sounding])).toEqual([
      ["G", "D"],
      ["C", "G"],
      ["D", "A"],
    ]);
    expect(way.cost).toBe("Open shapes only, no barre. The chart as written. 13 frets left.");
  });

  test("strings A-D-F♯ let down a whole tone give G-C-E and sound in C with the shapes of D", () => {
    const ways = findWays({ chords: ["D", "G", "A"], from: major("D"), to: major("C"), instrument: box });
    const way = find(ways, -2, 0)!;
    expect(way).toMatchObject({ kind: "retune", shapeKey: "D", title: "Retune a whole tone down, play shapes in D" });
    expect(way.strings.map(({ from, to }) => `${from} ${to}`)).toEqual(["A3 G3", "D4 C4", "F#4 E4"]);
    const asIs = findWays({ chords: ["D", "G", "A"], from: major("D"), to: major("D"), instrument: box })[0]!;
    expect(way.chords.map(({ shape }) => shape!.frets)).toEqual(asIs.chords.map(({ shape }) => shape!.frets));
    expect(way.cautions[0]).toBe(
      "Tension falls by 21 % (A string 10.2 to 8.1 kg). Above the slack limit for this set; press lightly or notes go sharp.",
    );
  });

  test.each([
    ["G", "G C D"],
    ["D", "D G A"],
    ["C", "C F G"],
  ])("first, fourth and fifth of %s are %s", (key, expected) => {
    const ways = findWays({ chords: ["A", "D", "E"], from: major("A"), to: major(key), instrument: guitar });
    expect(ways[0]!.chords.map(({ sounding }) => sounding).join(" ")).toBe(expected);
    expect(
      find(ways, 0, 0)!
        .chords.map(({ played }) => played)
        .join(" "),
    ).toBe(expected);
  });

  test.each([
    ["C", 3, "Eb"],
    ["G", 2, "A"],
    ["G", 3, "Bb"],
    ["D", 5, "G"],
    ["E", 1, "F"],
    ["A", 2, "B"],
  ])("the shape of %s with capo %i sounds %s", (shape, capo, sounding) => {
    const ways = findWays({ chords: [shape], from: major(shape), to: major(sounding), instrument: guitar });
    const way = find(ways, 0, capo)!;
    expect(way.chords[0]).toMatchObject({ played: shape, sounding });
  });

  test("a capo at 3 makes Cm of Am", () => {
    const minor = (tonic: string): KeyName => ({ tonic, mode: "minor" });
    const ways = findWays({ chords: ["Am", "Dm", "E7"], from: minor("A"), to: minor("C"), instrument: guitar });
    expect(find(ways, 0, 3)).toMatchObject({
      shapeKey: "A",
      soundingKey: "C",
      title: "Capo 3, play shapes in A minor",
    });
  });

  test("standard down one plus capo 1 is standard: the same shapes, so it is nothing to propose", () => {
    const ways = findWays({ chords: ["G", "C", "D"], from: major("G"), to: major("G"), instrument: guitar });
    expect(find(ways, -1, 1)).toBeUndefined();
    expect(ways[0]).toMatchObject({ retune: 0, capo: 0, shapeKey: "G", title: "As tuned, play shapes in G" });
  });

  test("with a capo the banjo's short string needs its own stop as many frets up", () => {
    const banjo = findPreset("banjo")!;
    const ways = findWays({ chords: ["G", "C", "D7"], from: major("G"), to: major("A"), instrument: banjo });
    const way = find(ways, 0, 2)!;
    expect(way.shapeKey).toBe("G");
    expect(way.cautions).toContain("The short G string needs its own stop 2 frets up, at fret 7.");
    expect(way.cautions).toContain("Leave the short G string silent on D7.");
    expect(find(ways, 0, 0)!.cautions.join(" ")).not.toContain("own stop");
  });

  test("shapes the player knows are said to be known, and weigh", () => {
    const knownShapes = ["G", "C", "D", "Em"];
    const preferences = { ...defaultPreferences, knownShapes };
    const [best] = findWays({
      chords: ["C", "F", "G", "Am"],
      from: major("C"),
      to: major("Bb"),
      instrument: guitar,
      preferences,
    });
    expect(best).toMatchObject({ capo: 3, shapeKey: "G", title: "Capo 3, play the shapes you know in G" });
  });
});

describe("safety and honesty", () => {
  test("a set already at its limit is never tuned up", () => {
    const taut: Instrument = {
      ...guitar,
      strings: guitar.strings.map((string, k) => (k === 5 ? { ...string, note: "G4", gaugeIn: 0.008 } : string)),
    };
    expect(tensionChanges(taut, 1)[5]!.verdict).toBe("unsafe");
    for (const to of ["C", "Db", "Ab"]) {
      const ways = findWays({ chords: ["C", "G"], from: major("C"), to: major(to), instrument: taut });
      expect(ways.every(({ retune }) => retune <= 0)).toBe(true);
    }
  });

  test("going up warns of snapping, going far down of slack strings, unknown gauges are admitted", () => {
    const ukulele = findPreset("ukulele")!;
    const cautions = [box, guitar, ukulele].flatMap((instrument) =>
      ["C", "Db", "D", "Eb", "E", "F", "F#", "G", "Ab", "A", "Bb", "B"].flatMap((to) =>
        findWays({ chords: ["C", "F", "G"], from: major("C"), to: major(to), instrument }),
      ),
    );
    const said = (choose: (way: Way) => boolean) => cautions.filter(choose).map((way) => way.cautions.join(" "));
    const up = said(({ retune }) => retune > 0);
    const slack = said(({ strings }) => strings.some(({ verdict }) => verdict === "slack"));
    expect(up.length).toBeGreaterThan(0);
    expect(slack.length).toBeGreaterThan(0);
    for (const text of up) expect(text).toContain("A string can snap: eyes away");
    for (const text of slack) expect(text).toContain("Below the slack limit");
    const unknown = said(({ retune, strings }) => retune !== 0 && strings.length === 4);
    expect(unknown.length).toBeGreaterThan(0);
    for (const text of unknown) expect(text).toContain("judged by semitones alone");
  });

  test("what cannot be read stays as written, and what cannot be played is said", () => {
    const dulcimer = findPreset("dulcimer")!;
    const ways = findWays({ chords: ["D", "N.C.", "Ebm"], from: major("D"), to: major("D"), instrument: dulcimer });
    const asIs = ways.find(({ kind }) => kind === "as-is")!;
    expect(asIs.chords[1]).toMatchObject({ written: "N.C.", played: "N.C.", sounding: "N.C.", shape: null });
    expect(asIs.chords[2]!.shape).toBeNull();
    expect(asIs.cautions).toContain("This instrument has no playable shape for E♭m.");
  });

  test("a bass that cannot lie lowest is admitted", () => {
    const ways = findWays({ chords: ["C", "C/B"], from: major("C"), to: major("C"), instrument: box });
    const asIs = ways.find(({ kind }) => kind === "as-is")!;
    expect(asIs.cautions).toContain("The bass behind the slash cannot lie lowest here: C/B.");
    expect(asIs.chords[1]!.shape).not.toBeNull();
  });

  test("without chords the trivial way comes first", () => {
    const ways = findWays({ chords: [], from: major("C"), to: major("C"), instrument: guitar });
    expect(ways[0]).toMatchObject({ kind: "as-is", chords: [], difficulty: 0 });
  });
});

describe("a way that somebody has settled on", () => {
  const song = { chords: ["D", "G", "A"], from: major("D"), to: major("C"), instrument: guitar };
  const wishes = { ...defaultPreferences, barre: 1, capo: 1, highestCapo: 3 };
  const settled = { retune: 0, capo: 8, shapeKey: "E" };
  const moves = ({ retune, capo, shapeKey }: Way) => ({ retune, capo, shapeKey });

  test("is found whatever is wished for, last where it is not worth proposing, and changes nothing else", () => {
    const without = findWays({ ...song, preferences: wishes });
    expect(without.map(moves)).not.toContainEqual(settled);
    const ways = findWays({ ...song, preferences: wishes, settled });
    expect(ways.map(moves)).toEqual([...without.map(moves), settled]);
    const best = moves(without[0]!);
    expect(findWays({ ...song, preferences: wishes, settled: best })).toEqual(without);
  });

  test("is not found where it leads into another key, or where a string could snap", () => {
    const found = (other: typeof settled, to = song.to) => findWays({ ...song, to, settled: other }).map(moves);
    expect(found({ ...settled, shapeKey: "G" })).not.toContainEqual({ ...settled, shapeKey: "G" });
    expect(found({ retune: 5, capo: 0, shapeKey: "G" })).toEqual(findWays(song).map(moves));
  });
});
