import { strToU8 } from "fflate";
import { readMelodyFile, type MelodyFile } from "./melodyFile";

type Event = number[];
const meta = (kind: number, data: readonly number[]): Event => [0, 0xff, kind, data.length, ...data];
const text = (kind: number, words: string) => meta(kind, [...strToU8(words)]);
const note = (midi: number, channel = 0): Event => [0, 0x90 | channel, midi, 80, 96, 0x80 | channel, midi, 0];
const track = (...events: Event[]) => {
  const all = [...events.flat(), 0, 0xff, 0x2f, 0];
  return [...strToU8("MTrk"), 0, 0, all.length >> 8, all.length & 255, ...all];
};
const midi = (format: number, ...tracks: number[][]) =>
  Uint8Array.from([...strToU8("MThd"), 0, 0, 0, 6, 0, format, 0, tracks.length, 0, 96, ...tracks.flat()]);
function read(bytes: Uint8Array): Extract<MelodyFile, { ok: true }> {
  const file = readMelodyFile("x.kar", bytes);
  if (!file.ok) throw new Error(file.reason);
  return file;
}
const words = (bytes: Uint8Array) => {
  const file = read(bytes);
  return file.voices[file.proposed]!.lyrics;
};

test("lyric events stand under the notes of their own track, and speak for it", () => {
  const bytes = midi(
    1,
    track(text(3, "Melody"), note(48), note(50), note(52), note(53)),
    track(text(3, "Two"), text(5, "low "), note(62), text(5, "tide "), note(64), note(66), note(67)),
  );
  const file = read(bytes);
  expect(file.voices.map(({ lyrics }) => lyrics?.map((syllable) => syllable.text))).toEqual([
    undefined,
    ["low", "tide"],
  ]);
  expect(file.voices[1]!.reasons[0]).toBe("It has words.");
  expect(file.voices[1]!.melody.notes.map(({ lyric }) => lyric)).toEqual(["low", "tide", undefined, undefined]);
});

test("the texts of a karaoke file have lines and syllables, its remarks a title", () => {
  const bytes = midi(
    1,
    track(text(3, "Words"), text(1, "@KMIDI"), text(1, "@TQuay Song"), text(1, "\\Lan"), [
      ...[96, 0xff, 1, 6, ...strToU8("terns ")],
      ...[96, 0xff, 1, 3, ...strToU8("on ")],
      ...[96, 0xff, 1, 5, ...strToU8("/quay")],
    ]),
    track(text(3, "Tune"), note(62), note(64), note(66), note(67)),
  );
  expect(read(bytes).title).toBe("Quay Song");
  expect(words(bytes)).toEqual([
    { start: 0, text: "Lan-", newLine: true },
    { start: 1, text: "terns" },
    { start: 2, text: "on" },
    { start: 3, text: "quay", newLine: true },
  ]);
});

test.each([
  ["UTF-8", [0xc3, 0xa9], "é"],
  ["Windows-1252", [0xe9], "é"],
  ["Windows-1252's own quotation marks", [0x93, 0x61, 0x94], "“a”"],
])("words in %s are read", (_, bytes, expected) => {
  expect(words(midi(0, track(meta(5, bytes), note(62), text(5, "la"), note(64))))?.[0]?.text).toBe(expected);
});

test("a file of one track has a voice for each channel, and drums are known as such", () => {
  const bytes = midi(0, track(note(62), note(38, 9), note(64), note(38, 9), [0, 0xc1, 33], note(40, 1), note(43, 1)));
  const file = read(bytes);
  expect(file.voices.map(({ name }) => name)).toEqual([
    "Track 1, channel 1",
    "Track 1, channel 10",
    "Track 1, channel 2",
  ]);
  expect(file.proposed).toBe(0);
  expect(file.voices[1]!.reasons[0]).toBe("It is drums.");
  expect(file.voices[2]!.reasons).toContain("Its sound is a bass.");
});

test("running status and a note-on of no loudness as its end are understood; the first speed and metre are told", () => {
  const bytes = midi(
    1,
    track(meta(0x51, [0x0a, 0x2c, 0x2b]), meta(0x58, [6, 3, 24, 8])),
    track([0, 0x90, 60, 80, 96, 60, 0, 0, 62, 80, 48, 62, 0]),
  );
  const file = read(bytes);
  expect(file.voices[0]!.melody.notes).toEqual([
    { start: 0, duration: 1, midi: 60 },
    { start: 1, duration: 0.5, midi: 62 },
  ]);
  // 666,667 µs a quarter are 90 a minute (FF 51 03, MMA RP-001).
  expect([file.tempo, file.beatsPerBar]).toEqual([90, 6]);
});
