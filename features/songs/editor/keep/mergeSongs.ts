import { diff3Merge } from "node-diff3";
import type { Song } from "@/shared/contract/song";

/** What the editor changes of a song. */
export const contentNames = ["title", "chart", "writtenKey", "tune", "beatsPerBar", "tempo"] as const;
export type ContentName = (typeof contentNames)[number];
export type SongContent = Pick<Song, ContentName>;

export function contentOf(song: SongContent): SongContent {
  const { title, chart, writtenKey, tune, beatsPerBar, tempo } = song;
  return { title, chart, writtenKey, tune, beatsPerBar, tempo };
}

export function sameContent(a: SongContent, b: SongContent): boolean {
  return contentNames.every((name) => same(a[name], b[name]));
}

/** A place where both changed the same thing in different ways. */
export interface Clash {
  name: ContentName;
  /** lines of the chart; for any other field there are none */
  lines: { mine: readonly string[]; theirs: readonly string[] } | null;
}

export type Side = "mine" | "theirs" | "both";

export interface SongMerge {
  clashes: readonly Clash[];
  /** Both changes put together; one side for each clash, in order. */
  resolve(sides: readonly Side[]): SongContent;
}

/**
 * Puts two changes of one song together, line by line in the chart and field by field elsewhere.
 *
 * @param base the song both began from
 */
export function mergeSongs(base: SongContent, mine: SongContent, theirs: SongContent): SongMerge {
  const fields = contentNames.filter((name) => name !== "chart");
  const merged = contentOf(mine);
  const clashing = fields.filter((name) => {
    if (same(mine[name], theirs[name]) || same(theirs[name], base[name])) return false;
    if (!same(mine[name], base[name])) return true;
    Object.assign(merged, { [name]: theirs[name] });
    return false;
  });
  const rows = (song: SongContent) => song.chart.split("\n");
  const regions = diff3Merge(rows(mine), rows(base), rows(theirs), { excludeFalseConflicts: true });
  const chartClashes = regions.flatMap(({ conflict }): Clash[] =>
    conflict ? [{ name: "chart", lines: { mine: conflict.a, theirs: conflict.b } }] : [],
  );
  return {
    clashes: [...clashing.map((name): Clash => ({ name, lines: null })), ...chartClashes],
    resolve(sides) {
      const resolved = { ...merged };
      clashing.forEach((name, index) => {
        if (sides[index] === "theirs") Object.assign(resolved, { [name]: theirs[name] });
      });
      let next = clashing.length;
      const chart = regions.flatMap(({ ok, conflict }) => {
        if (!conflict) return ok ?? [];
        const side = sides[next++] ?? "mine";
        return [...(side === "theirs" ? [] : conflict.a), ...(side === "mine" ? [] : conflict.b)];
      });
      return { ...resolved, chart: chart.join("\n") };
    },
  };
}

function same(a: unknown, b: unknown): boolean {
  return a === b || JSON.stringify(sorted(a)) === JSON.stringify(sorted(b));
}

/** Places that keep songs may give an object's fields in another order. */
function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (value === null || typeof value !== "object") return value;
  return Object.fromEntries(
    Object.entries(value)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([name, each]) => [name, sorted(each)]),
  );
}
