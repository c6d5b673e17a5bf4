import type { PitchBand } from "./takeReport";
import type { ProfileTake, VoiceProfile } from "./voiceProfile";
import { mergeTakes } from "./voiceProfile";

/** A take as it is kept, as far as a profile needs it. */
export interface KeptTake {
  id: string;
  voiceId: string;
  kind: "phrase" | "hold";
  shows: "both" | "low" | "high";
  /** ISO time */
  sungAt: string;
  effort: number | null;
  range: PitchBand;
  comfort: PitchBand;
  estimate: PitchBand;
  /** the singer's common offset from equal temperament */
  tuningCents: number;
  /** 0 to 1 */
  certainty: number;
}

/**
 * The same band with the singer's common offset from equal temperament taken off, so that its ends have their names.
 *
 * @param band as sung
 * @param tuningCents the offset, cents
 * @returns the band that names its ends
 * @example inTune({ lowMidi: 52.5, highMidi: 71.5 }, -50) // => { lowMidi: 53, highMidi: 72 }
 */
export function inTune(band: PitchBand, tuningCents: number): PitchBand {
  const offset = tuningCents / 100;
  return { lowMidi: band.lowMidi - offset, highMidi: band.highMidi - offset };
}

/**
 * A kept take as the engine merges it, its notes named by the singer's own tuning.
 *
 * @param take as it is kept
 * @returns what `mergeTakes` needs of it
 */
export function shownTake(take: KeptTake): ProfileTake {
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

/**
 * What the takes of one voice say together.
 *
 * @param voice whose takes count
 * @param takes of any voices; those of others are left out
 * @returns the profile; null where the voice has no takes
 * @throws RangeError if a take has an unreadable time
 */
export function profileOf(voice: { id: string }, takes: readonly KeptTake[]): VoiceProfile | null {
  const own = takes.filter((take) => take.voiceId === voice.id);
  return own.length === 0 ? null : mergeTakes(own.map(shownTake));
}
