import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import { newId } from "@/features/api/newId";
import type { Decision } from "@/shared/contract/decision";
import type { Song } from "@/shared/contract/song";
import { scoreSharedKeys } from "@/shared/keys/sharedKey";
import { decide } from "../decision/decide";
import { decisionFor, decisionQueries, useSaveDecision } from "../decision/decisionQueries";
import { writtenKeyOf } from "../songKeys";
import type { GroupKey } from "./groupKey";
import { groupKeys, type JudgedSinger } from "./groupKeys";
import { decisionReason } from "./groupWords";
import type { KnownSinger } from "./singers/singers";

/** The keys of one song for a group, and the way to decide one for it. */
export interface GroupKeys {
  /** fairest first; null while there is no tune, or nobody who can be judged */
  keys: GroupKey[] | null;
  /** those who are judged, in the order of the parts */
  singers: JudgedSinger[];
  /** only the span of the tune is known */
  coarse: boolean;
  saving: boolean;
  error: Error | null;
  isDecided: (key: GroupKey) => boolean;
  take: (key: GroupKey) => void;
}

export function useGroupKeys(song: Song, known: readonly KnownSinger[]): GroupKeys {
  const decisions = useQuery(decisionQueries.all());
  const save = useSaveDecision();
  const singers = useMemo(() => known.flatMap(({ id, name, voice }) => (voice ? [{ id, name, voice }] : [])), [known]);
  const shared = useMemo(() => {
    const written = writtenKeyOf(song);
    if (!song.tune || !written || singers.length < 2) return null;
    return scoreSharedKeys(song.tune, singers, { mode: written.mode, presentKey: written.tonic });
  }, [song, singers]);
  const keys = useMemo(() => {
    const written = writtenKeyOf(song);
    return shared && written && groupKeys(shared, singers, written);
  }, [shared, singers, song]);
  const decision = decisionFor(decisions.data ?? [], song.id, null);
  return {
    keys,
    singers,
    coarse: shared?.[0]?.coarse === true,
    saving: save.isPending,
    error: save.error,
    isDecided: (key) => isFor(decision, key),
    take: (key) => {
      const choice = {
        songId: song.id,
        tonic: key.key.tonic,
        shift: key.shift,
        score: key.lowest,
        reason: decisionReason(key),
        // It is the group's key, not one voice's.
        voiceId: null,
        instrument: decision?.instrument ?? null,
        way: null,
      };
      save.mutate(decide(choice, decision, newId, new Date()));
    },
  };
}

function isFor(decision: Decision | null, key: GroupKey): boolean {
  return (
    decision?.voiceId === null &&
    decision.tonic === key.key.tonic &&
    decision.shift === key.shift &&
    decision.reason === decisionReason(key)
  );
}
