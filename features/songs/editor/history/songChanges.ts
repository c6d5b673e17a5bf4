import { diffIndices } from "node-diff3";
import { contentNames, sameContent, type SongContent } from "../keep/mergeSongs";
import { fieldWords, valueWords } from "../keep/contentWords";

/** A line of a chart that is the same in both states, or stands in one of them only. */
export interface ChangedLine {
  kind: "same" | "gone" | "new";
  text: string;
}

/** So many unchanged lines stay around a change. */
const around = 2;

/** The lines of two charts that differ, with those around them; null where lines between are left out. */
export function changedLines(before: string, after: string): (ChangedLine | null)[] {
  const old = before.split("\n");
  const now = after.split("\n");
  const all: ChangedLine[] = [];
  let at = 0;
  const same = (to: number) => {
    for (; at < to; at += 1) all.push({ kind: "same", text: old[at] ?? "" });
  };
  for (const { buffer1, buffer1Content, buffer2Content } of diffIndices(old, now)) {
    same(buffer1[0]);
    for (const text of buffer1Content) all.push({ kind: "gone", text });
    for (const text of buffer2Content) all.push({ kind: "new", text });
    at = buffer1[0] + buffer1[1];
  }
  same(old.length);
  const near = all.map((_, index) =>
    all.slice(Math.max(0, index - around), index + around + 1).some(({ kind }) => kind !== "same"),
  );
  return all.flatMap((line, index) => (near[index] ? [line] : index > 0 && near[index - 1] ? [null] : []));
}

/** What one state has that another has not, in a few words each: "Title: Low → High". */
export function changeWords(before: SongContent, after: SongContent): string[] {
  const changed = contentNames.filter((name) => !sameContent({ ...before, [name]: after[name] }, before));
  return changed.map((name) =>
    name === "chart"
      ? `Chart: ${lineWords(before.chart, after.chart)}`
      : `${fieldWords[name]}: ${valueWords(name, before)} → ${valueWords(name, after)}`,
  );
}

function lineWords(before: string, after: string): string {
  let gone = 0;
  let added = 0;
  for (const { buffer1, buffer2 } of diffIndices(before.split("\n"), after.split("\n"))) {
    gone += buffer1[1];
    added += buffer2[1];
  }
  const changed = Math.min(gone, added);
  const counted = (count: number, what: string) =>
    count === 0 ? [] : [`${count} ${count === 1 ? "line" : "lines"} ${what}`];
  return [
    ...counted(changed, "changed"),
    ...counted(added - changed, "added"),
    ...counted(gone - changed, "taken out"),
  ].join(", ");
}
