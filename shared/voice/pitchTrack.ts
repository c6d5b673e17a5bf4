import { createLagMeter, HOP, SHORT_WINDOW, WINDOW, type LagFrame } from "../signal/lagFrame";
import { createResampler } from "../signal/resampler";
import { powerAt } from "./harmonicPresence";
import { findCandidates, type CandidateFrame } from "./pitchCandidates";
import { createPathFinder } from "./pitchPath";
import { measureRoom, type RoomFloor } from "./roomFloor";
import { markSecondVoices } from "./secondVoice";
import { trackFrame, type TrackFrame } from "./trackFrame";

const OVERTONE_FROM_MIDI = 76;
/** What measuring takes of the time; choosing among what was measured takes the rest. */
const MEASURING_SHARE = 0.6;

/** A whole take, tracked. */
export interface PitchTrack {
  frames: TrackFrame[];
  room: RoomFloor;
}

/** What was measured of a take while it was sung; it depends on the sound alone. */
export interface MeasuredSound {
  /** the whole take at 8 kHz, shape [n] */
  sound: Float32Array;
  /** window k of the take, as many as were complete */
  lagFrames: readonly LagFrame[];
}

/**
 * Tracks the pitch of a whole take: frame k stands at time k / 100 s.
 *
 * @param pcm mono samples in [-1, 1], shape [n]; not modified
 * @param sampleRate in Hz, 8000 to 192000
 * @param measured of this very take, where it was listened to while it was sung; changes the speed and nothing else
 * @param onProgress told the share that is done, 0 to 1, for every second of the take
 * @throws RangeError if the rate is outside 8-192 kHz
 */
export function trackPitch(
  pcm: Float32Array,
  sampleRate: number,
  measured: MeasuredSound | null = null,
  onProgress: (share: number) => void = () => undefined,
): PitchTrack {
  const sound = measured?.sound ?? atAnalysisRate(pcm, sampleRate);
  const measure = createLagMeter();
  const measureShort = createLagMeter(SHORT_WINDOW);
  const count = Math.floor((pcm.length * 100) / sampleRate);
  const step = (k: number, from: number, share: number) => {
    if (k % 100 === 99) onProgress(from + (share * (k + 1)) / count);
  };
  const lagFrames = Array.from({ length: count }, (_, k) => {
    step(k, 0, MEASURING_SHARE);
    return measured?.lagFrames[k] ?? measure(sound, k * HOP - WINDOW / 2);
  });
  const room = measureRoom(lagFrames);
  const finder = createPathFinder();
  const found: CandidateFrame[] = [];
  lagFrames.forEach((lagFrame, k) => {
    const frame = findCandidates(lagFrame, room, () => measureShort(sound, k * HOP - SHORT_WINDOW / 2));
    found.push(frame);
    finder.push(frame);
    step(k, MEASURING_SHARE, 1 - MEASURING_SHARE);
  });
  const frames = finder.path().map((point, k) => ({
    ...trackFrame(found[k]!, point.candidate),
    overtoneDb:
      point.candidate && point.candidate.midi > OVERTONE_FROM_MIDI
        ? overtone(lagFrames[k]!.r, point.candidate.hz)
        : null,
  }));
  return { frames: markSecondVoices(frames, sound), room };
}

function overtone(r: Float32Array, hz: number): number {
  const first = powerAt(r, hz);
  const second = powerAt(r, Math.min(2 * hz, 2300));
  return first > 0 ? 10 * Math.log10(Math.max(1e-6, second / first)) : 0;
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
