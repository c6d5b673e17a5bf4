import { midiToHz } from "@/shared/music/pitch";
import { strokesOf, takePicture } from "./takePicture";

const held = (midi: number | null, frames: number) =>
  Array.from({ length: frames }, () => (midi === null ? null : midiToHz(midi)));
const picture = takePicture({ f0: [...held(60, 100), ...held(null, 50), ...held(67, 100)] });
const x = (t: number) => 10 * t;
const y = (midi: number) => 100 - midi;

it("finds the notes of a whole take and the lines that hold them", () => {
  expect(picture.notes.map(({ line }) => line)).toEqual([60, 67]);
  expect(picture.low).toBeLessThan(60);
  expect(picture.high).toBeGreaterThan(67);
  expect(picture.frames).toHaveLength(250);
});

it("cuts strokes at the ends of the part that is used", () => {
  const part = { startS: 0.5, endS: 2 };
  expect(strokesOf(picture.notes, part, true, x, y)).toBe("M5.0 40.0L9.9 40.0M15.0 33.0L20.0 33.0");
  expect(strokesOf(picture.notes, part, false, x, y)).toBe("M0.0 40.0L5.0 40.0M20.0 33.0L24.9 33.0");
});

it("leaves nothing outside where the whole take is used", () => {
  expect(strokesOf(picture.notes, { startS: 0, endS: 2.5 }, false, x, y)).toBe("");
});
