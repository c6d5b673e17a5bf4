import type { DemoSong } from "./demoSong";

/** How a demonstration song stood earlier. */
export interface EarlierChart {
  chart: string;
  /** ISO instant */
  savedAt: string;
}

const day = 24 * 60 * 60 * 1000;

/**
 * The earlier charts of a demonstration song, dated back from when it came to stand as it does.
 *
 * @param song the song
 * @param to that instant, milliseconds since 1970
 * @returns the oldest first; none for songs without a history
 */
export function earlierCharts({ earlier = [] }: Pick<DemoSong, "earlier">, to: number): EarlierChart[] {
  let left = earlier.reduce((sum, { days }) => sum + days, 0);
  return earlier.map(({ chart, days }) => {
    const savedAt = new Date(to - left * day).toISOString();
    left -= days;
    return { chart, savedAt };
  });
}
