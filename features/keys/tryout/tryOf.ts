import type { Try } from "@/shared/contract/try";
import type { MeasuredTry } from "./useTry";

/** A measured take as it is kept: numbers only. */
export function tryOf(
  { take, key, wishes, measures }: MeasuredTry,
  effort: number | null,
  songId: string,
  voiceId: string | null,
): Try {
  return {
    id: take.id,
    songId,
    voiceId,
    tonic: key.tonic,
    shift: key.shift,
    tempo: wishes.tempo,
    sungAt: take.sungAt,
    effort,
    measures,
    backing: wishes.backing,
  };
}
