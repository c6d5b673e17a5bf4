import type { Decision, EarlierChoice } from "@/shared/contract/decision";
import type { KeyName } from "@/shared/music/keyName";
import { glyphs } from "@/shared/music/pitch";
import { decidedOn, stillFits, wayWords } from "./decide";
import { otherDecisions } from "./decisionQueries";

/** One choice of a key, to be read. */
export interface ToldChoice {
  key: KeyName;
  /** for whom it was decided; null where it holds for whoever sings */
  voice: string | null;
  on: string;
  /** how it is to be played; null where no way was kept */
  way: string | null;
  reason: string;
  /** the choice itself, where it can be taken again: for the same voice, and the chart is in the same key as then */
  again: EarlierChoice | null;
}

/** The decided key, and what stands behind it. */
export interface DecisionHistory {
  now: ToldChoice;
  /** newest first */
  earlier: ToldChoice[];
  /** what was taken back, newest first */
  takenBack: ToldChoice[];
  /** keys decided for other voices */
  others: ToldChoice[];
}

/** What is known beside the decision itself. */
export interface HistoryAround {
  /** every decision there is */
  all: readonly Decision[];
  /** decisions that were taken back */
  gone: readonly Decision[];
  /** the key that the chart stands in; null where it is not known */
  written: KeyName | null;
  voices: readonly { id: string; name: string }[];
  instruments: readonly { id: string; name: string }[];
}

export function decisionHistory(
  decision: Decision,
  { all, gone, written, voices, instruments }: HistoryAround,
): DecisionHistory {
  const mode = written?.mode ?? "major";
  const known = new Set([decision, ...decision.earlier].map(({ decidedAt }) => decidedAt));
  const takenBack = gone.filter(
    ({ songId, voiceId, decidedAt }) =>
      songId === decision.songId && voiceId === decision.voiceId && !known.has(decidedAt),
  );
  const told = (choice: EarlierChoice, voiceId: string | null): ToldChoice => ({
    key: { tonic: choice.tonic, mode },
    voice: voiceId === null ? null : (voices.find(({ id }) => id === voiceId)?.name ?? "another voice"),
    on: decidedOn(choice),
    way: playedWords(choice, instruments),
    reason: choice.reason,
    again: voiceId === decision.voiceId && stillFits(choice, written) ? choice : null,
  });
  return {
    now: told(decision, decision.voiceId),
    earlier: decision.earlier.map((each) => told(each, decision.voiceId)),
    takenBack: takenBack.map((each) => told(each, each.voiceId)),
    others: otherDecisions(all, decision).map((each) => told(each, each.voiceId)),
  };
}

/** "Box guitar, G-D-G: capo 3, chords in A"; an instrument that is gone has no name. */
function playedWords(choice: EarlierChoice, instruments: HistoryAround["instruments"]): string | null {
  const way = wayWords(choice);
  const name = instruments.find(({ id }) => id === choice.instrument)?.name;
  return way !== null && name !== undefined ? `${glyphs(name)}: ${way}` : way;
}
