/** What is said before a backing is heard, once for every sitting. */
export const headphoneWords =
  "Use headphones if you have them: from a loudspeaker the backing gets into the recording, and the notes are harder to tell from your voice. Keep it soft enough that you need not raise your voice over it.";

export const voiceWords =
  "Stop if it hurts, burns, makes you cough or leaves you hoarse. Do not repeat a note that was too high.";

/** The place in the song in words: "Count-in" or "Verse 1, bar 3". */
export function placeWords(
  parts: readonly { at: number; end: number; label: string | null }[],
  beat: { at: number; bar: number },
  barS: number,
): string {
  if (beat.bar < 0) return "Count-in";
  const part = parts.find(({ at, end }) => beat.at >= at - 1e-6 && beat.at < end - 1e-6);
  if (!part?.label) return `Bar ${beat.bar + 1}`;
  return `${part.label}, bar ${Math.floor((beat.at - part.at) / barS + 1e-6) + 1}`;
}
