import { useCallback, useMemo, useReducer, useState } from "react";
import type { Song } from "@/shared/contract/song";
import type { TakeReport } from "@/shared/voice/takeReport";
import type { MelodyNote } from "@/shared/songs/melody";
import { insertNote, replaceNotes } from "@/shared/songs/noteEdits";
import { proposeHome, sungMelody, UNTIMED_TEMPO } from "@/shared/songs/sungMelody";
import { keptTune, keptWords, type KeptTune } from "./keptTune";
import { beginHistory, noteHistory } from "./noteHistory";

/** What becomes of a line that is sung. */
export type SungPlace = "whole" | "part" | "on";

/** The tune of a song under the pencil: its notes with their history, its home note, and what keeping makes of it. */
export function useMelodyEditor(song: Song) {
  const kept = song.tune;
  const [history, dispatch] = useReducer(noteHistory, kept?.kind === "melody" ? kept.notes : [], beginHistory);
  // Chosen or kept; without either it is what the notes say.
  const [settledHome, setHome] = useState<string | null>(kept?.home ?? null);
  const { notes, chosen } = history;
  const written = song.writtenKey;
  const proposed = useMemo(() => proposeHome(notes, written?.mode ?? null), [notes, written]);
  const home = settledHome ?? proposed?.tonic ?? written?.tonic ?? "C";
  const tempo = song.tempo ?? UNTIMED_TEMPO;

  const sung = useCallback(
    (report: TakeReport, place: SungPlace): number => {
      const heard = sungMelody(report, tempo);
      if (heard.length === 0) return 0;
      const last = notes.at(-1);
      if (place === "whole" || !last) {
        setHome(null);
        dispatch({ kind: "edit", notes: heard, chosen: { from: 0, to: 0 } });
      } else if (place === "part" && chosen) {
        const { from, to } = chosen;
        const changed = replaceNotes(notes, from, to, heard);
        dispatch({ kind: "edit", notes: changed, chosen: { from, to: from + heard.length - 1 } });
      } else {
        const end = last.start + last.duration;
        const added = heard.map((note) => ({ ...note, start: note.start + end }));
        dispatch({
          kind: "edit",
          notes: [...notes, ...added],
          chosen: { from: notes.length, to: notes.length + added.length - 1 },
        });
      }
      return heard.length;
    },
    [chosen, notes, tempo],
  );

  const enter = useCallback(
    (note: Pick<MelodyNote, "midi" | "duration">) => {
      if (notes.length === 0 && settledHome === null && written) setHome(written.tonic);
      const after = chosen?.to ?? notes.length - 1;
      dispatch({
        kind: "edit",
        notes: insertNote(notes, after, note),
        chosen: { from: after + 1, to: after + 1 },
      });
    },
    [chosen, notes, settledHome, written],
  );

  const toKeep: KeptTune | null = useMemo(() => keptTune(song, { kind: "melody", notes }, home), [song, notes, home]);
  return {
    history,
    dispatch,
    home,
    setHome,
    proposed,
    tempo,
    sung,
    enter,
    toKeep,
    movedWords: toKeep && keptWords(song, home, toKeep.move),
  };
}
