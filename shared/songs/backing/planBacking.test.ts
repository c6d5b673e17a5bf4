import fc from "fast-check";
import { parseChord } from "../../music/chord";
import { spellTonic, tonicPitchClass } from "../../music/keyName";
import { pitchClass } from "../../music/pitch";
import { demoSongs } from "../demoSongs";
import type { BackingPlan, BackingWishes } from "./backingPlan";
import { type BackingSong, planBacking } from "./planBacking";

const hands = ["strum", "pluck-and-strum", "alternating-bass"] as const;
const plainSong = (chart: string, beatsPerBar = 4): BackingSong => {
  return { chart, writtenKey: { tonic: "G", mode: "major" }, notes: [], beatsPerBar, tempo: 120 };
};
const inG = { tonic: "G", shift: 0 };
const namesByBar = (plan: BackingPlan) => {
  const barS = (plan.metre.quarters * 60) / plan.tempo;
  return plan.chords.map(({ at, name }) => `${name} ${Math.round(((at - plan.countInS) / barS) * 1000) / 1000}`);
};

/** Any of the demonstration's songs, in any key, played in any way. */
const cases = fc.record({
  song: fc.constantFrom(...demoSongs),
  moved: fc.integer({ min: -11, max: 11 }),
  wishes: fc.record({
    tempo: fc.integer({ min: 40, max: 200 }),
    hand: fc.constantFrom(...hands),
    countInBars: fc.constantFrom(1 as const, 2 as const),
    guide: fc.boolean(),
    click: fc.boolean(),
    once: fc.boolean(),
  }),
  withTune: fc.boolean(),
});

function plan(song: (typeof demoSongs)[number], moved: number, wishes: BackingWishes, withTune = true): BackingPlan {
  const { tonic, mode } = song.writtenKey;
  const key = { tonic: spellTonic((tonicPitchClass(tonic) + moved + 12) % 12, mode), shift: moved };
  const made = planBacking({ ...song, notes: withTune ? song.notes : [] }, key, wishes);
  if (!made) throw new Error("no plan");
  return made;
}

