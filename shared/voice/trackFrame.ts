import { HIGHEST_HZ, type CandidateFrame, type PitchCandidate } from "./pitchCandidates";

/** What the tracker decided for one frame of 10 ms. */
export interface TrackFrame {
  /** null where unvoiced */
  hz: number | null;
  /** how well the sound repeats at the decided pitch, 0 to 1; of the best candidate where unvoiced */
  clarity: number;
  levelDb: number;
  aboveRoomDb: number;
  /** several sounds at once: only a common period was found, or another pitch beside the decided one */
  mixed: boolean;
  /** second harmonic against the first in dB, for pitches from E5 up; null elsewhere */
  overtoneDb: number | null;
}

/**
 * Puts the decision and the frame it was made on together; a decision above the search limit counts as no voice.
 *
 * @param frame what was measured
 * @param decided the candidate on the best path, null where unvoiced
 * @returns the frame of the track
 */
export function trackFrame(frame: CandidateFrame, decided: PitchCandidate | null): TrackFrame {
  const { levelDb, aboveRoomDb, mixed } = frame;
  const best = decided?.clarity ?? frame.candidates.reduce((top, c) => Math.max(top, c.clarity), 0);
  const hz = decided && decided.hz <= HIGHEST_HZ ? decided.hz : null;
  return { hz, clarity: Math.max(0, Math.min(1, best)), levelDb, aboveRoomDb, mixed, overtoneDb: null };
}
