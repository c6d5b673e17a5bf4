import type { RosterRow } from "@/shared/contract/studio/roster";

export type RosterSort = "name" | "voice" | "take" | "due" | "effort";
export type RosterFilter = "all" | "waiting" | "look" | "voiceless" | "silent";

/** What of the roster is looked at, and in which order. */
export interface RosterView {
  q: string;
  sort: RosterSort;
  filter: RosterFilter;
  /** only one group; null for everybody */
  group: string | null;
}

export const rosterSorts: readonly { value: RosterSort; label: string }[] = [
  { value: "name", label: "by name" },
  { value: "voice", label: "lowest voice first" },
  { value: "take", label: "last take first" },
  { value: "due", label: "due first" },
  { value: "effort", label: "hardest first" },
];

export const rosterFilters: readonly { value: RosterFilter; label: string }[] = [
  { value: "all", label: "Everybody" },
  { value: "waiting", label: "Takes to hear" },
  { value: "look", label: "To look after" },
  { value: "voiceless", label: "No voice yet" },
  { value: "silent", label: "Not agreed" },
];

const passes: Record<RosterFilter, (row: RosterRow) => boolean> = {
  all: () => true,
  waiting: ({ waiting }) => waiting > 0,
  look: ({ warnings }) => warnings.length > 0,
  voiceless: ({ consent, voice }) => consent.shares && voice === null,
  silent: ({ consent }) => !consent.shares,
};

/** Words as they are compared: without case and without marks on letters. */
const plain = (text: string) => text.normalize("NFD").replace(/\p{M}/gu, "").toLowerCase();

const last = "\uffff";
const byName = (a: RosterRow, b: RosterRow) =>
  a.name.localeCompare(b.name, "en") || a.memberId.localeCompare(b.memberId);
const middle = ({ voice }: RosterRow) => (voice ? voice.comfort.lowMidi + voice.comfort.highMidi : Infinity);
const nextDue = ({ open }: RosterRow) =>
  open.reduce((soonest, { dueOn }) => (dueOn !== null && dueOn < soonest ? dueOn : soonest), last);
const effort = ({ lastTake }: RosterRow) => lastTake?.effort ?? 0;

const orders: Record<RosterSort, (a: RosterRow, b: RosterRow) => number> = {
  name: byName,
  voice: (a, b) => compare(middle(a), middle(b)),
  take: (a, b) => compare(b.lastTake?.at ?? "", a.lastTake?.at ?? ""),
  due: (a, b) => compare(nextDue(a), nextDue(b)),
  effort: (a, b) => effort(b) - effort(a),
};

function compare<Value extends string | number>(a: Value, b: Value): number {
  return a === b ? 0 : a < b ? -1 : 1;
}

/** The pupils of a roster; teachers are no part of the table. */
export function pupilsOf(rows: readonly RosterRow[]): RosterRow[] {
  return rows.filter(({ role }) => role === "pupil");
}

/** The pupils that a view finds, in its order; equal ones by name. Words are looked for in names, instruments and songs. */
export function shownPupils(rows: readonly RosterRow[], { q, sort, filter, group }: RosterView): RosterRow[] {
  const words = plain(q).split(/\s+/).filter(Boolean);
  const found = pupilsOf(rows).filter((row) => {
    if (!passes[filter](row) || (group !== null && !row.groupIds.includes(group))) return false;
    const text = plain([row.name, row.instrument?.name ?? "", ...row.open.map(({ title }) => title)].join(" "));
    return words.every((word) => text.includes(word));
  });
  return found.sort((a, b) => orders[sort](a, b) || byName(a, b));
}

/** A view out of an address; what cannot be read is as usual. */
export function readRosterView(params: Partial<Record<keyof RosterView, string>>): RosterView {
  const { q = "", sort, filter, group } = params;
  return {
    q,
    sort: rosterSorts.find(({ value }) => value === sort)?.value ?? "name",
    filter: rosterFilters.find(({ value }) => value === filter)?.value ?? "all",
    group: group === undefined || group === "" ? null : group,
  };
}

/** A view as parts of an address; what is as usual is left out. */
export function rosterParams({ q, sort, filter, group }: RosterView) {
  return {
    q: q === "" ? undefined : q,
    sort: sort === "name" ? undefined : sort,
    filter: filter === "all" ? undefined : filter,
    group: group ?? undefined,
  };
}
