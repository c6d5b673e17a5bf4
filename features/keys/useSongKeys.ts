import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import { newId } from "@/features/api/newId";
import type { Decision } from "@/shared/contract/decision";
import type { Song } from "@/shared/contract/song";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { COARSE_WORDS } from "@/shared/keys/keyReason";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { decide, decidedElsewhere, type Choice } from "./decision/decide";
import { decisionFor, decisionQueries, useRemoveDecision, useSaveDecision } from "./decision/decisionQueries";
import { noFitWords, wholeVoice, type KeyRow } from "./keyRows";
import { keyInHand, keyRowsOf, songChords, writtenKeyOf, type KeyInHand } from "./songKeys";

/** The keys of one song for one voice, with what was decided and the way to decide anew. */
export interface SongKeys {
  /** best first; null while voice or tune is not known */
  rows: KeyRow[] | null;
  /** on whole semitones, for pictures */
  voice: SingingVoice | null;
  decision: Decision | null;
  /** the decided key's sign, and the name of the voice it was decided with where that is not the present one */
  decided: { sign: string; otherVoice: string | null } | null;
  /** said where no key holds the whole tune */
  noFit: string | null;
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

/** The voice that the keys are scored for, with its notes, and the voices there are. */
interface Singer {
  voice: { id: string } | null;
  voices: readonly { id: string; name: string }[];
  forKeys: SingingVoice | null;
}

export function useSongKeys(song: Song, { voice: singer, voices, forKeys: singing }: Singer): SongKeys {
  const decisions = useQuery(decisionQueries.all());
  const save = useSaveDecision();
  const remove = useRemoveDecision();
  const rows = useMemo(() => keyRowsOf(song, singing), [song, singing]);
  const voice = useMemo(() => singing && wholeVoice(singing), [singing]);
  const decision = decisionFor(decisions.data ?? [], song.id);
  const singerId = singer?.id ?? null;
  const inHand = useMemo(() => keyInHand(song, rows, decision, singerId), [song, rows, decision, singerId]);
  const written = useMemo(() => {
    const from = writtenKeyOf(song);
    const chords = songChords(song);
    return from && chords.length > 0 ? { chords, from } : null;
  }, [song]);
  return {
    rows,
    voice,
    decision,
    decided: decision && {
      sign: glyphs(keySign({ tonic: decision.tonic, mode: writtenKeyOf(song)?.mode ?? "major" })),
      otherVoice: decidedElsewhere(decision, singerId)
        ? (voices.find(({ id }) => id === decision.voiceId)?.name ?? "another voice")
        : null,
    },
    noFit: rows && noFitWords(rows),
    inHand,
    written,
    saving: save.isPending || remove.isPending,
    error: save.error ?? remove.error,
    take: (choice, done) => {
      const row = rows?.find((each) => each.shift === choice.shift) ?? null;
      const why = row
        ? {
            score: row.score,
            reason: row.coarse ? `${row.reason} ${COARSE_WORDS}` : row.reason,
            voiceId: singer?.id ?? null,
          }
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

/** The decision, where it was made for this move and with the present voice. */
export function decidedHere({ decision, decided }: Pick<SongKeys, "decision" | "decided">, shift: number) {
  return decision?.shift === shift && decided?.otherVoice === null ? decision : null;
}

/** What a row says of itself where its key was decided; null on all others. */
export function decidedWords({ decision, decided }: Pick<SongKeys, "decision" | "decided">, shift: number) {
  if (!decided || decision?.shift !== shift) return null;
  return decided.otherVoice === null ? "my key" : `decided for ${decided.otherVoice}`;
}

/** The key that is looked at: the row of that move, else the key in hand; with the decision where it is the one decided with this voice. */
export function keyInView(keys: SongKeys, looked: number | null) {
  const row = keys.rows?.find((each) => each.shift === looked) ?? keys.inHand?.row ?? null;
  const shift = row?.shift ?? keys.inHand?.shift ?? 0;
  const decision = decidedHere(keys, shift);
  return { row, shift, key: row?.key ?? keys.inHand?.key ?? null, decision };
}
