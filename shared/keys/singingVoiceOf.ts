import { type KeptTake, profileOf } from "../voice/shownTake";
import type { PitchBand } from "../voice/takeReport";
import type { SingingVoice } from "./keyScore";

/** A voice as it is kept: `byHand` where the notes were given without singing. */
export interface KeptVoice {
  id: string;
  byHand: { range: PitchBand; comfort: PitchBand } | null;
}

/**
 * The voice as the key scorer needs it: notes set by hand, else what the takes say.
 *
 * @param voice the voice
 * @param takes of any voices; those of others are left out
 * @returns range and comfort, comfort inside range; null where nothing is known
 * @throws RangeError if a take has an unreadable time
 */
export function singingVoiceOf(voice: KeptVoice, takes: readonly KeptTake[]): SingingVoice | null {
  const known = voice.byHand ?? profileOf(voice, takes);
  if (!known) return null;
  const range = { lowMidi: known.range.lowMidi, highMidi: known.range.highMidi };
  return { range, comfort: within(known.comfort, range) };
}

/**
 * The voice that keys are judged by. A phrase shows only part of a voice: an end that no guided hold has shown is taken
 * as far as the voice probably reaches, and `heard` keeps what was sung. Notes set by hand count as they are.
 *
 * @param voice the voice
 * @param takes of any voices; those of others are left out
 * @returns the voice; null where nothing is known
 * @throws RangeError if a take has an unreadable time
 */
export function keyVoiceOf(voice: KeptVoice, takes: readonly KeptTake[]): SingingVoice | null {
  const singing = singingVoiceOf(voice, takes);
  const profile = voice.byHand ? null : profileOf(voice, takes);
  if (!singing || !profile) return singing;
  const { range, estimate, lowFrom, highFrom } = profile;
  const held = (id: string) => takes.some((take) => take.id === id && take.kind === "hold");
  const lowMidi = held(lowFrom) ? range.lowMidi : Math.min(range.lowMidi, estimate.lowMidi);
  const highMidi = held(highFrom) ? range.highMidi : Math.max(range.highMidi, estimate.highMidi);
  if (lowMidi === range.lowMidi && highMidi === range.highMidi) return singing;
  return { ...singing, range: { lowMidi, highMidi }, heard: singing.range };
}

function within(band: PitchBand, outer: PitchBand): PitchBand {
  const clamp = (midi: number) => Math.min(outer.highMidi, Math.max(outer.lowMidi, midi));
  return { lowMidi: clamp(band.lowMidi), highMidi: clamp(band.highMidi) };
}
