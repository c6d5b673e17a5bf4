import { execFileSync, spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { readWav } from "./wavFile";

const SOUND_FONT = "/usr/share/sounds/sf2/FluidR3_GM.sf2";
/** General MIDI programs (counted from 0) that sing, and one that is plucked. */
export const PROGRAM = { choirAahs: 52, voiceOohs: 53, nylonGuitar: 24 } as const;

/**
 * Renders a melody through Debian's fluidsynth and its General MIDI sound font: sampled voices that owe nothing to our
 * own synthesiser.
 *
 * @param notes whole MIDI numbers with durations in seconds, one after the other
 * @param options program (General MIDI, from 0), sampleRate, padS of silence before, gapS of rest after each note
 * @returns mono samples; null where fluidsynth or the sound font is not installed
 */
export function renderChoir(
  notes: readonly { midi: number; durationS: number }[],
  options: { program?: number; sampleRate?: number; padS?: number; gapS?: number } = {},
): { pcm: Float32Array; sampleRate: number } | null {
  const { program = PROGRAM.choirAahs, sampleRate = 44100, padS = 0.3, gapS = 0 } = options;
  if (!existsSync(SOUND_FONT) || spawnSync("fluidsynth", ["--version"]).status !== 0) return null;
  const folder = mkdtempSync(join(tmpdir(), "choir-"));
  try {
    const midiPath = join(folder, "tune.mid");
    const wavPath = join(folder, "tune.wav");
    writeFileSync(midiPath, midiBytes(notes, program, padS, gapS));
    execFileSync(
      "fluidsynth",
      [
        "-ni",
        "-q",
        "-R",
        "0",
        "-C",
        "0",
        "-g",
        "0.8",
        "-r",
        String(sampleRate),
        "-T",
        "wav",
        "-O",
        "s16",
        "-F",
        wavPath,
        SOUND_FONT,
        midiPath,
      ],
      { stdio: "ignore" },
    );
    return readWav(wavPath);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** A one-track MIDI file at one tick a millisecond. */
function midiBytes(
  notes: readonly { midi: number; durationS: number }[],
  program: number,
  padS: number,
  gapS: number,
): Uint8Array {
  const track: number[] = [0, 0xff, 0x51, 3, 0x07, 0xa1, 0x20, 0, 0xc0, program];
  let wait = Math.round(padS * 1000);
  for (const { midi, durationS } of notes) {
    track.push(...variableLength(wait), 0x90, midi, 96, ...variableLength(Math.round(durationS * 1000)), 0x80, midi, 0);
    wait = Math.round(gapS * 1000);
  }
  track.push(...variableLength(500), 0xff, 0x2f, 0);
  const length = track.length;
  const head = [0x4d, 0x54, 0x68, 0x64, 0, 0, 0, 6, 0, 0, 0, 1, 500 >> 8, 500 & 255, 0x4d, 0x54, 0x72, 0x6b];
  return Uint8Array.from([...head, length >>> 24, (length >>> 16) & 255, (length >>> 8) & 255, length & 255, ...track]);
}

function variableLength(value: number): number[] {
  const out = [value & 127];
  for (let rest = value >> 7; rest > 0; rest >>= 7) out.unshift((rest & 127) | 128);
  return out;
}
