import { createLagMeter, HOP, SHORT_WINDOW, WINDOW } from "../signal/lagFrame";
import { createResampler } from "../signal/resampler";
import { findCandidates, type CandidateFrame } from "./pitchCandidates";
import { createPathFinder } from "./pitchPath";
import { measureRoom, type RoomFloor } from "./roomFloor";

/** What the tracker decided for one frame of 10 ms. */
export interface TrackFrame {
  /** null where unvoiced */
  hz: number | null;
  /** how well the sound repeats at the decided pitch, 0 to 1; of the best candidate where unvoiced */
  clarity: number;
  levelDb: number;
  aboveRoomDb: number;
}

/** A whole take, tracked. */
export interface PitchTrack {
  frames: TrackFrame[];
  room: RoomFloor;
}

/**
 * Tracks the pitch of a whole take: frame k stands at time k / 100 s.
 *
 * @param pcm mono samples in [-1, 1], shape [n]; not modified
 * @param sampleRate in Hz, 8000 to 192000
 * @throws RangeError if the rate is outside 8-192 kHz
 */
export function trackPitch(pcm: Float32Array, sampleRate: number): PitchTrack {
  const sound = atAnalysisRate(pcm, sampleRate);
  const measure = createLagMeter();
  const measureShort = createLagMeter(SHORT_WINDOW);
  const count = Math.floor((pcm.length / sampleRate) * 100);
  const lagFrames = Array.from({ length: count }, (_, k) => measure(sound, k * HOP - WINDOW / 2));
  const room = measureRoom(lagFrames);
  const finder = createPathFinder();
  const found: CandidateFrame[] = [];
  lagFrames.forEach((lagFrame, k) => {
    const frame = findCandidates(lagFrame, room, () => measureShort(sound, k * HOP - SHORT_WINDOW / 2));
    found.push(frame);
    finder.push(frame);
  });
  const frames = finder.path().map((point, k) => trackFrame(found[k]!, point.candidate?.hz ?? null, point.candidate?.clarity));
  return { frames, room };
}

/** Puts the decision and the frame it was made on together. */
export function trackFrame(frame: CandidateFrame, hz: number | null, clarity?: number): TrackFrame {
  const best = clarity ?? frame.candidates.reduce((top, c) => Math.max(top, c.clarity), 0);
  return { hz, clarity: Math.max(0, Math.min(1, best)), levelDb: frame.levelDb, aboveRoomDb: frame.aboveRoomDb };
}

function atAnalysisRate(pcm: Float32Array, sampleRate: number): Float32Array {
  const resampler = createResampler(sampleRate);
  const start = resampler.push(pcm);
  const rest = resampler.finish();
  const sound = new Float32Array(start.length + rest.length);
  sound.set(start);
  sound.set(rest, start.length);
  return sound;
}
