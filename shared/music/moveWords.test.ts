import { distanceWords, moveWords, shortMove } from "./moveWords";

test.each([
  [0, "nothing", "as the chart is written", "written"],
  [1, "a semitone", "a semitone over the chart", "1 up"],
  [-2, "a whole tone", "a whole tone under the chart", "2 down"],
  [-7, "seven semitones", "seven semitones under the chart", "7 down"],
  [12, "an octave", "an octave over the chart", "an octave up"],
  [-24, "2 octaves", "2 octaves under the chart", "2 octaves down"],
  [-14, "an octave and a whole tone", "an octave and a whole tone under the chart", "14 down"],
  [25, "2 octaves and a semitone", "2 octaves and a semitone over the chart", "25 up"],
])("a move by %i semitones in words", (semitones, distance, move, short) => {
  expect([distanceWords(semitones), moveWords(semitones), shortMove(semitones)]).toEqual([distance, move, short]);
});

test("half semitones are a caller's mistake", () => {
  expect(() => distanceWords(0.5)).toThrow(RangeError);
  expect(() => moveWords(0.5)).toThrow(RangeError);
  expect(() => shortMove(0.5)).toThrow(RangeError);
});
