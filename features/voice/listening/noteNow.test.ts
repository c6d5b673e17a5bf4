import { midiToHz } from "@/shared/music/pitch";
import { noteNow } from "./noteNow";

const frames = (midis: (number | null)[]) =>
  midis.map((midi, k) => ({ t: k / 100, hz: midi === null ? null : midiToHz(midi), clarity: 0.9, levelDb: -20 }));
const held = (midi: number, count: number) => Array.from({ length: count }, () => midi);

it("names the note that sounds and how long it has been held", () => {
  expect(noteNow(frames([...held(62, 40), ...held(64.05, 130)]))).toEqual({
    midi: 64,
    cents: 5,
    heldS: 1.3,
    words: "On the line",
  });
});

it.each([
  [60.1, "On the line"],
  [60.2, "A little sharp"],
  [60.4, "Sharp"],
  [59.8, "A little flat"],
  [59.6, "Flat"],
])("says where %d lies against its line: %s", (midi, words) => {
  expect(noteNow(frames(held(midi, 50)))?.words).toBe(words);
});

it("takes vibrato and a short breath for one note", () => {
  const vibrato = Array.from({ length: 100 }, (_, k) => 64 + 0.4 * Math.sin((2 * Math.PI * 5.5 * k) / 100));
  const note = noteNow(frames([...vibrato, ...Array.from({ length: 5 }, () => null), ...vibrato.slice(0, 50)]));
  expect(note?.midi).toBe(64);
  expect(note?.heldS).toBeCloseTo(1.55, 1);
});

it("is silent when nobody sings", () => {
  expect(noteNow([])).toBeNull();
  expect(noteNow(frames([...held(60, 50), ...Array.from({ length: 30 }, () => null)]))).toBeNull();
});

it("names a new note, even a semitone away, from its second frame on", () => {
  expect(noteNow(frames([...held(60, 60), ...held(61, 1)]))?.midi).toBe(60);
  expect(noteNow(frames([...held(60, 60), ...held(61, 2)]))?.midi).toBe(61);
  expect(noteNow(frames([...held(60, 60), ...held(67, 2)]))?.midi).toBe(67);
});

it("passes over a single stray frame", () => {
  expect(noteNow(frames([...held(60, 60), 72]))?.midi).toBe(60);
});
