import type { Spelling } from "@/shared/music/pitch";

/** Which accidentals go with a home note. */
export function spellingOfHome(tonic: string): Spelling {
  return tonic.includes("b") || tonic === "F" ? "flats" : "sharps";
}
