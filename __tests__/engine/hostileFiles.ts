import { Midi } from "@tonejs/midi";
import { strToU8, zipSync } from "fflate";

export const score = (inside: string) => `<score-partwise><part-list/><part id="P">${inside}</part></score-partwise>`;
export const oneNote = "<note><pitch><step>C</step><octave>4</octave></pitch><duration>1</duration></note>";
const midiHead = [...strToU8("MThd"), 0, 0, 0, 6, 0, 0, 0, 1, 0, 96];
const midiTrack = (events: number[]) => {
  const length = [24, 16, 8, 0].map((shift) => (events.length >> shift) & 0xff);
  return Uint8Array.from([...midiHead, ...strToU8("MTrk"), ...length, ...events]);
};
const repeated = (events: number[], times: number) => Array.from({ length: times }, () => events).flat();

/** Files that are refused: what they are, name, bytes, and what the reason says. */
export const hostile: [string, string, () => Uint8Array, RegExp][] = [
  ["an empty file", "a.mid", () => new Uint8Array(0), /empty/],
  ["a file of more than 5 MB", "a.abc", () => new Uint8Array(5_000_001), /5 MB/],
  ["a kind that is not known", "a.pdf", () => strToU8("%PDF-1.7"), /not known/],
  ["a zip bomb", "a.mxl", () => zipSync({ "bomb.xml": new Uint8Array(12_000_000) }, { level: 6 }), /unpacks/],
  [
    "a zip of many bombs",
    "a.mxl",
    () => zipSync(Object.fromEntries(Array.from({ length: 12 }, (_, k) => [`${k}.xml`, new Uint8Array(1_000_000)]))),
    /unpacks/,
  ],
  [
    "a zip of hundreds of files",
    "a.mxl",
    () => zipSync(Object.fromEntries(Array.from({ length: 300 }, (_, k) => [`${k}.txt`, new Uint8Array(1)]))),
    /unpacks/,
  ],
  ["a cut-off zip", "a.mxl", () => zipSync({ "a.xml": strToU8(score(oneNote)) }).subarray(0, 60), /damaged|no score/],
  ["a zip without a score", "a.mxl", () => zipSync({ "a.txt": strToU8("hello") }), /no score/],
  [
    "entities that multiply",
    "a.xml",
    () => {
      const entities = Array.from({ length: 30 }, (_, k) => `<!ENTITY e${k + 1} "&e${k};&e${k};">`).join("");
      return strToU8(
        `<!DOCTYPE score-partwise [<!ENTITY e0 "la">${entities}]>${score(`<measure>&e30;${oneNote}</measure>`)}`,
      );
    },
    /entities/,
  ],
  [
    "an entity that asks for another file",
    "a.xml",
    () =>
      strToU8(
        `<!DOCTYPE score-partwise [<!ENTITY x SYSTEM "file:///etc/passwd">]>${score(`<measure>${oneNote}</measure>`)}`,
      ),
    /entities/,
  ],
  ["elements without end", "a.xml", () => strToU8("<a>".repeat(300_000)), /malformed|score/],
  ["attributes without end", "a.xml", () => strToU8(`<a ${'b="c" '.repeat(300_000)}>`), /malformed|score/],
  ["an XML file that is no score", "a.xml", () => strToU8("<html><body/></html>"), /no MusicXML score/],
  [
    "a score cut off",
    "a.xml",
    () => strToU8(score(`<measure>${oneNote}</measure>`).slice(0, 90)),
    /malformed|no notes/i,
  ],
  ["a score without notes", "a.xml", () => strToU8(score("<measure/>")), /no notes/],
  [
    "a score of too many notes",
    "a.xml",
    () => strToU8(score(`<measure>${"<note/>".repeat(200_000)}</measure>`)),
    /too many notes/,
  ],
  [
    "a score of too many measures",
    "a.xml",
    () => strToU8(score(`<measure>${oneNote}</measure>${"<measure/>".repeat(100_000)}`)),
    /larger than a song/,
  ],
  [
    "a score of half a million empty measures",
    "a.xml",
    () => strToU8(score(`<measure>${oneNote}</measure>${"<measure/>".repeat(480_000)}`)),
    /larger than a song/,
  ],
  [
    "a score of half a million unknown elements",
    "a.xml",
    () => strToU8(score(`<measure>${'<b c="d"/>'.repeat(480_000)}</measure>`)),
    /malformed/,
  ],
  [
    "a score of a million signs in one text",
    "a.xml",
    () => strToU8(score(`<measure>${"&amp;".repeat(900_000)}</measure>`)),
    /malformed/,
  ],
  ["an entity that never ends", "a.xml", () => strToU8(score(`&${"a".repeat(4_000_000)}`)), /malformed/],
  ["a word of the document's own", "a.xml", () => strToU8(score(`<measure>&nbsp;${oneNote}</measure>`)), /malformed/],
  [
    "brackets that nearly end character data",
    "a.xml",
    () => strToU8(score(`<measure><![CDATA[${"]]".repeat(2_000_000)}</measure>`)),
    /malformed/,
  ],
  ["as many elements as are looked at", "a.xml", () => strToU8(score('<b c="d"/>'.repeat(440_000))), /malformed/],
  ["as many comments as are looked at", "a.xml", () => strToU8(score("<!---->".repeat(440_000))), /no notes/],
  [
    "brackets and tags that nearly end character data",
    "a.xml",
    () => strToU8(score(`<measure><![CDATA[${`${"]]".repeat(90_000)}<`.repeat(26)}</measure>`)),
    /malformed/,
  ],
  ["ends of lines only", "a.xml", () => strToU8(score("\r\n".repeat(2_400_000))), /malformed/],
  ["a million comments", "a.xml", () => strToU8(score("<!---->".repeat(700_000))), /malformed/],
  ["a name as long as the file", "a.xml", () => strToU8(`<${"a".repeat(4_900_000)}/>`), /malformed/],
  ["a document type that never ends", "a.xml", () => strToU8(`<!DOCTYPE a [${"<[".repeat(2_000_000)}`), /malformed/],
  ["two roots", "a.xml", () => strToU8(score("").repeat(2)), /malformed/],
  [
    "a zip inside a zip",
    "a.mxl",
    () => zipSync({ "a.xml": zipSync({ "b.xml": new Uint8Array(2_000_000) }) }),
    /malformed|no MusicXML/,
  ],
  [
    "repeats that go on and on",
    "a.xml",
    () =>
      strToU8(
        score(
          `<measure>${oneNote.repeat(3)}<barline><repeat direction="backward" times="20"/></barline></measure>`.repeat(
            5000,
          ),
        ),
      ),
    /too long/,
  ],
  [
    "an ABC file of a million notes",
    "a.abc",
    () => strToU8(`X:1\nK:C\n${"CDEFGABc|\n".repeat(125_000)}`),
    /too many notes/,
  ],
  ["a rest of a thousand million bars", "a.abc", () => strToU8("X:1\nK:C\nC Z999999999|C|"), /too many notes/],
  ["a length divided by nothing", "a.abc", () => strToU8("X:1\nK:C\nC/0DE|"), /lengths/],
  ["ninety thousand lines", "a.abc", () => strToU8(`X:1\nK:C\n${"C\n".repeat(90_000)}`), /10,000 notes/],
  ["an ABC file of 1 MB", "a.abc", () => strToU8(`X:1\nK:C\n${"CDEFGABc|\n".repeat(100_000)}`), /too many notes/],
  ["repeats of repeats", "a.abc", () => strToU8(`X:1\nK:C\n${"CDEF::::::::::|".repeat(5000)}`), /repeats|10,000/],
  ["parts inside parts", "a.abc", () => strToU8("X:1\nP:((((((AB)9)9)9)9)9)9\nK:C\nP:A\nC|\nP:B\nD|"), /repeats/],
  ["a note as long as a year", "a.abc", () => strToU8(`X:1\nK:C\n${"D9999|".repeat(50)}`), /lengths/],
  ["overlays without end", "a.abc", () => strToU8(`X:1\nK:C\n${"C&".repeat(90_000)}`), /too many notes/],
  ["an ABC file without a key", "a.abc", () => strToU8("X:1\nT:No key\nCDE"), /K: line/],
  ["an ABC file without notes", "a.abc", () => strToU8("X:1\nK:C\nz4|z4|"), /no notes/],
  [
    "a MIDI file of too many notes",
    "a.mid",
    () => midiTrack(repeated([0, 0x90, 60, 64, 1, 0x80, 60, 0], 150_000)),
    /too many notes/,
  ],
  ["a MIDI file whose notes never end", "a.mid", () => midiTrack(repeated([0, 0x90, 60, 64], 5000)), /too many notes/],
  [
    "a MIDI file of ends without notes",
    "a.mid",
    () => midiTrack(repeated([0, 0x80, 60, 64], 100_000)),
    /too many notes/,
  ],
  ["a MIDI file of controllers only", "a.mid", () => midiTrack(repeated([0, 0xb0, 7, 64], 410_000)), /too many notes/],
  [
    "a MIDI file that waits for years",
    "a.mid",
    () => midiTrack(repeated([0xff, 0xff, 0xff, 0x7f, 0x90, 60, 64, 0xff, 0xff, 0xff, 0x7f, 0x80, 60, 0], 50)),
    /longer than any song/,
  ],
  [
    "a MIDI file of half a million tracks",
    "a.mid",
    () => Uint8Array.from([...midiHead, ...repeated([...strToU8("MTrk"), 0, 0, 0, 0], 500_000)]),
    /far more tracks/,
  ],
  ["a MIDI file cut off", "a.mid", () => new Uint8Array(new Midi().toArray()).subarray(0, 17), /damaged/],
  [
    "a MIDI file that lies about its length",
    "a.mid",
    () => Uint8Array.from([...midiHead, ...strToU8("MTrk"), 0x7f, 0xff, 0xff, 0xff, 0]),
    /damaged/,
  ],
  [
    "a MIDI file that leads back to where it was read",
    "a.mid",
    () => midiTrack([0, 0x90, 60, 64, 1, 0x80, 60, 0, 0, 0xff, 0x7f, 0x8f, 0xff, 0xff, 0xff, 0x7a]),
    /damaged/,
  ],
  [
    "a MIDI file whose text ends behind it",
    "a.mid",
    () => midiTrack([0, 0x90, 60, 64, 1, 0x80, 60, 0, 0, 0xff, 1, 40, 65]),
    /damaged/,
  ],
  ["a MIDI file that ends within a note", "a.mid", () => midiTrack([0, 0x90, 60, 64, 1, 0x80]), /damaged/],
  [
    "a MIDI file that goes back in time",
    "a.mid",
    () => midiTrack([0x88, 0x80, 0x80, 0x80, 0, 0x90, 60, 64]),
    /damaged/,
  ],
  ["a MIDI file without kinds of events", "a.mid", () => midiTrack([0, 60, 64]), /damaged/],
  ["a MIDI file of 5 MB of the smallest events", "a.mid", () => midiTrack(repeated([0], 4_900_000)), /too many notes/],
  [
    "a MIDI file of as many small events as it may hold",
    "a.mid",
    () => midiTrack([0, 0xc0, 1, ...repeated([0, 1], 990_000)]),
    /too many notes/,
  ],
  [
    "a MIDI file that counts film frames",
    "a.mid",
    () => midiTrack([0, 0x90, 60, 64, 1, 0x80, 60, 0]).with(12, 0xe7),
    /film frames/,
  ],
  [
    "a MIDI file whose beat has no ticks",
    "a.mid",
    () => midiTrack([0, 0x90, 60, 64, 1, 0x80, 60, 0]).with(13, 0),
    /damaged/,
  ],
  ["text that calls itself MIDI", "a.mid", () => strToU8("hello"), /no MIDI/],
];
