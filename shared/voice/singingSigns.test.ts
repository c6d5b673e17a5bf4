import type { TrackFrame } from "./pitchTrack";
import { findSigns } from "./singingSigns";
import type { HeardNote } from "./sungNotes";

/** Two seconds on one pitch; wander in cents from frame to frame, and the second harmonic in dB. */
function held(midi: number, options: { bendCents?: number; overtoneDb?: number | ((k: number) => number); steadinessCents?: number } = {}) {
  const { bendCents = 3, overtoneDb = -12, steadinessCents = 6 } = options;
  const frames = Array.from({ length: 200 }, (_, k): TrackFrame => ({
    hz: 440 * 2 ** ((midi - 69 + (bendCents / 100) * Math.sin(k * k)) / 12),
    clarity: 0.97,
    levelDb: -20,
    aboveRoomDb: 40,
    mixed: false,
    overtoneDb: midi > 76 ? (typeof overtoneDb === "number" ? overtoneDb : overtoneDb(k)) : null,
  }));
  const note: HeardNote = { start: 0, end: 2, midi, steadinessCents, vibrato: null, levelDb: -20, sustained: true, clear: true, heldS: 2, clarity: 0.97 };
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

test("in a guided hold only a generator's tone is still", () => {
  expect(findSigns(...held(64, { bendCents: 0.1, steadinessCents: 1 }), true).still).toBe(false);
  expect(findSigns(...held(64, { bendCents: 0.1, steadinessCents: 0.2 }), true).still).toBe(true);
});
