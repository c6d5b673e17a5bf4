import type { Song } from "@/shared/contract/song";

type Content = Pick<Song, "chart" | "tune" | "title">;

/**
 * What two songs share that are the same: words, chords and tune, however their lines end and whatever they are
 * called. Where there is neither chart nor tune, the title has to tell.
 */
export function contentSign({ chart, tune, title }: Content): string {
  const lines = chart
    .replace(/\r\n?/g, "\n")
    .split("\n")
    .map((line) => line.trimEnd())
    .filter((line) => line !== "");
  if (lines.length === 0 && !tune) return JSON.stringify([title]);
  const notes =
    tune?.kind === "melody"
      ? tune.notes.map(({ midi, duration }) => [Math.round(midi), Math.round(duration * 48)])
      : tune && [tune.lowMidi, tune.highMidi, tune.home];
  return JSON.stringify([lines, notes ?? null]);
}
