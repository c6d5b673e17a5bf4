import { barWords, tessituragramWords, tunePlace } from "./tessituragramWords";

const notes = [
  { start: 0, duration: 1, midi: 60 },
  { start: 1, duration: 1, midi: 64 },
  { start: 2, duration: 4, midi: 67 },
  { start: 6, duration: 2, midi: 72 },
];
const voice = { range: { lowMidi: 58, highMidi: 70 }, comfort: { lowMidi: 60, highMidi: 65 } };

test("every bar knows its share, its place in the voice and what is held on it", () => {
  const place = tunePlace(notes, "C", voice)!;
  expect(place.bars).toEqual([
    { midi: 60, share: 0.125, zone: "comfort", home: true, heldBeats: null },
    { midi: 64, share: 0.125, zone: "comfort", home: false, heldBeats: null },
    { midi: 67, share: 0.5, zone: "reach", home: false, heldBeats: 4 },
    { midi: 72, share: 0.25, zone: "beyond", home: true, heldBeats: null },
  ]);
  expect(barWords(place)).toBe("C4 13 %, E4 13 %, G4 50 %, C5 25 %");
});

test("the picture is said in words, with and without a voice", () => {
  const words = tessituragramWords(tunePlace(notes, "C", voice)!, voice);
  expect(words).toEqual([
    "The tune runs from C4 to C5.",
    "Half of its time lies between E4 and G4, the middle at G4; the mean is near G4.",
    "Held long: G4 for 4 beats.",
    "Of the time 25 % in comfort, 50 % in reach, 25 % beyond your range.",
    "Beyond: C5 above your range.",
  ]);
  expect(tessituragramWords(tunePlace(notes, "C", null)!, null)).toEqual(words.slice(0, 3));
  expect(tunePlace([], "C", voice)).toBeNull();
});

test("notes beyond the range are told together for each side", () => {
  const wide = [...notes, { start: 8, duration: 1, midi: 53 }, { start: 9, duration: 1, midi: 71 }];
  expect(tessituragramWords(tunePlace(wide, "C", voice)!, voice).at(-1)).toBe(
    "Beyond: F3 below your range; B4 and C5 above your range.",
  );
});

test("a reach that was not sung yet is called an estimate, as on the keys' page", () => {
  const guessed = { ...voice, range: { lowMidi: 55, highMidi: 73 }, heard: voice.range };
  expect(tessituragramWords(tunePlace(notes, "C", guessed)!, guessed).slice(-2)).toEqual([
    "Of the time 25 % in comfort, 75 % in reach.",
    "You have sung B♭3 to B♭4 so far; C5 is probably within reach (estimate).",
  ]);
  expect(tessituragramWords(tunePlace(notes, "C", guessed)!, guessed, "sharps").at(-1)).toMatch(
    /^You have sung B♭3 to B♭4/,
  );
});
