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
  ["C#m7b5", "D", "viiø7", "7m7b5"],
  ["C", "D", "bVII", "b7"],
  ["G#dim", "D", "#iv°", "#4dim"],
  ["D/F#", "D", "I/3", "1/3"],
  ["Gmaj7", "D", "IVmaj7", "4maj7"],
  ["F", "D", "bIII", "b3"],
  ["B", "Gb", "IV", "4"],
  ["A", "Gb", "bIII", "b3"],
  ["Am", "Am", "i", "1m"],
  ["C", "Am", "III", "3"],
  ["E7", "Am", "V7", "5(7)"],
  ["G#dim", "Am", "#vii°", "#7dim"],
  ["Bb", "Am", "bII", "b2"],
  ["Asus4", "D", "Vsus4", "5sus4"],
  ["F#dim7", "C", "#iv°7", "#4dim7"],
  ["Bø", "C", "viiø", "7ø"],
  ["C+", "C", "I+", "1+"],
  ["G", "A mixolydian", "VII", "7"],
  ["G", "D dorian", "IV", "4"],
  ["C", "D dorian", "VII", "7"],
  ["Gm", "C mixolydian", "v", "5m"],
  ["F", "E phrygian", "II", "2"],
  ["G", "F lydian", "II", "2"],
  ["Bdim", "B locrian", "i°", "1dim"],
  ["C#", "C", "bII", "b2"],
])("%s in %s is %s, %s", (text, key, roman, plain) => {
  expect(chordNumber(parseChord(text)!, parseKeyName(key)!)).toMatchObject({ roman, plain });
});

// Common practice of secondary dominants: told only where the chord they lead to follows.
test.each([
  ["D7", "G", "C", "V7/V", "5(7)/5"],
  ["D", "G7", "C", "V/V", "5/5"],
  ["A7", "Dm", "C", "V7/ii", "5(7)/2m"],
  ["E7", "Am", "C", "V7/vi", "5(7)/6m"],
  ["C7", "F", "C", "V7/IV", "5(7)/4"],
  ["B7/D#", "Em", "C", "V7/iii", "5(7)/3m"],
  ["C#dim7", "Dm7", "C", "vii°7/ii", "7dim7/2m"],
  ["F#m7b5", "G", "C", "viiø7/V", "7m7b5/5"],
  ["A7", "Dm", "Am", "V7/iv", "5(7)/4m"],
  ["B7", "E7", "Am", "V7/V", "5(7)/5"],
])("%s before %s in %s is %s", (text, next, key, roman, plain) => {
  expect(chordNumber(parseChord(text)!, parseKeyName(key)!, parseChord(next)).leadsTo).toEqual({ roman, plain });
});

test.each([
  ["G7", "C", "C"],
  ["C", "F", "C"],
  ["D7", "F", "C"],
  ["D7", null, "C"],
  ["Dm7", "G", "C"],
  ["Ab7", "Db", "C"],
  ["G7", "C", "Am"],
  ["Cmaj7", "F", "G"],
  ["Csus4", "F", "G"],
])("%s before %s in %s leads nowhere for sure", (text, next, key) => {
  expect(
    chordNumber(parseChord(text)!, parseKeyName(key)!, next === null ? null : parseChord(next)).leadsTo,
  ).toBeNull();
});
