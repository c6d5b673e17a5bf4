import { waveform } from "@/shared/signal/waveform";
import { takeSound } from "./takeSound";

/** Enough for a voice, and four minutes of it stay well under what may be handed in. */
const sentRate = 24_000;

/** A take as it can leave the device: a sound file, and how loud it is from beginning to end. */
export interface SoundToSend {
  sound: Blob;
  durationS: number;
  /** at most 400 steps of equal length, 0 to 1 */
  waveform: number[];
}

/** Makes the file that is handed in; nothing is sent by it. */
export async function soundToSend(pcm: Float32Array<ArrayBuffer>, sampleRate: number): Promise<SoundToSend> {
  return {
    sound: takeSound(await atRate(pcm, sampleRate, sentRate), sentRate),
    durationS: pcm.length / sampleRate,
    waveform: waveform(pcm),
  };
}

/** The browser's own resampler, which leaves nothing above half the new rate. */
async function atRate(pcm: Float32Array<ArrayBuffer>, from: number, to: number): Promise<Float32Array> {
  if (from === to || pcm.length === 0) return pcm;
  const context = new OfflineAudioContext(1, Math.max(1, Math.ceil((pcm.length * to) / from)), to);
  const buffer = context.createBuffer(1, pcm.length, from);
  buffer.copyToChannel(pcm, 0);
  const source = context.createBufferSource();
  source.buffer = buffer;
  source.connect(context.destination);
  source.start();
  return (await context.startRendering()).getChannelData(0);
}
