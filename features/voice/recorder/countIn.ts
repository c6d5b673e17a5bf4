/** Beats that are counted before the listening begins. */
export const countInBeats = 4;
const beatS = 0.6;
const clickS = 0.04;

/**
 * Counts in: a click for each beat, and `onBeat` with the beats that are left, while the click sounds. Ends one beat
 * after the last click, when the singer comes in, so that no click is part of the take.
 */
export async function countIn(
  context: AudioContext,
  onBeat: (left: number) => void,
  signal: AbortSignal,
): Promise<void> {
  const from = context.currentTime + 0.05;
  for (let beat = 0; beat < countInBeats; beat += 1) click(context, from + beat * beatS, beat === 0);
  for (let beat = 0; beat <= countInBeats; beat += 1) {
    await reached(context, from + beat * beatS, signal);
    if (signal.aborted) return;
    if (beat < countInBeats) onBeat(countInBeats - beat);
  }
}

function click(context: AudioContext, at: number, first: boolean): void {
  const tone = new OscillatorNode(context, { frequency: first ? 1320 : 880 });
  const loud = new GainNode(context, { gain: 0 });
  loud.gain.setValueAtTime(0.25, at);
  loud.gain.exponentialRampToValueAtTime(0.001, at + clickS);
  tone.connect(loud).connect(context.destination);
  tone.start(at);
  tone.stop(at + clickS);
}

/** Waits on the clock of the sound itself, which alone says when the click is heard. */
function reached(context: AudioContext, at: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    const look = () => {
      const left = at - context.currentTime;
      if (left <= 0 || signal.aborted || context.state !== "running") resolve();
      else setTimeout(look, Math.min(50, 1000 * left));
    };
    look();
  });
}