describe("laws of a backing", () => {
  test("events are ordered and inside the song, its length is bars by beats by tempo, the count-in exact", () => {
    fc.assert(
      fc.property(cases, ({ song, moved, wishes, withTune }) => {
        const made = plan(song, moved, wishes, withTune);
        const beatS = (60 / wishes.tempo) * (made.metre.quarters / made.metre.beats);
        const barS = beatS * made.metre.beats;
        expect(made.durationS).toBeCloseTo((made.bars + wishes.countInBars) * barS, 6);
        expect(made.countInS).toBeCloseTo(wishes.countInBars * barS, 9);
        const wrong = made.events.filter(({ at, duration }, k) => {
          const ordered = at >= (made.events[k - 1]?.at ?? 0);
          return !ordered || !(duration > 0) || at + duration > made.durationS + 1e-6;
        });
        expect(wrong).toEqual([]);
        const counted = made.events.filter(({ kind, at }) => kind === "click" && at < made.countInS - 1e-6);
        expect(counted.map(({ at }) => at)).toEqual(
          Array.from({ length: wishes.countInBars * made.metre.beats }, (_, k) => expect.closeTo(k * beatS, 6)),
        );
        expect(made.events.filter(({ kind, at }) => kind !== "click" && at < made.countInS - 1e-6)).toEqual([]);
      }),
      { numRuns: 40 },
    );
  });

  test("every stroke sounds the pitch classes of its chord, the bass one of its own notes", () => {
    fc.assert(
      fc.property(cases, ({ song, moved, wishes, withTune }) => {
        const made = plan(song, moved, wishes, withTune);
        const wrong = made.events.filter(({ kind, at, midis }) => {
          if (kind === "click" || kind === "guide") return false;
          const chord = parseChord(made.chords.findLast((each) => each.at <= at + 1e-6)!.name!)!;
          const classes = new Set(chord.intervals.map((step) => (tonicPitchClass(chord.root) + step) % 12));
          const sounding = new Set(midis.map(pitchClass));
          const whole = !kind.startsWith("strum") || sounding.size === classes.size;
          const [low, high] = kind === "bass" ? [40, 51] : [52, 71];
          return (
            !whole || ![...sounding].every((pc) => classes.has(pc)) || midis.some((midi) => midi < low || midi > high)
          );
        });
        expect(wrong).toEqual([]);
      }),
      { numRuns: 40 },
    );
  });

  test("another key moves every pitch by the same step, octaves aside, and the tune exactly", () => {
    fc.assert(
      fc.property(cases, ({ song, moved, wishes }) => {
        const here = plan(song, 0, wishes);
        const there = plan(song, moved, wishes);
        const classes = ({ midis }: { midis: readonly number[] }, by: number) =>
          new Set(midis.map((midi) => pitchClass(midi + by)));
        expect(there.events.map((event) => classes(event, 0))).toEqual(
          here.events.map((event) => classes(event, moved)),
        );
        expect(there.notes.map(({ midi }) => midi)).toEqual(here.notes.map(({ midi }) => midi + moved));
        expect(there.events.map(({ at }) => at)).toEqual(here.events.map(({ at }) => at));
      }),
      { numRuns: 40 },
    );
  });

  test("the tempo scales times and nothing else", () => {
    fc.assert(
      fc.property(cases, fc.integer({ min: 40, max: 200 }), ({ song, moved, wishes }, tempo) => {
        const here = plan(song, moved, wishes);
        const there = plan(song, moved, { ...wishes, tempo });
        const scale = wishes.tempo / tempo;
        expect(there.events.length).toBe(here.events.length);
        const sounds = ({ events }: BackingPlan) => events.map(({ kind, midis, level }) => ({ kind, midis, level }));
        expect(sounds(there)).toEqual(sounds(here));
        const late = there.events.filter(({ at }, k) => Math.abs(at - here.events[k]!.at * scale) > 1e-6);
        expect(late).toEqual([]);
      }),
      { numRuns: 25 },
    );
  });

  test("voices of a chord stay near those of the chord before", () => {
    for (const song of demoSongs) {
      for (let moved = -6; moved < 6; moved += 3) {
        const strokes = plan(song, moved, { hand: "strum" }).events.filter(({ kind }) => kind === "strum-down");
        const moves = strokes.slice(1).map(({ midis }, k) => Math.abs(midis[0]! - strokes[k]!.midis[0]!));
        expect(Math.max(...moves)).toBeLessThanOrEqual(7);
      }
    }
  });
});

