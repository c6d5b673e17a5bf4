import type { TrackFrame } from "./trackFrame";
import { findSigns } from "./singingSigns";
import type { HeardNote } from "./sungNotes";

/** Two seconds on one pitch; wander in cents from frame to frame, and the second harmonic in dB. */
function held(
  midi: number,
  options: { bendCents?: number; overtoneDb?: number | ((k: number) => number); steadinessCents?: number } = {},
) {
  const { bendCents = 3, overtoneDb = -12, steadinessCents = 6 } = options;
  const frames = Array.from({ length: 200 }, (_, k): TrackFrame => ({
    hz: 440 * 2 ** ((midi - 69 + (bendCents / 100) * Math.sin(k * k)) / 12),
    clarity: 0.97,
    levelDb: -20,
    aboveRoomDb: 40,
    mixed: false,
    overtoneDb: midi > 76 ? (typeof overtoneDb === "number" ? overtoneDb : overtoneDb(k)) : null,
  }));
  const note: HeardNote = {
    start: 0,
    end: 2,
    midi,
    steadinessCents,
    vibrato: null,
    levelDb: -20,
    sustained: true,
    clear: true,
    heldS: 2,
    clarity: 0.97,
  };
  return [frames, [note]] as const;
}

test("a nearly pure tone high up is whistled", () => {
  expect(findSigns(...held(84, { overtoneDb: -35 })).whistled).toBe(true);
});

test("not so low down, with overtones, or pure on one vowel only", () => {
  expect(findSigns(...held(70)).whistled).toBe(false);
  expect(findSigns(...held(84, { overtoneDb: -15 })).whistled).toBe(false);
  expect(findSigns(...held(84, { overtoneDb: (k) => (k % 2 ? -35 : -12) })).whistled).toBe(false);
});

test("a line that comes down below where lips whistle is sung", () => {
  const [frames, [note]] = held(84, { overtoneDb: -35 });
  expect(findSigns(frames, [note!, { ...note!, midi: 72 }]).whistled).toBe(false);
});

test("frames an octave low, as of a whistle above the search limit, do not hide it", () => {
  expect(findSigns(...held(84, { overtoneDb: (k) => (k % 2 ? 30 : -35) })).whistled).toBe(true);
});

test("still is only what neither wavers nor flutters", () => {
  expect(findSigns(...held(64, { bendCents: 0.1, steadinessCents: 1 })).still).toBe(true);
  expect(findSigns(...held(64, { bendCents: 4, steadinessCents: 1 })).still).toBe(false);
  expect(findSigns(...held(64, { bendCents: 0.1, steadinessCents: 4 })).still).toBe(false);
});

test("in a guided hold only a pitch that does not move is still", () => {
  const [frames, notes] = held(64, { bendCents: 0.1, steadinessCents: 0.3 });
  const moving = (cents: number) =>
    frames.map((f, k) => ({ ...f, hz: f.hz! * 2 ** ((cents / 1200) * Math.sin(k / 30)) }));
  expect(findSigns(frames, notes, true).still).toBe(true);
  expect(findSigns(moving(2), notes, true).still).toBe(false);
});

test("noise moves a tone a little, and a singer's waver tells the two apart", () => {
  const [frames, notes] = held(64, { bendCents: 0.1 });
  const moving = frames.map((f, k) => ({ ...f, hz: f.hz! * 2 ** ((0.8 / 1200) * Math.sin(k / 30)) }));
  const wavering = (steadinessCents: number) => findSigns(moving, [{ ...notes[0]!, steadinessCents }], true).still;
  expect([wavering(0.4), wavering(1.2)]).toEqual([true, false]);
});

test("notes that begin at their loudest and fade at a still pitch are struck", () => {
  const notes = (levelDb: (k: number) => number, bendCents = 0.2) => {
    const [frames, [note]] = held(64, { bendCents });
    const four = [0, 1, 2, 3].map((n) => ({ ...note!, midi: 60 + n, start: n / 2, end: n / 2 + 0.45, heldS: 0.45 }));
    return findSigns(
      frames.map((f, k) => ({ ...f, levelDb: levelDb(k % 50) })),
      four,
    ).struck;
  };
  expect(notes((k) => -20 - 0.1 * k)).toBe(true);
  expect(notes((k) => -20 - 0.1 * k, 4)).toBe(false);
  expect(notes(() => -20)).toBe(false);
  expect(notes((k) => -20 - 0.02 * (k - 25) ** 2)).toBe(false);
});
