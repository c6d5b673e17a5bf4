import { type Decision, mostEarlier } from "@/shared/contract/decision";
import { presentChoice } from "@/shared/contract/decisionHistory";
import { tonicPitchClass, type KeyName } from "@/shared/music/keyName";
import { glyphs } from "@/shared/music/pitch";
import type { Way } from "@/shared/ways/way";

/** What was chosen on the page. */
export interface Choice {
  songId: string;
  tonic: string;
  shift: number;
  /** null where no voice or no tune let the key be scored */
  score: number | null;
  reason: string;
  voiceId: string | null;
  instrument: string | null;
  way: Pick<Way, "retune" | "capo" | "shapeKey"> | null;
}

/** The decision that keeps a choice. One a song and voice: it takes the place, and the id, of the one before. */
export function decide(choice: Choice, before: Decision | null, newId: () => string, now: Date): Decision {
  const { way, reason, score, ...rest } = choice;
  const same = before?.songId === choice.songId && before.voiceId === choice.voiceId ? before : null;
  return {
    ...rest,
    id: same?.id ?? newId(),
    score: score === null ? null : Math.min(100, Math.max(0, score)),
    reason: reason.length > 300 ? `${reason.slice(0, 299)}…` : reason,
    way: way && { retune: way.retune, capo: way.capo, shapeKey: way.shapeKey },
    decidedAt: now.toISOString(),
    earlier: same ? [presentChoice(same), ...same.earlier].slice(0, mostEarlier) : [],
  };
}

/** The decision as it was before its newest choice; null where there was none. */
export function takenBack(decision: Decision): Decision | null {
  const [before, ...earlier] = decision.earlier;
  return before ? { ...decision, ...before, earlier } : null;
}

/** Whether a decision that was taken back can be brought back: nothing else was decided for its song and voice since. */
export function canComeBack(
  gone: Decision,
  decisions: readonly Decision[],
  songId: string,
  voiceId: string | null,
): boolean {
  if (gone.songId !== songId || decidedElsewhere(gone, voiceId)) return false;
  const since = decisions.find((each) => each.songId === gone.songId && each.voiceId === gone.voiceId);
  return since === undefined || (since.id === gone.id && since.decidedAt === gone.earlier[0]?.decidedAt);
}

/** "capo 3, chords in A": how the strings were to be played; null where no way was kept. */
export function wayWords({ way }: Pick<Decision, "way">): string | null {
  if (!way) return null;
  const parts = [
    ...(way.retune === 0 ? [] : [`strings ${way.retune > 0 ? "up" : "down"} ${Math.abs(way.retune)}`]),
    way.capo === 0 ? "no capo" : `capo ${way.capo}`,
    `chords in ${glyphs(way.shapeKey)}`,
  ];
  return parts.join(", ");
}

/** A decision made for a chart whose key was changed since no longer says where to play it. */
export function stillFits(decision: Pick<Decision, "tonic" | "shift">, written: KeyName | null): boolean {
  if (written === null) return true;
  const target = (((tonicPitchClass(written.tonic) + decision.shift) % 12) + 12) % 12;
  return tonicPitchClass(decision.tonic) === target;
}

/** Whether it was made with another voice than the one spoken of; one made without a voice holds for all. */
export function decidedElsewhere(decision: Decision, voiceId: string | null): boolean {
  return decision.voiceId !== null && voiceId !== null && decision.voiceId !== voiceId;
}

/** When a key was chosen, in words. */
export function decidedOn(decision: Pick<Decision, "decidedAt">): string {
  const date = new Date(decision.decidedAt);
  return new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "long", year: "numeric" }).format(date);
}
