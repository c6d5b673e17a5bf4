import type { Take } from "@/shared/contract/take";
import type { VoiceProfile } from "@/shared/voice/voiceProfile";
import { noteWord, whenWords } from "../noteWords";
import { profileOf, shownTake } from "@/shared/voice/shownTake";

export type VoiceEnd = "low" | "high";

/**
 * Why an end of the voice is where it is: the take it comes from, and what the other takes would say. One sentence each.
 *
 * @param takes of one voice, those the profile was made from
 */
export function whyEnd(profile: VoiceProfile, takes: readonly Take[], end: VoiceEnd): string[] {
  const from = takes.find(({ id }) => id === (end === "low" ? profile.lowFrom : profile.highFrom));
  if (!from) return [];
  const here = noteWord(endOf(profile, end));
  const own = noteWord(ownEnd(from, end));
  const way = end === "low" ? "down" : "up";
  const sentences = [sungWords(from, end, own)];
  if (own !== here) {
    sentences.push(`No other take came near it, so it counts only in part, as ${here}, until another one confirms it.`);
  }
  const side = end === "low" ? -1 : 1;
  const farther = takes
    .filter(
      (take) => take.id !== from.id && speaksFor(take, end) && side * (ownEnd(take, end) - endOf(profile, end)) > 0.5,
    )
    .sort((a, b) => side * (ownEnd(b, end) - ownEnd(a, end)))[0];
  if (farther && from.kind === "hold") {
    sentences.push(
      `A phrase of ${whenWords(farther.sungAt)} went ${way} to ${noteWord(ownEnd(farther, end))}; a note held by itself is surer, so the guided hold decides.`,
    );
  }
  const without = withoutTake(takes, from);
  if (without) {
    const then = noteWord(endOf(without, end));
    sentences.push(then === here ? "Your other takes say the same." : `Without that take it would be ${then}.`);
  }
  return sentences;
}

/** What the voice is without one of its takes; null where nothing would be left. */
export function withoutTake(takes: readonly Take[], gone: Take): VoiceProfile | null {
  return profileOf(
    { id: gone.voiceId },
    takes.filter(({ id }) => id !== gone.id),
  );
}

function sungWords(take: Take, end: VoiceEnd, name: string): string {
  const raw = end === "low" ? take.range.lowMidi : take.range.highMidi;
  const held = Math.max(
    0,
    ...take.notes
      .filter(({ clear, midi }) => clear && Math.abs(midi - raw) < 0.5)
      .map(({ start, end: to }) => to - start),
  );
  const how = take.kind === "hold" ? "in the guided hold" : "in the phrase";
  return held > 0
    ? `You held ${name} for ${held.toFixed(1)} s ${how} of ${whenWords(take.sungAt)}.`
    : `You sang ${name} ${how} of ${whenWords(take.sungAt)}.`;
}

/** Why the comfortable notes are what they are. */
export function whyComfort(takes: readonly Take[]): string[] {
  const rated = takes.flatMap(({ effort }) => effort ?? []);
  const easy = rated.filter((effort) => effort <= 2).length;
  const hard = rated.filter((effort) => effort >= 4).length;
  const sentences = [
    `They are the middle of what ${takes.length === 1 ? "your take says" : `your ${takes.length} takes say`}; surer and newer takes weigh more.`,
  ];
  if (rated.length === 0) {
    sentences.push("You have not said how the singing felt, so a usual reserve stays free at both ends.");
  }
  if (easy > 0) sentences.push(`${countWords(easy)} felt easy, which brings the comfortable notes closer to the ends.`);
  if (hard > 0) sentences.push(`${countWords(hard)} felt hard, which draws them in.`);
  if (takes.some(({ kind }) => kind === "hold")) {
    sentences.push("For a guided hold the notes count that you said you would use in a song.");
  }
  return sentences;
}

function countWords(count: number): string {
  return count === 1 ? "One take" : `${count} takes`;
}

function ownEnd(take: Take, end: VoiceEnd): number {
  return endOf(shownTake(take), end);
}

function endOf({ range }: Pick<VoiceProfile, "range">, end: VoiceEnd): number {
  return end === "low" ? range.lowMidi : range.highMidi;
}

function speaksFor({ shows }: Take, end: VoiceEnd): boolean {
  return shows === "both" || shows === end;
}
