import { PitchDetector } from "pitchy";
import { HOP, SHORT_WINDOW } from "../signal/lagFrame";
import { levelDbfs } from "../signal/level";
import { ANALYSIS_RATE, createResampler } from "../signal/resampler";
import type { LiveFrame } from "./liveTracker";

/** A look this clear is believed, if the one 5 ms before it saw the same. */
const CLEAR = 0.92;
const SAME_SEMITONES = 0.35;
/** Nearer to what the tracker says, the tracker alone speaks. */
const OTHER_NOTE_SEMITONES = 0.8;
/** Three periods in the window of 32 ms. */
const LOWEST_HZ = 94;
const HIGHEST_HZ = 1400;
const QUIETEST_DB = -55;
/** Octaves and twelfths up and down are where a short look errs; they are the tracker's to say. */
const LEFT_TO_TRACKER = [12, 19, 24];
const NEAR_MULTIPLE = 0.8;

/** A quick look at the newest sound, ahead of the tracker. */
export interface NoteGlimpse {
  /** @param pcm the same mono samples as the tracker gets, shape [n] */
  push(pcm: Float32Array): void;
  /**
   * @param ahead what the tracker expects, oldest first
   * @returns `ahead`, and two more frames at the end where a new note has begun that the tracker cannot see yet
   */
  beyond(ahead: LiveFrame[]): LiveFrame[];
}

/**
 * Sees a new note some 20 ms before the tracker does, through a window of 32 ms instead of 64, and without weighing what
 * was sung before. It only ever adds a note that two looks in a row saw clearly and that is no octave or twelfth of what
 * the tracker hears; everything that is kept comes from the tracker.
 *
 * @param sampleRate in Hz, 8000 to 192000
 * @returns the glimpse, with its own memory
 * @throws RangeError if the rate is outside 8-192 kHz
 * @see P. McLeod, G. Wyvill, "A smarter way to find pitch", ICMC 2005
 */
export function createNoteGlimpse(sampleRate: number): NoteGlimpse {
  const resampler = createResampler(sampleRate);
  const detector = PitchDetector.forFloat32Array(SHORT_WINDOW);
  let sound = new Float32Array(0);
  let before: number | null = null;
  let seen: number | null = null;

  function look(window: Float32Array): void {
    const level = levelDbfs(window);
    const [hz, clarity] = level > QUIETEST_DB ? detector.findPitch(window, ANALYSIS_RATE) : [0, 0];
    const midi = clarity >= CLEAR && hz >= LOWEST_HZ && hz <= HIGHEST_HZ ? 69 + 12 * Math.log2(hz / 440) : null;
    seen = midi !== null && before !== null && Math.abs(midi - before) < SAME_SEMITONES ? midi : null;
    before = midi;
  }

  return {
    push(pcm) {
      const more = resampler.push(pcm);
      const joined = new Float32Array(sound.length + more.length);
      joined.set(sound);
      joined.set(more, sound.length);
      let from = 0;
      for (; from + SHORT_WINDOW <= joined.length; from += HOP / 2) look(joined.subarray(from, from + SHORT_WINDOW));
      sound = joined.slice(from);
    },
    beyond(ahead) {
      const last = ahead.at(-1);
      if (seen === null || !last) return ahead;
      if (last.hz !== null) {
        const away = Math.abs(seen - 69 - 12 * Math.log2(last.hz / 440));
        if (
          away < OTHER_NOTE_SEMITONES ||
          LEFT_TO_TRACKER.some((multiple) => Math.abs(away - multiple) < NEAR_MULTIPLE)
        ) {
          return ahead;
        }
      }
      const hz = 440 * 2 ** ((seen - 69) / 12);
      return [...ahead, ...[0.01, 0.02].map((later) => ({ ...last, t: last.t + later, hz }))];
    },
  };
}
