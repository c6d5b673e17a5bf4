import { aPupil, aSilentPupil } from "@/__tests__/client/studioPeople";
import type { RosterRow } from "@/shared/contract/studio/roster";
import { readRosterView, rosterParams, shownPupils, type RosterView } from "./rosterView";

const take = (at: string, effort: number) => ({ lastTake: { at, effort } });
const open = (title: string, dueOn: string | null): Partial<RosterRow> => ({
  open: [
    {
      ...{ partId: "00000000-0000-4000-8000-000000000801", assignmentId: "00000000-0000-4000-8000-000000000802" },
      ...{ title, tonic: "C", dueOn, lowMidi: null, highMidi: null },
    },
  ],
});
const rows = [
  aPupil(1, "Maren Oake", 53, { ...take("2026-11-24T19:00:00.000Z", 2), ...open("Slack Water", "2026-12-10") }),
  aPupil(2, "Joss Pell", 48, {
    ...take("2026-11-19T19:00:00.000Z", 4),
    warnings: ["voice is changing: measure again"],
  }),
  aPupil(3, "Élodie Marsh", 59, { ...open("Bell Buoy Waltz", "2026-12-03"), waiting: 1, groupIds: ["g"] }),
  aPupil(4, "Peter Quill", null),
  aSilentPupil(5, "Cass Wether"),
  { ...aPupil(6, "Rhona Teale", 55), role: "owner" as const },
];
const usual: RosterView = { q: "", sort: "name", filter: "all", group: null };
const names = (view: Partial<RosterView>) => shownPupils(rows, { ...usual, ...view }).map(({ name }) => name);

it("lists the pupils by name, and no teachers", () => {
  expect(names({})).toEqual(["Cass Wether", "Élodie Marsh", "Joss Pell", "Maren Oake", "Peter Quill"]);
});

it("finds words in names, instruments and songs, whatever their case and their accents", () => {
  expect(names({ q: "elodie" })).toEqual(["Élodie Marsh"]);
  expect(names({ q: "slack WATER" })).toEqual(["Maren Oake"]);
  expect(names({ q: "nobody" })).toEqual([]);
});

it("puts those of whom nothing is known last in every order but the one by name", () => {
  expect(names({ sort: "voice" }).slice(0, 3)).toEqual(["Joss Pell", "Maren Oake", "Élodie Marsh"]);
  expect(names({ sort: "take" }).slice(0, 2)).toEqual(["Maren Oake", "Joss Pell"]);
  expect(names({ sort: "due" }).slice(0, 2)).toEqual(["Élodie Marsh", "Maren Oake"]);
  expect(names({ sort: "effort" }).slice(0, 2)).toEqual(["Joss Pell", "Maren Oake"]);
});

it.each([
  ["waiting", ["Élodie Marsh"]],
  ["look", ["Joss Pell"]],
  ["voiceless", ["Peter Quill"]],
  ["silent", ["Cass Wether"]],
] as const)("shows only those that %s asks for", (filter, expected) => {
  expect(names({ filter })).toEqual(expected);
});

it("shows one group", () => {
  expect(names({ group: "g" })).toEqual(["Élodie Marsh"]);
});

it("reads a view out of an address as it was written there, and takes nothing else from it", () => {
  const view: RosterView = { q: "box", sort: "voice", filter: "look", group: "g" };
  expect(readRosterView(JSON.parse(JSON.stringify(rosterParams(view))) as Record<string, string>)).toEqual(view);
  expect(readRosterView({ sort: "loudest", filter: "x" })).toEqual(usual);
});
