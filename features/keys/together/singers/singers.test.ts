import { voiceTypes } from "@/shared/keys/voiceTypes";
import { calledAs, freeName, knownSingers, readSingers, sourceLines, type Singer } from "./singers";

const notes = { range: { lowMidi: 48, highMidi: 67 }, comfort: { lowMidi: 50, highMidi: 64 } };
const group: Singer[] = [
  { id: "a", kind: "voice", voiceId: "v1", name: null },
  { id: "b", kind: "voice", voiceId: "v2", name: "Ben" },
  { id: "c", kind: "voice", voiceId: "gone", name: null },
  { id: "d", kind: "type", type: "soprano", name: "Soprano" },
  { id: "e", kind: "hand", name: "Nils", notes },
];
const types = [
  {
    id: "soprano",
    name: "Soprano",
    kind: "voice" as const,
    voice: { range: { lowMidi: 60, highMidi: 81 }, comfort: { lowMidi: 63, highMidi: 77 } },
    source: "a table",
  },
];

test("each singer stands with name, notes and where they come from, or with what is lacking", () => {
  const own = [
    {
      id: "v1",
      name: "Evenings",
      singing: {
        range: { lowMidi: 51.2, highMidi: 73.8 },
        comfort: { lowMidi: 55, highMidi: 70 },
        heard: { lowMidi: 53, highMidi: 72 },
      },
    },
    { id: "v2", name: "Tenor part", singing: null },
  ];
  const known = knownSingers(group, own, types);
  expect(known.map(({ name, origin, lacks }) => [name, origin, lacks])).toEqual([
    ["Evenings", "Sung, reach estimated, E♭3 to D5", null],
    ["Ben", "Nothing sung yet", "notes"],
    ["A voice", "This voice is no longer kept here", "voice"],
    ["Soprano", "Table figure, C4 to A5", null],
    ["Nils", "Typed, C3 to G4", null],
  ]);
  expect(known[0]?.voice?.range).toEqual({ lowMidi: 51, highMidi: 74 });
});

test("a name is given once", () => {
  expect(freeName("Soprano", ["Maren"])).toBe("Soprano");
  expect(freeName("soprano", ["Soprano", "Soprano 2"])).toBe("soprano 3");
});

test("what was kept is read back; what is damaged is left out", () => {
  expect(readSingers(JSON.stringify(group))).toEqual(group);
  expect(readSingers(null)).toEqual([]);
  expect(readSingers("{")).toEqual([]);
  expect(readSingers('{"a":1}')).toEqual([]);
  const upsideDown = { ...notes, range: { lowMidi: 70, highMidi: 40 } };
  const wide = { ...notes, comfort: { lowMidi: 40, highMidi: 64 } };
  const damaged = [
    null,
    3,
    { id: "x", kind: "hand", name: "", notes },
    { id: "x", kind: "hand", name: "X", notes: upsideDown },
    { id: "x", kind: "hand", name: "X", notes: wide },
    { id: "x", kind: "choir", name: "X" },
    { id: "y", kind: "type", type: "bass", name: "Bass" },
    { id: "y", kind: "type", type: "bass", name: "The same again" },
  ];
  expect(readSingers(JSON.stringify(damaged))).toEqual([{ id: "y", kind: "type", type: "bass", name: "Bass" }]);
});

test("plain voices are called as one, and every one of them has its source", () => {
  expect(calledAs({ name: "Men in unison", kind: "group" })).toBe("Men’s unison");
  expect(calledAs({ name: "Alto", kind: "voice" })).toBe("Alto");
  const lines = sourceLines(voiceTypes);
  expect(lines[0]).toMatch(/^Soprano to Bass\. Range: .*New Harvard Dictionary of Music, 1986.*\.$/);
  expect(lines.join(" ")).toMatch(/Women in unison.*Men in unison.*Children in unison/);
});
