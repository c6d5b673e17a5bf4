import { glyphs, hzToMidi, midiToHz, noteName, parseNoteName, pitchClass, plainAccidentals } from "./pitch";

/** E2 to C6 in equal temperament, A4 = 440 Hz (ISO 16:1975), by arithmetic: 440 * 2^((m - 69) / 12), rounded to 0.001 Hz. */
const table = `
E2 40 82.407, F2 41 87.307, F#2 42 92.499, G2 43 97.999, G#2 44 103.826, A2 45 110.000, A#2 46 116.541, B2 47 123.471,
C3 48 130.813, C#3 49 138.591, D3 50 146.832, D#3 51 155.563, E3 52 164.814, F3 53 174.614, F#3 54 184.997, G3 55 195.998,
G#3 56 207.652, A3 57 220.000, A#3 58 233.082, B3 59 246.942, C4 60 261.626, C#4 61 277.183, D4 62 293.665, D#4 63 311.127,
E4 64 329.628, F4 65 349.228, F#4 66 369.994, G4 67 391.995, G#4 68 415.305, A4 69 440.000, A#4 70 466.164, B4 71 493.883,
C5 72 523.251, C#5 73 554.365, D5 74 587.330, D#5 75 622.254, E5 76 659.255, F5 77 698.456, F#5 78 739.989, G5 79 783.991,
G#5 80 830.609, A5 81 880.000, A#5 82 932.328, B5 83 987.767, C6 84 1046.502`
  .split(",")
  .map((row) => row.trim().split(" "))
  .map(([name, midi, hz]) => ({ name: name!, midi: Number(midi), hz: Number(hz) }));

test("the table of frequencies holds both ways, and so do the names", () => {
  expect(table).toHaveLength(45);
  for (const { name, midi, hz } of table) {
    expect(Math.abs(midiToHz(midi) - hz)).toBeLessThanOrEqual(0.0005001);
    expect(hzToMidi(hz)).toBeCloseTo(midi, 3);
    expect(noteName(midi, "sharps")).toBe(name);
    expect(parseNoteName(name)).toBe(midi);
  }
});

test("readings between notes come out in cents", () => {
  expect((hzToMidi(450) - 69) * 100).toBeCloseTo(38.9, 1);
  expect((hzToMidi(247) - 59) * 100).toBeCloseTo(0.4, 1);
});

test("intervals of just intonation measure as the textbooks have them", () => {
  const cents = (a: number, b: number) => 100 * (hzToMidi(a) - hzToMidi(b));
  expect(cents(3, 2)).toBeCloseTo(701.955, 3);
  expect(cents(5, 4)).toBeCloseTo(386.314, 3);
  expect(cents(6, 5)).toBeCloseTo(315.641, 3);
});

test("another tuning pitch moves everything alike", () => {
  expect(midiToHz(69, 415)).toBe(415);
  expect(hzToMidi(midiToHz(52.3, 432), 432)).toBeCloseTo(52.3, 9);
});

test("names are read as people type them and written with glyphs for people", () => {
  expect(parseNoteName(" b♭3 ")).toBe(58);
  expect(parseNoteName("H3")).toBeNull();
  expect(parseNoteName("C")).toBeNull();
  expect(noteName(66, "flats")).toBe("Gb4");
  expect(glyphs("F#m7b5 to Bb3")).toBe("F♯m7♭5 to B♭3");
  expect(plainAccidentals("E♭")).toBe("Eb");
  expect(pitchClass(-1)).toBe(11);
});

test("frequencies and notes that cannot be are the caller's mistake", () => {
  expect(() => midiToHz(60, 0)).toThrow(RangeError);
  expect(() => hzToMidi(0)).toThrow(RangeError);
  expect(() => noteName(Number.NaN)).toThrow(RangeError);
});

describe("glyphs", () => {
  test.each([
    ["Above the band, Abandon Bb and Ebb", "Above the band, Abandon B♭ and E♭♭"],
    ["Bbm7 Ebmaj7 Abdim Dbsus4 Gbadd9 Bb/D F#/A#", "B♭m7 E♭maj7 A♭dim D♭sus4 G♭add9 B♭/D F♯/A♯"],
    ["Cm7b5 G7#9 C7b9 Ab", "Cm7♭5 G7♯9 C7♭9 A♭"],
    ["web2 and C4", "web2 and C4"],
  ])("sets %s as %s", (plain, set) => {
    expect(glyphs(plain)).toBe(set);
  });
});

test("a note that stands in no key goes by its commonest name", () => {
  const names = [61, 63, 66, 68, 70, 60].map((midi) => noteName(midi, "common"));
  expect(names).toEqual(["C#4", "Eb4", "F#4", "Ab4", "Bb4", "C4"]);
});
