import { Midi } from "@tonejs/midi";
import { strToU8 } from "fflate";
import type { MelodyNote } from "./melody";
import { type MelodyFile, readMelodyFile } from "./melodyFile";

type Read = Extract<MelodyFile, { ok: true }>;
function read(name: string, content: string | Uint8Array): Read {
  const file = readMelodyFile(name, typeof content === "string" ? strToU8(content) : content);
  if (!file.ok) throw new Error(file.reason);
  return file;
}
const sung = (file: Read) => file.voices[file.proposed]!;
/** Notes as [start, duration, midi]. */
const plain = (notes: readonly MelodyNote[]) => notes.map(({ start, duration, midi }) => [start, duration, midi]);

describe("Standard MIDI Files", () => {
  // The bytes of a published worked example: header, 2/4, C major, 90 beats a minute, G4 held for 430 of 480 ticks.
  test("read byte by byte give the length the format's example states", () => {
    const hex =
      "4D546864000000060001000201E0 4D54726B00000019 00FF58040202 1808 00FF590200 00 00FF5103 0A2C2B 00FF2F00 4D54726B0000000D 00904347 832E804324 00FF2F00";
    const bytes = Uint8Array.from(hex.replaceAll(" ", "").match(/../g)!, (pair) => Number.parseInt(pair, 16));
    expect(plain(sung(read("x.mid", bytes)).melody.notes)).toEqual([[0, 430 / 480, 67]]);
  });

  function song(): Midi {
    const midi = new Midi();
    midi.header.setTempo(90);
    const bass = midi.addTrack();
    bass.name = "Bass";
    bass.instrument.number = 33;
    const voice = midi.addTrack();
    voice.name = "Vocal";
    const drums = midi.addTrack();
    drums.channel = 9;
    [62, 64, 66, 67, 69, 66, 64, 62].forEach((pitch, index) => {
      voice.addNote({ midi: pitch, ticks: index * 480, durationTicks: 480 });
      bass.addNote({ midi: 38, ticks: index * 480, durationTicks: 240 });
      drums.addNote({ midi: 36, ticks: index * 480, durationTicks: 60 });
    });
    return midi;
  }

  test("list their tracks, propose the vocal line and find its home note", () => {
    const file = read("x.mid", song().toArray());
    expect(file.voices.map(({ name }) => name)).toEqual(["Bass", "Vocal", "Track 3"]);
    expect(file.proposed).toBe(1);
    expect(sung(file).melody).toMatchObject({ home: "D", mode: "major" });
    expect(plain(sung(file).melody.notes).slice(0, 2)).toEqual([
      [0, 1, 62],
      [1, 1, 64],
    ]);
  });

  /** One track: a key signature event, then the notes of a scale from D. */
  function withSignature(fifths: number, minor: boolean): Uint8Array {
    const notes = [62, 64, 66, 67, 69, 66, 64, 62].flatMap((pitch) => [0, 0x90, pitch, 64, 96, 0x80, pitch, 0]);
    const events = [0, 0xff, 0x59, 2, fifths & 0xff, minor ? 1 : 0, ...notes, 0, 0xff, 0x2f, 0];
    return Uint8Array.of(
      ...strToU8("MThd"),
      0,
      0,
      0,
      6,
      0,
      0,
      0,
      1,
      0,
      96,
      ...strToU8("MTrk"),
      0,
      0,
      0,
      events.length,
      ...events,
    );
  }

  test.each([
    [1, false, "G", "major"],
    [-3, true, "C", "minor"],
    [0, true, "A", "minor"],
    [6, false, "F#", "major"],
  ])("that state a key, %i sharps, minor %s, are believed", (fifths, minor, home, mode) => {
    expect(sung(read("x.mid", withSignature(fifths, minor))).melody).toMatchObject({ home, mode });
  });

  test("with the C major that nobody edited are asked for their notes", () => {
    expect(sung(read("x.mid", withSignature(0, false))).melody).toMatchObject({ home: "D", mode: "major" });
  });

  test("with notes that overlap become a single line", () => {
    const midi = new Midi();
    const track = midi.addTrack();
    for (const [pitch, ticks, durationTicks] of [
      [60, 0, 500],
      [62, 480, 480],
      [67, 960, 960],
      [48, 1080, 480],
      [64, 1920, 480],
    ] as const) {
      track.addNote({ midi: pitch, ticks, durationTicks });
    }
    expect(plain(sung(read("x.mid", midi.toArray())).melody.notes)).toEqual([
      [0, 1, 60],
      [1, 1, 62],
      [2, 2, 67],
      [4, 1, 64],
    ]);
  });
});
