import { restoreFlatTops } from "./flatTops";

/** Kinds of sound file that are taken. */
export type SoundKind = "wav" | "mp3" | "m4a" | "ogg" | "webm" | "flac";
/** Why a file cannot be used. */
export type Refusal = "not-a-sound" | "unreadable-file" | "too-large" | "too-long" | "empty-file";

const largestFileBytes = 20 * 1024 * 1024;
const longestFileS = 600;

/** A long recording at the full rate would take a phone's whole memory. */
const fullRate = 44_100;
const sparingRate = 16_000;
const fullRateUpToS = 120;
/** Where a file does not say how long it is: what is this small is short, or compressed so far that it does not matter. */
const fullRateUpToBytes = 2 * 1024 * 1024;

export class FileRefused extends Error {
  constructor(
    readonly why: Refusal,
    readonly kind: SoundKind | null,
  ) {
    super(`The file is not used: ${why}`);
  }
}

export interface FileSound {
  kind: SoundKind;
  pcm: Float32Array<ArrayBuffer>;
  sampleRate: number;
}

/**
 * What a file is, by its first bytes; its name says nothing. Null where it is none of the kinds that are taken.
 *
 * @see RIFF/WAVE (IBM and Microsoft 1991), ISO 11172-3 frame header, ID3v2, ISO 14496-12 "ftyp", RFC 3533, RFC 8794, RFC 9639
 */
export function soundKind(head: Uint8Array): SoundKind | null {
  const text = (from: number, to: number) => String.fromCharCode(...head.subarray(from, to));
  if (text(0, 4) === "RIFF" && text(8, 12) === "WAVE") return "wav";
  if (text(0, 4) === "fLaC") return "flac";
  if (text(0, 4) === "OggS") return "ogg";
  if (text(4, 8) === "ftyp") return "m4a";
  if (head[0] === 0x1a && head[1] === 0x45 && head[2] === 0xdf && head[3] === 0xa3) return "webm";
  if (text(0, 3) === "ID3" || isMpegFrame(head)) return "mp3";
  return null;
}

/** Eleven set bits, then a version, a layer, a bit rate and a sampling rate that exist. */
function isMpegFrame([a = 0, b = 0, c = 0]: Uint8Array): boolean {
  const sync = a === 0xff && (b & 0xe0) === 0xe0;
  const version = (b >> 3) & 3;
  const layer = (b >> 1) & 3;
  return sync && version !== 1 && layer !== 0 && c >> 4 !== 15 && ((c >> 2) & 3) !== 3;
}

/**
 * Turns a sound file into mono sound, on this device.
 *
 * @param onBytes told the share of the file that was read, 0 to 1, and null once it is being turned into sound
 * @throws FileRefused with the reason
 */
export async function readSoundFile(
  file: File,
  onBytes: (share: number | null) => void = () => undefined,
): Promise<FileSound> {
  if (file.size > largestFileBytes) throw new FileRefused("too-large", null);
  if (file.size === 0) throw new FileRefused("empty-file", null);
  const kind = soundKind(new Uint8Array(await bytesOf(file.slice(0, 64), null)));
  if (!kind) throw new FileRefused("not-a-sound", null);
  const said = await saidLength(file);
  if (said !== null && said > longestFileS) throw new FileRefused("too-long", kind);
  const full = said === null ? file.size <= fullRateUpToBytes : said <= fullRateUpToS;
  const bytes = await bytesOf(file, kind, onBytes);
  onBytes(null);
  const sound = await decode(bytes, kind, full ? fullRate : sparingRate);
  if (sound.duration > longestFileS) throw new FileRefused("too-long", kind);
  if (sound.length === 0) throw new FileRefused("empty-file", kind);
  return { kind, pcm: restoreFlatTops(mono(sound)), sampleRate: sound.sampleRate };
}

async function bytesOf(
  blob: Blob,
  kind: SoundKind | null,
  onBytes: (share: number) => void = () => undefined,
): Promise<ArrayBuffer> {
  try {
    const bytes = new Uint8Array(blob.size);
    const reader = blob.stream().getReader();
    let at = 0;
    for (let part = await reader.read(); !part.done; part = await reader.read()) {
      bytes.set(part.value, at);
      at += part.value.length;
      onBytes(at / blob.size);
    }
    return bytes.buffer;
  } catch {
    throw new FileRefused("unreadable-file", kind);
  }
}

async function decode(bytes: ArrayBuffer, kind: SoundKind, rate: number): Promise<AudioBuffer> {
  try {
    return await new OfflineAudioContext(1, 1, rate).decodeAudioData(bytes);
  } catch {
    throw new FileRefused("unreadable-file", kind);
  }
}

/** How long a file says that it is, before it is decoded; null where it does not say. */
function saidLength(file: File): Promise<number | null> {
  const player = new Audio();
  const address = URL.createObjectURL(file);
  return new Promise<number | null>((resolve) => {
    const late = setTimeout(() => resolve(null), 3000);
    const answer = () => {
      clearTimeout(late);
      resolve(Number.isFinite(player.duration) ? player.duration : null);
    };
    player.onloadedmetadata = answer;
    player.onerror = answer;
    player.preload = "metadata";
    player.src = address;
  }).finally(() => {
    player.removeAttribute("src");
    URL.revokeObjectURL(address);
  });
}

function mono(sound: AudioBuffer): Float32Array<ArrayBuffer> {
  const channels = Array.from({ length: sound.numberOfChannels }, (_, k) => sound.getChannelData(k));
  const [first] = channels;
  if (first && channels.length === 1) return first.slice();
  const pcm = new Float32Array(sound.length);
  for (const channel of channels) {
    for (let k = 0; k < pcm.length; k += 1) pcm[k] = (pcm[k] ?? 0) + (channel[k] ?? 0) / channels.length;
  }
  return pcm;
}