describe("where chords change", () => {
  test("bars of the chart count: halves, strokes, the bar before again, repeats", () => {
    const made = planBacking(plainSong("| G | C D | G / / D | % |: Em | C :|\n"), inG)!;
    expect(made.bars).toBe(8);
    expect(namesByBar(made)).toEqual([
      "G 0",
      "C 1",
      "D 1.5",
      "G 2",
      "D 2.75",
      "G 3",
      "D 3.75",
      "Em 4",
      "C 5",
      "Em 6",
      "C 7",
    ]);
  });

  test("in three of two chords the first has two beats", () => {
    const made = planBacking(plainSong("| G D | C | C D Em |", 3), inG)!;
    expect(namesByBar(made)).toEqual(["G 0", "D 0.667", "C 1", "D 2.333", "Em 2.667"]);
  });

  test("without bars or words a chord is a bar, or has the beats of its strokes", () => {
    expect(namesByBar(planBacking(plainSong("G D Em C x2"), inG)!)).toHaveLength(8);
    expect(namesByBar(planBacking(plainSong("G / / / D / Em /"), inG)!)).toEqual(["G 0", "D 1", "Em 1.5"]);
  });

  test("of the demonstration's songs every line of the tune is found, and chords stand on the beats they are sung on", () => {
    for (const song of demoSongs) {
      const made = plan(song, 0, { once: true });
      expect({ title: song.title, notes: made.notes.length }).toEqual({ title: song.title, notes: song.notes.length });
      expect(made.bars * made.metre.quarters).toBeCloseTo(
        Math.ceil((song.notes.at(-1)!.start + song.notes.at(-1)!.duration) / song.barLength) * song.barLength,
      );
    }
    const lantern = plan(demoSongs[0]!, 0, { once: true });
    expect(namesByBar(lantern).slice(0, 9)).toEqual([
      "D 0",
      "G 0.5",
      "D 1",
      "Bm 2.5",
      "A 3",
      "G 4",
      "D 4.5",
      "Bm 5",
      "G 5.5",
    ]);
    expect(lantern.phrases.map(({ label }) => label).slice(0, 2)).toEqual([
      "Lantern on the slipway, burning low,",
      "somebody is rowing home, I know,",
    ]);
  });

  test("a later verse is sung to the tune of the first, and has its chords where it has none of its own", () => {
    const tune = demoSongs[0]!;
    const chart = `${tune.chart}\n\nVerse 3\nNothing is left of the candle now,\nnobody told us the why or how,\none for the harbour and two for the bay,\nthat is the last of the light of day.`;
    const made = planBacking({ ...tune, chart }, { tonic: "D", shift: 0 })!;
    const parts = made.parts.map(({ label, at, end }) => {
      const bars = Math.round(((end - at) * tune.tempo) / 240);
      const inPart = <Timed extends { at: number }>(timed: readonly Timed[]) =>
        timed.filter((each) => each.at >= at - 1e-6 && each.at < end - 1e-6).length;
      return [label, bars, inPart(made.notes), inPart(made.chords) > 5];
    });
    expect(parts).toEqual([
      ["Verse 1", 8, 36, true],
      ["Chorus", 8, 32, true],
      ["Verse 2", 8, 36, true],
      ["Verse 3", 8, 36, true],
    ]);
  });
});

describe("what is not there", () => {
  test("a song of nothing has no plan", () => {
    expect(planBacking(plainSong("\n\n"), inG)).toBeNull();
  });

  test("words without chords and tune are counted but not struck", () => {
    const made = planBacking(plainSong("Low tide, low tide, wait for me"), inG)!;
    expect(made.bars).toBe(2);
    expect(made.events.every(({ kind }) => kind === "click")).toBe(true);
  });

  test("a tune without a chart has its bars and its guide", () => {
    const made = planBacking({ ...plainSong(""), notes: demoSongs[0]!.notes }, inG, { guide: true })!;
    expect(made.bars).toBe(16);
    expect(made.events.filter(({ kind }) => kind === "guide")).toHaveLength(demoSongs[0]!.notes.length);
    // Four lines of the verse end on rests, the halves of the chorus on a long note.
    const sizes = made.phrases.map((_, phrase) => made.notes.filter((note) => note.phrase === phrase).length);
    expect(sizes).toEqual([9, 9, 10, 8, 16, 16]);
  });

  test("N.C. is silence", () => {
    const made = planBacking(plainSong("| G | N.C. | G |"), inG)!;
    const barS = 2;
    const struck = made.events.filter(
      ({ kind, at }) => kind !== "click" && at >= 2 * barS - 1e-6 && at < 3 * barS - 1e-6,
    );
    expect(struck).toEqual([]);
    expect(made.chords.map(({ name }) => name)).toEqual(["G", null, "G"]);
  });

  test("any text makes a plan or none, never a fault", () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 300 }), fc.integer({ min: 1, max: 16 }), (chart, beats) => {
        const made = planBacking({ ...plainSong(chart), beatsPerBar: beats }, inG);
        expect(made === null || made.bars > 0).toBe(true);
      }),
      { numRuns: 150 },
    );
  });

  test("a tempo out of reach is the caller's fault", () => {
    expect(() => planBacking(plainSong("G"), inG, { tempo: 0 })).toThrow(RangeError);
    expect(() => planBacking(plainSong("G"), inG, { tempo: NaN })).toThrow(RangeError);
  });
});
