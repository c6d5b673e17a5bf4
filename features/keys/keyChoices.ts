import type { Song } from "@/shared/contract/song";
import { fitSentence } from "@/shared/keys/fixed/fixedInstrument";
import type { KeyName } from "@/shared/music/keyName";
import { keySign, movedKey } from "@/shared/music/keyWords";
import { shortMove } from "@/shared/music/moveWords";
import { glyphs } from "@/shared/music/pitch";
import { writtenKeyOf } from "./songKeys";
import type { SongKeys } from "./useSongKeys";

/**
 * The keys of a song for a list to choose from: best first with their scores where a voice judges them, else from the
 * written key up. The key in view is always among them.
 */
export function keyChoicesFor(
  { rows, fixed }: Pick<SongKeys, "rows" | "fixed">,
  song: Pick<Song, "writtenKey" | "tune">,
  inView: { key: KeyName; shift: number },
): { shift: number; label: string }[] {
  const fit = (key: KeyName) => fitSentence(key, fixed)?.replace(/^F/, "f").replace(/^D/, "d").replace(/\.$/, "");
  const label = (key: KeyName, ...more: (string | undefined)[]) =>
    [glyphs(keySign(key)), ...more, fit(key)].filter((words) => words !== undefined).join(", ");
  const written = writtenKeyOf(song);
  const choices = rows
    ? rows.map(({ key, shift, score }) => ({ shift, label: label(key, `${score} of 100`) }))
    : Array.from({ length: 12 }, (_, k) => k - 5).map((shift) => {
        const key = written ? movedKey(written, shift) : inView.key;
        return { shift, label: label(key, shortMove(shift)) };
      });
  if (choices.some(({ shift }) => shift === inView.shift)) return choices;
  return [{ shift: inView.shift, label: label(inView.key) }, ...choices];
}
