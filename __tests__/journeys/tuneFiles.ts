import { strToU8, zipSync } from "fflate";

/** Our own tune as syllables with their notes: [syllable, midi, quarter notes]. */
const sung: [string, number, number][] = [
  ["Lan-", 62, 1],
  ["terns", 64, 1],
  ["on", 66, 1],
  ["the", 67, 1],
  ["quay,", 69, 2],
  ["low", 66, 1],
  ["tide", 64, 1],
  ["a-", 67, 1],
  ["way", 66, 1],
  ["to", 64, 1],
  ["sea.", 62, 3],
];

/** A Standard MIDI File of format 1 with a piano track and a track "Voice" with lyrics; lengths by MMA RP-001. */
export function twoTrackMidi(): Buffer {
  const ticks = (quarters: number) => {
    const value = quarters * 480;
    return value < 128 ? [value] : value < 16_384 ? [0x80 | (value >> 7), value & 127] : [0x81, 0x80, 0];
  };
  const text = (kind: number, words: string) => [0, 0xff, kind, words.length, ...strToU8(words)];
  const conductor = [0, 0xff, 0x51, 3, 0x0a, 0x2c, 0x2a, 0, 0xff, 0x58, 4, 4, 2, 24, 8];
  const piano = [...text(3, "Piano")];
  for (const chord of [50, 55, 57, 50]) {
    const notes = [chord, chord + 4, chord + 7];
    for (const note of notes) piano.push(0, 0x91, note, 60);
    piano.push(...ticks(4), 0x81, notes[0]!, 0, 0, 0x81, notes[1]!, 0, 0, 0x81, notes[2]!, 0);
  }
  const voice = [...text(3, "Voice")];
  for (const [syllable, note, quarters] of sung)
    voice.push(...text(5, syllable), 0, 0x90, note, 80, ...ticks(quarters), 0x80, note, 0);
  const chunk = (events: number[]) => {
    const all = [...events, 0, 0xff, 0x2f, 0];
    return [...strToU8("MTrk"), 0, 0, all.length >> 8, all.length & 255, ...all];
  };
  const head = [...strToU8("MThd"), 0, 0, 0, 6, 0, 1, 0, 3, 1, 0xe0];
  return Buffer.from([...head, ...chunk(conductor), ...chunk(piano), ...chunk(voice)]);
}

const pitch = (midi: number) => {
  const [step, alter] = (["C", "C1", "D", "D1", "E", "F", "F1", "G", "G1", "A", "A1", "B"] as const)[midi % 12]!;
  return `<pitch><step>${step!}</step>${alter ? "<alter>1</alter>" : ""}<octave>${Math.floor(midi / 12) - 1}</octave></pitch>`;
};

/** The same tune as compressed MusicXML with its container. */
export function packedScore(): Buffer {
  const notes = sung.map(([syllable, midi, quarters]) => {
    const [text, syllabic] = syllable.endsWith("-") ? [syllable.slice(0, -1), "begin"] : [syllable, "single"];
    const lyric = `<lyric number="1"><syllabic>${syllabic}</syllabic><text>${text}</text></lyric>`;
    return `<note>${pitch(midi)}<duration>${quarters}</duration><voice>1</voice>${lyric}</note>`;
  });
  const score = `<?xml version="1.0"?><score-partwise version="4.0"><work><work-title>Quay Lanterns</work-title></work><part-list><score-part id="P1"><part-name>Voice</part-name></score-part></part-list><part id="P1"><measure number="1"><attributes><divisions>1</divisions><key><fifths>2</fifths><mode>major</mode></key><time><beats>4</beats><beat-type>4</beat-type></time></attributes>${notes.join("")}</measure></part></score-partwise>`;
  const container = `<container><rootfiles><rootfile full-path="quay.musicxml"/></rootfiles></container>`;
  return Buffer.from(zipSync({ "META-INF/container.xml": strToU8(container), "quay.musicxml": strToU8(score) }));
}

/** A score of nearly 5 MB that takes long to read and is refused in the end. */
export function endlessScore(): Buffer {
  const note = `<note><pitch><step>D</step><octave>4</octave></pitch><duration>1</duration></note>`;
  const bar = `<measure>${note.repeat(11)}<barline><repeat direction="backward" times="20"/></barline></measure>`;
  return Buffer.from(`<score-partwise><part-list/><part id="P">${bar.repeat(4600)}</part></score-partwise>`);
}
