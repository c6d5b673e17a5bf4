import { glyphs, noteName } from "../music/pitch";
import { clippedShare } from "../signal/level";
import { trackPitch, type MeasuredSound } from "./pitchTrack";
import { commonTuning, pitchSpread } from "./pitchSpread";
import { findNotes, HELD_IN_HOLD_S, HELD_IN_PHRASE_S, type HeardNote } from "./sungNotes";
import { weedNotes } from "./noteWeeding";
import { weighCertainty } from "./takeCertainty";
import { judgeTake, refusal } from "./takeVerdict";
import type { Advice, PitchBand, SungNote, TakeReport } from "./takeReport";
import { comfortBand, probableReach } from "./vocalReach";

/**
 * Listens to a whole take: what was sung, from where to where, and how sure that is.
 *
 * @param pcm mono samples in [-1, 1], shape [n]; not modified
 * @param sampleRate in Hz, 8000 to 192000
 * @param options hold: the singer was asked to hold single notes, so that a note counts from 0.5 s instead of 0.24 s;
 *   a4: reference pitch in Hz that MIDI numbers refer to, default 440;
 *   measured: what a live tracker measured of this very take, which saves measuring it again;
 *   onProgress: told the share of the work that is done, 0 to 1, for every second of the take
 * @returns the report; its numbers are null unless the verdict is "heard"
 * @throws RangeError if the rate is outside 8-192 kHz or a4 is not positive
 */
export function listenToTake(
  pcm: Float32Array,
  sampleRate: number,
  options: { hold?: boolean; a4?: number; measured?: MeasuredSound | null; onProgress?: (share: number) => void } = {},
): TakeReport {
  const { hold = false, a4 = 440, measured = null, onProgress } = options;
  if (!(a4 > 0)) throw new RangeError("a4 must be a positive frequency in Hz");
  const { frames, room } = trackPitch(pcm, sampleRate, measured, onProgress);
  const toReference = 12 * Math.log2(440 / a4);
  const found = findNotes(frames, hold ? HELD_IN_HOLD_S : HELD_IN_PHRASE_S).map((n) => ({
    ...n,
    midi: n.midi + toReference,
  }));
  const notes = weedNotes(found);
  const durationS = pcm.length / sampleRate;
  const verdict = judgeTake({ durationS, hold, frames, notes, room, clipped: clippedShare(pcm) });
  const clear = notes.filter((n) => n.clear);
  const base = { durationS, f0: frames.map((f) => f.hz), notes: notes.map(sungNote), tuningCents: commonTuning(clear) };
  const spread = pitchSpread(clear);
  if (verdict !== "heard" || spread === null) {
    const why = refusal(verdict === "heard" ? "not-singing" : verdict);
    return {
      verdict: verdict === "heard" ? "not-singing" : verdict,
      ...why,
      advice: "sing-again",
      ...base,
      range: null,
      comfort: null,
      estimate: null,
      tessitura: null,
      certainty: 0,
      reasons: [why.sentence],
    };
  }
  const range = { lowMidi: Math.min(...clear.map((n) => n.midi)), highMidi: Math.max(...clear.map((n) => n.midi)) };
  const comfort = comfortBand(range, spread);
  const estimate = probableReach(range);
  const { certainty, reasons } = weighCertainty(notes, frames, room);
  const tuned = base.tuningCents / 100;
  const advice = adviceFor(certainty, range);
  return {
    verdict,
    sentence: `You sang from ${named(range.lowMidi - tuned)} to ${named(range.highMidi - tuned)}.`,
    nextStep: NEXT_STEPS[advice],
    advice,
    ...base,
    range,
    comfort,
    estimate,
    tessitura: spread,
    certainty,
    reasons: [
      ...reasons,
      "The comfortable band keeps default reserves: about two and a half semitones at the top, one and a half at the bottom.",
    ],
  };
}

function named(midi: number): string {
  return glyphs(noteName(midi));
}

/** Less sure than this, one more line is worth singing. */
const SURE_ENOUGH = 0.5;
/** A narrower range than this, in semitones, is a song's rather than a voice's. */
const WIDE_ENOUGH = 12;

const NEXT_STEPS: Record<Advice, string> = {
  "sing-again": "Sing another line to make this surer.",
  "hold-ends": "A song shows only part of a voice; hold your lowest and highest easy note to find the rest.",
  "go-on": "Try it in a song.",
};

function adviceFor(certainty: number, range: PitchBand): Advice {
  if (certainty < SURE_ENOUGH) return "sing-again";
  return range.highMidi - range.lowMidi < WIDE_ENOUGH ? "hold-ends" : "go-on";
}

function sungNote({ start, end, midi, steadinessCents, vibrato, levelDb, sustained, clear }: HeardNote): SungNote {
  return { start, end, midi, steadinessCents, vibrato, levelDb, sustained, clear };
}
