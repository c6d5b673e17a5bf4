import type { KeyName } from "@/shared/music/keyName";
import { tonicPitchClass } from "@/shared/music/keyName";
import { keySign, movedKey } from "@/shared/music/keyWords";
import { shortMove } from "@/shared/music/moveWords";
import { glyphs } from "@/shared/music/pitch";
import type { PupilKey } from "../judge/judgePupils";

/** A key that a pupil may be given. */
export interface KeyOption {
  tonic: string;
  /** semitones from the tune as written, octave included */
  shift: number;
  /** as a list shows it: "C, 92 of 100" */
  label: string;
  /** null where no voice or no tune judges it */
  judged: PupilKey | null;
}

/** Said with a key that no voice judged. */
export const unjudgedReason = "Chosen without a voice to judge it by.";

/** The keys that a pupil can be given: best first where they are judged, else from the written key up. */
export function keyOptions(written: KeyName, keys: readonly PupilKey[] | undefined): KeyOption[] {
  if (keys)
    return keys.map((judged) => {
      const { tonic, shift, score } = judged;
      const sign = glyphs(keySign({ tonic, mode: written.mode }));
      return { tonic, shift, judged, label: `${sign}, ${score} of 100` };
    });
  return Array.from({ length: 12 }, (_, k) => (k < 7 ? k : k - 12)).map((shift) => {
    const key = movedKey(written, shift);
    return { tonic: key.tonic, shift, judged: null, label: `${glyphs(keySign(key))}, ${shortMove(shift)}` };
  });
}

/** What is proposed to one pupil: the key asked for all, else the best one. */
export function proposedOption(options: readonly KeyOption[], asked: string | null): KeyOption {
  const same = ({ tonic }: KeyOption) => asked !== null && tonicPitchClass(tonic) === tonicPitchClass(asked);
  const found = options.find(same) ?? options[0];
  if (!found) throw new RangeError("there is no key to propose");
  return found;
}
