import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import type { Voice } from "@/shared/contract/voice";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { useChosenVoiceId } from "./chosenVoice";
import { keyVoiceOf, singingVoiceOf } from "@/shared/keys/singingVoiceOf";
import { voiceQueries } from "./voiceQueries";

export interface SingingVoiceState {
  /** the voice spoken of: the one asked for, else the chosen one, else the first; null where there is none */
  voice: Voice | null;
  /** all voices, for what was decided with another one */
  voices: readonly Voice[];
  /** its notes; null where nothing is known yet */
  singing: SingingVoice | null;
  /** the same for judging keys: with what a phrase makes probable */
  forKeys: SingingVoice | null;
  isPending: boolean;
  error: Error | null;
}

/** The voice a page speaks of, with its notes. */
export function useSingingVoice(voiceId?: string): SingingVoiceState {
  const voices = useQuery(voiceQueries.list());
  const takes = useQuery(voiceQueries.takes());
  const chosen = useChosenVoiceId();
  const voice = pickVoice(voices.data ?? [], voiceId, chosen);
  const singing = useMemo(() => (voice && takes.data ? singingVoiceOf(voice, takes.data) : null), [voice, takes.data]);
  const forKeys = useMemo(() => (voice && takes.data ? keyVoiceOf(voice, takes.data) : null), [voice, takes.data]);
  return {
    voice,
    voices: voices.data ?? [],
    singing,
    forKeys,
    isPending: voices.isPending || takes.isPending,
    error: voices.error ?? takes.error,
  };
}

/** The voice asked for, else the chosen one, else the first. */
export function pickVoice(voices: readonly Voice[], asked: string | undefined, chosen: string | null): Voice | null {
  if (asked !== undefined) return voices.find(({ id }) => id === asked) ?? null;
  return voices.find(({ id }) => id === chosen) ?? voices[0] ?? null;
}
