import type { Decision, EarlierChoice } from "@/shared/contract/decision";
import { presets } from "@/shared/instruments/presets";
import type { KeyName } from "@/shared/music/keyName";
import { glyphs } from "@/shared/music/pitch";
import { decidedOn, wayWords } from "./decide";
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
}

/** The decided key, and what stands behind it. */
export interface DecisionHistory {
  now: ToldChoice;
  /** newest first */
  earlier: ToldChoice[];
  /** keys decided for other voices */
  others: ToldChoice[];
}

export function decisionHistory(
  decision: Decision,
  all: readonly Decision[],
  mode: KeyName["mode"],
  voices: readonly { id: string; name: string }[],
): DecisionHistory {
  const told = (choice: EarlierChoice, voiceId: string | null): ToldChoice => ({
    key: { tonic: choice.tonic, mode },
    voice: voiceId === null ? null : (voices.find(({ id }) => id === voiceId)?.name ?? "another voice"),
    on: decidedOn(choice),
    way: playedWords(choice),
    reason: choice.reason,
  });
  return {
    now: told(decision, decision.voiceId),
    earlier: decision.earlier.map((each) => told(each, decision.voiceId)),
    others: otherDecisions(all, decision).map((each) => told(each, each.voiceId)),
  };
}

/** "Box guitar, G-D-G: capo 3, chords in A". An own instrument is not named: it may be gone. */
function playedWords(choice: EarlierChoice): string | null {
  const way = wayWords(choice);
  const name = presets.find(({ id }) => id === choice.instrument)?.name;
  return way !== null && name !== undefined ? `${glyphs(name)}: ${way}` : way;
}
