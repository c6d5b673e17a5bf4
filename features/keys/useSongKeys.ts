import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import { useFixedInstruments } from "@/features/api/lineUps";
import { newId } from "@/features/api/newId";
import type { Decision, EarlierChoice } from "@/shared/contract/decision";
import type { Song } from "@/shared/contract/song";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { presets } from "@/shared/instruments/presets";
import type { FixedInstrument } from "@/shared/keys/fixed/fixedInstrument";
import { COARSE_WORDS } from "@/shared/keys/keyReason";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { canComeBack, decide, decidedElsewhere, takenBack, type Choice } from "./decision/decide";
import { decisionHistory, type DecisionHistory } from "./decision/decisionHistory";
import { useGoneDecisions } from "./decision/goneDecisions";
import { decisionFor, decisionQueries, useRemoveDecision, useSaveDecision } from "./decision/decisionQueries";
import { noFitWords, wholeVoice, type KeyRow } from "./keyRows";
import { triesOfVoice, voiceAfter } from "./tryout/kept/triedRows";
import { tryQueries, useSendWaiting } from "./tryout/tryQueries";
import { sameKey } from "./sameKey";
import { keyInHand, keyRowsOf, songChords, songSequence, writtenKeyOf, type KeyInHand } from "./songKeys";

/** The keys of one song for one voice, with what was decided and the way to decide anew. */
export interface SongKeys {
  /** best first; null while voice or tune is not known */
  rows: KeyRow[] | null;
  /** on whole semitones, for pictures */
  voice: SingingVoice | null;
  decision: Decision | null;
  /** the decided key's sign, and the name of the voice it was decided with where that is not the present one */
  decided: { sign: string; otherVoice: string | null } | null;
  /** why the comfort band stands elsewhere than the voice alone would have it: what was tried */
  tried: readonly string[];
  /** instruments of the line-up that are made in one key, and so move the ranking */
  fixed: readonly FixedInstrument[];
  /** said where no key holds the whole tune */
  noFit: string | null;
  inHand: KeyInHand | null;
  /** the chords as written, and the key they stand in; null where there is none of either */
  written: { chords: string[]; sequence: string[]; from: KeyName } | null;
  /** what was decided before and for other voices */
  history: DecisionHistory | null;
  /** the key that was last taken back or let go of, while it can be brought back */
  removed: string | null;
  saving: boolean;
  error: Error | null;
  /** Keeps a key and says when it is kept; what kept it from that stays in `error`. */
  take: (choice: Pick<Choice, "tonic" | "shift" | "instrument" | "way">, done?: () => void) => void;
  /** Takes the newest choice back: the one before holds again, or none. */
  undo: () => void;
  /** Lets the decided key go with all its history. */
  remove: () => void;
  /** Brings back what was last taken back or let go. */
  restore: () => void;
  /** Takes a choice of the history anew. */
  again: (choice: EarlierChoice) => void;
}

/** The voice that the keys are scored for, with its notes, and the voices there are. */
interface Singer {
  voice: { id: string } | null;
  voices: readonly { id: string; name: string }[];
  forKeys: SingingVoice | null;
}

/** @param instruments what a decision may name, own ones among them */
export function useSongKeys(
  song: Song,
  { voice: singer, voices, forKeys }: Singer,
  instruments: readonly { id: string; name: string }[] = presets,
): SongKeys {
  const decisions = useQuery(decisionQueries.all());
  const save = useSaveDecision();
  const remove = useRemoveDecision();
  const tries = useQuery(tryQueries.all());
  useSendWaiting((tries.data ?? []).some(({ waiting }) => waiting));
  const tried = useMemo(
    () => forKeys && voiceAfter(song, forKeys, triesOfVoice(tries.data ?? [], singer?.id ?? null)),
    [song, forKeys, tries.data, singer?.id],
  );
  const singing = tried?.voice ?? null;
  const fixed = useFixedInstruments(song.id);
  const rows = useMemo(() => keyRowsOf(song, singing, fixed), [song, singing, fixed]);
  const voice = useMemo(() => singing && wholeVoice(singing), [singing]);
  const past = useGoneDecisions();
  const singerId = singer?.id ?? null;
  const decision = decisionFor(decisions.data ?? [], song.id, singerId);
  const mode = writtenKeyOf(song)?.mode ?? "major";
  // Another voice's key is told here, and changed only where that voice sings.
  const own = decision && !decidedElsewhere(decision, singerId) ? decision : null;
  const letGo = () => {
    if (own) remove.mutate(own.id, { onSuccess: () => past.keep(own) });
  };
  const lost = decisions.data
    ? past.gone.find((each) => canComeBack(each, decisions.data, song.id, singerId))
    : undefined;
  const inHand = useMemo(() => keyInHand(song, rows, decision, singerId), [song, rows, decision, singerId]);
  const written = useMemo(() => {
    const from = writtenKeyOf(song);
    const chords = songChords(song);
    return from && chords.length > 0 ? { chords, sequence: songSequence(song), from } : null;
  }, [song]);
  return {
    rows,
    voice,
    decision,
    decided: decision && {
      sign: glyphs(keySign({ tonic: decision.tonic, mode })),
      otherVoice: decidedElsewhere(decision, singerId)
        ? (voices.find(({ id }) => id === decision.voiceId)?.name ?? "another voice")
        : null,
    },
    tried: tried?.why ?? [],
    fixed,
    noFit: rows && noFitWords(rows),
    inHand,
    written,
    history:
      decision &&
      decisionHistory(decision, {
        all: decisions.data ?? [],
        gone: past.gone.filter((each) => each !== lost),
        written: writtenKeyOf(song),
        voices,
        instruments,
      }),
    removed: lost ? glyphs(keySign({ tonic: lost.tonic, mode })) : null,
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
      const before = own && takenBack(own);
      if (before) save.mutate(before, { onSuccess: () => past.keep(own) });
      else letGo();
    },
    remove: letGo,
    restore: () => {
      if (lost) save.mutate(lost, { onSuccess: () => past.forget(lost) });
    },
    again: ({ tonic, shift, score, reason, instrument, way }) => {
      const { voiceId } = own ?? { voiceId: singerId };
      const choice = { songId: song.id, voiceId, tonic, shift, score, reason, instrument, way };
      save.mutate(decide(choice, own, newId, new Date()));
    },
  };
}

/** The decision, where it was made for this key and with the present voice. */
export function decidedHere({ decision, decided }: Pick<SongKeys, "decision" | "decided">, shift: number) {
  return decision && sameKey(decision.shift, shift) && decided?.otherVoice === null ? decision : null;
}

/** What a row says of itself where its key was decided; null on all others. */
export function decidedWords({ decision, decided }: Pick<SongKeys, "decision" | "decided">, shift: number) {
  if (!decided || !decision || !sameKey(decision.shift, shift)) return null;
  return decided.otherVoice === null ? "my key" : `decided for ${decided.otherVoice}`;
}

/** The key that is looked at: the row of that move, else the key in hand; with the decision where it is the one decided with this voice. */
export function keyInView(keys: SongKeys, looked: number | null) {
  const row = keys.rows?.find((each) => each.shift === looked) ?? keys.inHand?.row ?? null;
  const shift = row?.shift ?? keys.inHand?.shift ?? 0;
  const decision = decidedHere(keys, shift);
  return { row, shift, key: row?.key ?? keys.inHand?.key ?? null, decision };
}
