import type { MelodyVoice } from "@/shared/songs/melodyVoice";
import { lazyReaders } from "./lazyReaders";

const largest = 5 * 1024 * 1024;

export type MelodyReading = { ok: true; voices: MelodyVoice[]; proposed: number } | { ok: false; reason: string };

/** Reads a melody file of at most 5 MB. The reader is fetched when the first file is chosen. */
export async function readMelody(file: File): Promise<MelodyReading> {
  if (file.size > largest)
    return {
      ok: false,
      reason: "This file is larger than 5 MB. A melody is seldom larger than a few kB; choose another file.",
    };
  if (file.size === 0) return { ok: false, reason: "This file is empty. Choose another one." };
  try {
    const [{ readMelodyFile }, bytes] = await Promise.all([lazyReaders.melodyFile(), file.arrayBuffer()]);
    return readMelodyFile(file.name, new Uint8Array(bytes));
  } catch {
    return {
      ok: false,
      reason: "The file could not be opened here. What you typed is safe; check your connection and try again.",
    };
  }
}
