import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import { newId } from "@/features/api/newId";
import type { Decision } from "@/shared/contract/decision";
import type { Song } from "@/shared/contract/song";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { decide, type Choice } from "./decide";
import { decisionFor, decisionQueries, useRemoveDecision, useSaveDecision } from "./decisionQueries";
import { wholeVoice, type KeyRow } from "./keyRows";
import { keyInHand, keyRowsOf, type KeyInHand } from "./songKeys";

/** The keys of one song for one voice, with what was decided and the way to decide anew. */
export interface SongKeys {
  /** best first; null while voice or tune is not known */
  rows: KeyRow[] | null;
  /** on whole semitones, for pictures */
  voice: SingingVoice | null;
  decision: Decision | null;
  inHand: KeyInHand | null;
  saving: boolean;
  error: Error | null;
  /** Keeps a key, and resolves once it is kept; rejections stay in `error`. */
  take: (choice: Pick<Choice, "tonic" | "shift" | "voiceId" | "instrument" | "way">, done?: () => void) => void;
  /** Lets the decided key go again. */
  undo: () => void;
}

export function useSongKeys(song: Song, singing: SingingVoice | null): SongKeys {
  const decisions = useQuery(decisionQueries.all());
  const save = useSaveDecision();
  const remove = useRemoveDecision();
  const rows = useMemo(() => keyRowsOf(song, singing), [song, singing]);
  const voice = useMemo(() => singing && wholeVoice(singing), [singing]);
  const decision = decisionFor(decisions.data ?? [], song.id);
  const inHand = useMemo(() => keyInHand(song, rows, decision), [song, rows, decision]);
  return {
    rows,
    voice,
    decision,
    inHand,
    saving: save.isPending || remove.isPending,
    error: save.error ?? remove.error,
    take: (choice, done) => {
      const row = rows?.find((each) => each.shift === choice.shift) ?? null;
      const why = row ? { score: row.score, reason: row.reason } : { score: null, reason: "Chosen without a voice to judge it by." };
      save.mutate(decide({ songId: song.id, ...choice, ...why }, decision, newId, new Date()), { onSuccess: () => done?.() });
    },
    undo: () => {
      if (decision) remove.mutate(decision.id);
    },
  };
}
