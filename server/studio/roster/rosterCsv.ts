import type { RosterRow } from "../../../shared/contract/studio/roster";
import { noteName } from "../../../shared/music/pitch";

const columns = [
  ...["Name", "Role", "Groups", "Joined", "Agreed", "Voice", "Lowest", "Highest", "Comfort low", "Comfort high"],
  ...["Measured", "Instrument", "Strings", "Open", "Open songs", "Last take", "Effort", "Waiting", "Look after"],
];

/** A line break ends a line (RFC 4180), and the mark in front tells spreadsheets that letters are UTF-8. */
const lineEnd = "\r\n";
const mark = "\uFEFF";

/** The roster as a table for spreadsheets. */
export function rosterCsv(rows: readonly RosterRow[], groupNames: ReadonlyMap<string, string>): string {
  const lines = rows.map((row) => cells(row, groupNames).map(csvField).join(","));
  return `${mark}${[columns.map(csvField).join(","), ...lines].join(lineEnd)}${lineEnd}`;
}

function cells(row: RosterRow, groupNames: ReadonlyMap<string, string>): string[] {
  const { voice, instrument, open, lastTake, consent } = row;
  const day = (instant: string | null | undefined) => instant?.slice(0, 10) ?? "";
  const note = (midi: number | undefined) => (midi === undefined ? "" : noteName(Math.round(midi)));
  const hidden = (count: number) => (consent.shares ? String(count) : "");
  return [
    ...[row.name, row.role, row.groupIds.flatMap((id) => groupNames.get(id) ?? []).join("; "), day(row.joinedAt)],
    consent.shares ? "yes" : consent.waitsForGuardian ? "waits for a guardian" : "no",
    ...[voice?.name ?? "", note(voice?.range.lowMidi), note(voice?.range.highMidi)],
    ...[note(voice?.comfort.lowMidi), note(voice?.comfort.highMidi), day(voice?.measuredAt)],
    ...[instrument?.name ?? "", instrument?.strings.map((string) => string.note).join(" ") ?? ""],
    ...[hidden(row.openCount), open.map(({ title, tonic }) => `${title} in ${tonic}`).join("; ")],
    ...[day(lastTake?.at), lastTake?.effort?.toString() ?? "", hidden(row.waiting), row.warnings.join("; ")],
  ];
}

/**
 * One field, quoted. What a person wrote must not become a formula in a spreadsheet: a sign that begins one gets an
 * apostrophe before it (OWASP, CSV Injection).
 */
export function csvField(text: string): string {
  const harmless = /^\s*[=+\-@\t\r\n|%＝＋－＠]/u.test(text) ? `'${text}` : text;
  return `"${harmless.replaceAll('"', '""')}"`;
}
