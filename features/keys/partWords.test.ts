import { keyParts, partMaxima, voiceEdges } from "@/shared/keys/keyParts";
import { partNames, partWords, roomWords } from "./partWords";

test("the five parts are named in their order and make up a hundred", () => {
  expect(partNames.map(({ part }) => partMaxima[part])).toEqual([50, 15, 10, 10, 15]);
});

test("what makes a score, in one sentence", () => {
  const rooms = { above: { semitones: 0 }, below: { semitones: 5 } };
  expect(partWords({ comfort: 50, roomAbove: 6, roomBelow: 10, longHigh: 8, lowCarry: 13 }, rooms)).toBe(
    "50 of 50 for time in comfort, 6 of 15 for room above (0 semitones to the top of your range), 10 of 10 for room below (5 semitones to its bottom), 8 of 10 for long high notes, 13 of 15 for low notes.",
  );
});

test("room is said to count to the range, past its end too", () => {
  expect(roomWords({ above: { semitones: -2 }, below: { semitones: 1 } })).toMatch(
    /to the ends of your range, not of the comfort band: 2 semitones past the top, 1 semitone to the bottom\./,
  );
});

test("a key with a note beyond says why its parts are small although there is much room", () => {
  const rooms = { above: { semitones: 8 }, below: { semitones: -2 }, beyond: true };
  const parts = { comfort: 18, roomAbove: 6, roomBelow: 0, longHigh: 4, lowCarry: 6 };
  expect(partWords(parts, rooms)).toMatch(
    /6 of 15 for low notes; with a note beyond your range, each .* two fifths at most\.$/,
  );
  expect(roomWords(rooms)).toMatch(
    /2 semitones past the bottom\. With a note beyond your range, .*two fifths at most\.$/,
  );
  expect(roomWords(rooms)).not.toMatch(/earn all/);
});

test("two fifths are what the parts can hold with a note beyond", () => {
  const edges = voiceEdges({ range: { lowMidi: 52, highMidi: 76 }, comfort: { lowMidi: 53, highMidi: 74 } });
  const pitches = [
    { midi: 60, share: 0.999, heldShare: 0 },
    { midi: 77, share: 0.001, heldShare: 0 },
  ];
  const parts = keyParts(pitches, edges);
  for (const { part } of partNames) expect(parts[part]).toBeLessThanOrEqual(0.4 * partMaxima[part]);
  expect(parts.comfort).toBe(0.4 * partMaxima.comfort);
});
