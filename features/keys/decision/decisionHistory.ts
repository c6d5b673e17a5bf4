import type { Decision, EarlierChoice } from "@/shared/contract/decision";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { decidedOn, wayWords } from "./decide";
import { otherDecisions } from "./decisionQueries";

/** What stands behind the decided key, in lines. */
export interface DecisionHistory {
  /** for whom it was decided; null where it holds for whoever sings */
  voice: string | null;
  /** how it is to be played; null where no way was kept */
  way: string | null;
  /** newest first */
  earlier: string[];
  /** keys decided for other voices */
  others: string[];
}

export function decisionHistory(
  decision: Decision,
  all: readonly Decision[],
  mode: KeyName["mode"],
  voices: readonly { id: string; name: string }[],
): DecisionHistory {
  const voiceOf = (id: string | null) =>
    id === null ? null : (voices.find((voice) => voice.id === id)?.name ?? "another voice");
  const what = (choice: EarlierChoice) =>
    [glyphs(keySign({ tonic: choice.tonic, mode })), wayWords(choice)].filter((part) => part !== null).join(", ");
  return {
    voice: voiceOf(decision.voiceId),
    way: wayWords(decision),
    earlier: decision.earlier.map((each) => `${what(each)} · ${decidedOn(each)} · ${each.reason}`),
    others: otherDecisions(all, decision).map(
      (each) => `${voiceOf(each.voiceId) ?? "Whoever sings"}: ${what(each)} · ${decidedOn(each)}`,
    ),
  };
}
