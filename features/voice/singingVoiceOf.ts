import type { Take } from "@/shared/contract/take";
import type { Voice } from "@/shared/contract/voice";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { PitchBand } from "@/shared/voice/takeReport";
import { mergeTakes, type ProfileTake, type VoiceProfile } from "@/shared/voice/voiceProfile";
import { inTune } from "./takeOfHeard";

/** What the takes of one voice say together; null where it has none. Takes of other voices are left out. */
export function profileOf(voice: Pick<Voice, "id">, takes: readonly Take[]): VoiceProfile | null {
  const own = takes.filter((take) => take.voiceId === voice.id);
  return own.length === 0 ? null : mergeTakes(own.map(shownTake));
}

/** The voice as the key scorer needs it: notes set by hand, else what the takes say, else null. Comfort lies inside range. */
export function singingVoiceOf(voice: Voice, takes: readonly Take[]): SingingVoice | null {
  const known = voice.byHand ?? profileOf(voice, takes);
  if (!known) return null;
  const range = { lowMidi: known.range.lowMidi, highMidi: known.range.highMidi };
  return { range, comfort: within(known.comfort, range) };
}

/**
 * The voice that keys are judged by. A phrase shows only part of a voice: an end that no guided hold has shown is taken
 * as far as the voice probably reaches, and `heard` keeps what was sung. Notes set by hand count as they are.
 */
export function keyVoiceOf(voice: Voice, takes: readonly Take[]): SingingVoice | null {
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

/** A take as the engine merges it, its notes named by the singer's own tuning. */
export function shownTake(take: Take): ProfileTake {
  const { id, sungAt, certainty, effort, tuningCents, kind, shows } = take;
  const band = (sung: PitchBand) => inTune(sung, tuningCents);
  return {
    id,
    sungAt,
    certainty,
    effort,
    hold: kind === "hold",
    shows,
    range: band(take.range),
    comfort: band(take.comfort),
    estimate: band(take.estimate),
  };
}

function within(band: PitchBand, outer: PitchBand): PitchBand {
  const clamp = (midi: number) => Math.min(outer.highMidi, Math.max(outer.lowMidi, midi));
  return { lowMidi: clamp(band.lowMidi), highMidi: clamp(band.highMidi) };
}
