import { parseChord } from "../music/chord";
import { parseKeyName } from "../music/keyName";
import { chordNumber } from "./chordNumbers";

// Common practice: roman numerals by the key's own scale, small for minor and diminished; plain numbers as bands call them.
test.each([
  ["D", "D", "I", "1"],
  ["G", "D", "IV", "4"],
  ["A7", "D", "V7", "5(7)"],
  ["Bm", "D", "vi", "6m"],
  ["Em7", "D", "ii7", "2m7"],
  ["C#m7b5", "D", "vii7b5", "7m7b5"],
  ["C", "D", "bVII", "b7"],
  ["G#dim", "D", "#ivdim", "#4dim"],
  ["D/F#", "D", "I/3", "1/3"],
  ["Gmaj7", "D", "IVmaj7", "4maj7"],
  ["F", "D", "bIII", "b3"],
  ["B", "Gb", "IV", "4"],
  ["A", "Gb", "bIII", "b3"],
  ["Am", "Am", "i", "1m"],
  ["C", "Am", "III", "3"],
  ["E7", "Am", "V7", "5(7)"],
  ["G#dim", "Am", "#viidim", "#7dim"],
  ["Bb", "Am", "bII", "b2"],
  ["Asus4", "D", "Vsus4", "5sus4"],
])("%s in %s is %s, %s", (text, key, roman, plain) => {
  expect(chordNumber(parseChord(text)!, parseKeyName(key)!)).toMatchObject({ roman, plain });
});
