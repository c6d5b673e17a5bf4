import type { Song } from "@/shared/contract/song";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { planBacking, USUAL_TEMPO } from "@/shared/songs/backing/planBacking";
import type { RightHand } from "@/shared/songs/backing/rightHand";

/** How the singer wants to try. */
export interface TryWishes {
  hand: RightHand;
  /** quarter notes a minute */
  tempo: number;
  countInBars: 1 | 2;
  guide: boolean;
  /** the backing is heard; else the beat is only seen */
  backing: boolean;
  headphones: boolean;
  length: "once" | "whole";
}

/** The key that is tried. */
export interface TriedKey {
  tonic: string;
  /** semitones from the tune as written, octave included */
  shift: number;
}

/** A backing longer than this is not recorded whole. */
const longestPlanS = 225;
export const tempoLimits = { low: 40, high: 240 } as const;

/** What a song suggests. */
export function usualWishes(song: Pick<Song, "tempo">): TryWishes {
  const tempo = Math.round(song.tempo ?? USUAL_TEMPO);
  return {
    hand: "strum",
    tempo: Math.min(tempoLimits.high, Math.max(tempoLimits.low, tempo)),
    countInBars: 1,
    guide: false,
    backing: true,
    headphones: false,
    length: "once",
  };
}

/** The backing of a song in a key as wished; null where the song has neither chords nor words nor a tune. */
export function tryPlan(song: Song, key: TriedKey, wishes: TryWishes): BackingPlan | null {
  const { hand, tempo, countInBars, guide } = wishes;
  const made = (once: boolean) =>
    planBacking(
      {
        chart: song.chart,
        writtenKey: song.writtenKey,
        notes: song.tune?.kind === "melody" ? song.tune.notes : [],
        beatsPerBar: song.beatsPerBar,
        tempo: song.tempo,
      },
      key,
      { hand, tempo, countInBars, guide, once },
    );
  const whole = wishes.length === "whole" ? made(false) : null;
  return whole && whole.durationS <= longestPlanS ? whole : made(true);
}

/** The same plan with nothing but the count-in to be heard. */
export function countOnly(plan: BackingPlan): BackingPlan {
  return { ...plan, events: plan.events.filter(({ kind, at }) => kind === "click" && at < plan.countInS) };
}

/** "1 min 5 s" */
export function lengthWords(seconds: number): string {
  const whole = Math.round(seconds);
  const minutes = Math.floor(whole / 60);
  return minutes === 0 ? `${whole} s` : `${minutes} min ${whole % 60} s`;
}
