import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import { newId } from "@/features/api/newId";
import type { Decision } from "@/shared/contract/decision";
import type { Song } from "@/shared/contract/song";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { KeyName } from "@/shared/music/keyName";
import { decide, type Choice } from "./decide";
import { decisionFor, decisionQueries, useRemoveDecision, useSaveDecision } from "./decisionQueries";
import { wholeVoice, type KeyRow } from "./keyRows";
import { keyInHand, keyRowsOf, songChords, writtenKeyOf, type KeyInHand } from "./songKeys";

/** The keys of one song for one voice, with what was decided and the way to decide anew. */
export interface SongKeys {
  /** best first; null while voice or tune is not known */
  rows: KeyRow[] | null;
  /** on whole semitones, for pictures */
  voice: SingingVoice | null;
  decision: Decision | null;
  inHand: KeyInHand | null;
  /** the chords as written, and the key they stand in; null where there is none of either */
  written: { chords: string[]; from: KeyName } | null;
  saving: boolean;
  error: Error | null;
  /** Keeps a key and says when it is kept; what kept it from that stays in `error`. */
  take: (choice: Pick<Choice, "tonic" | "shift" | "instrument" | "way">, done?: () => void) => void;
  /** Lets the decided key go again. */
  undo: () => void;
}

/** The voice that the keys are scored for, with its notes. */
interface Singer {
  voice: { id: string } | null;
  singing: SingingVoice | null;
}

export function useSongKeys(song: Song, { voice: singer, singing }: Singer): SongKeys {
  const decisions = useQuery(decisionQueries.all());
  const save = useSaveDecision();
  const remove = useRemoveDecision();
  const rows = useMemo(() => keyRowsOf(song, singing), [song, singing]);
  const voice = useMemo(() => singing && wholeVoice(singing), [singing]);
  const decision = decisionFor(decisions.data ?? [], song.id);
  const inHand = useMemo(() => keyInHand(song, rows, decision), [song, rows, decision]);
  const written = useMemo(() => {
    const from = writtenKeyOf(song);
    const chords = songChords(song);
    return from && chords.length > 0 ? { chords, from } : null;
  }, [song]);
  return {
    rows,
    voice,
    decision,
    inHand,
    written,
    saving: save.isPending || remove.isPending,
    error: save.error ?? remove.error,
    take: (choice, done) => {
      const row = rows?.find((each) => each.shift === choice.shift) ?? null;
      const why = row
        ? { score: row.score, reason: row.reason, voiceId: singer?.id ?? null }
        : { score: null, reason: "Chosen without a voice to judge it by.", voiceId: null };
      save.mutate(decide({ songId: song.id, ...choice, ...why }, decision, newId, new Date()), {
        onSuccess: () => done?.(),
      });
    },
    undo: () => {
      if (decision) remove.mutate(decision.id);
    },
  };
}

/** The key that is looked at: the row of that move, else the key in hand; with the decision where it is the decided one. */
export function keyInView(keys: SongKeys, looked: number | null) {
  const row = keys.rows?.find((each) => each.shift === looked) ?? keys.inHand?.row ?? null;
  const shift = row?.shift ?? keys.inHand?.shift ?? 0;
  const decision = keys.decision?.shift === shift ? keys.decision : null;
  return { row, shift, key: row?.key ?? keys.inHand?.key ?? null, decision };
}
