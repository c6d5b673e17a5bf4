import { transposeChart, parseChart, type ChartLine } from "@/shared/songs/chart";
import type { KeyName } from "@/shared/music/keyName";
import type { Song } from "@/shared/contract/song";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";

/** A line of the chart and when it is sung. */
export interface TimedLine {
  at: number;
  end: number;
  line: ChartLine;
}

type SungLine = ChartLine & { lyrics: string };

const bare = (words: string) => words.replace(/\s+/g, "").toLowerCase();
const isSung = (line: ChartLine): line is SungLine => "lyrics" in line && line.lyrics.trim() !== "";

/** The lines of the chart in the key, in the time of the plan; without a tune the lines of each part share its time. */
export function timedLines(song: Pick<Song, "chart" | "writtenKey">, to: KeyName, plan: BackingPlan): TimedLine[] {
  const written = parseChart(song.chart);
  const moved = song.writtenKey ? transposeChart(written, song.writtenKey, to) : written;
  if (plan.phrases.length > 0) {
    const lines = moved.sections.flatMap((section) => section.lines.filter(isSung));
    const known = new Map(lines.map((line) => [bare(line.lyrics), line]));
    return plan.phrases.flatMap(({ at, end, label }) => {
      const line = label === null ? null : known.get(bare(label));
      return line ? [{ at, end, line }] : [];
    });
  }
  return plan.parts.flatMap(({ at, end, label }) => {
    const section =
      moved.sections.find((each) => each.label === label && each.lines.some(isSung)) ??
      (label === null ? moved.sections.find((each) => each.lines.some(isSung)) : undefined);
    const lines = section?.lines.filter(isSung) ?? [];
    const share = (end - at) / Math.max(1, lines.length);
    return lines.map((line, k) => ({ at: at + k * share, end: at + (k + 1) * share, line }));
  });
}
