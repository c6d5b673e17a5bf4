import { useCallback, useEffect, useMemo, useReducer, useRef, useState } from "react";
import type { Song } from "@/shared/contract/song";
import type { TakeReport } from "@/shared/voice/takeReport";
import type { MelodyNote } from "@/shared/songs/melody";
import { insertNote, replaceNotes } from "@/shared/songs/noteEdits";
import { proposeHome, sungMelody, UNTIMED_TEMPO } from "@/shared/songs/sungMelody";
import { deviceDraft } from "@/features/api/deviceDraft";
import { keptTune, keptWords, type KeptTune } from "./keptTune";
import { beginHistory, noteHistory, stepsToKeep, type Moment, type NoteHistory } from "./noteHistory";

/** What becomes of a line that is sung. */
export type SungPlace = "whole" | "part" | "on";

interface NotesDraft {
  notes: readonly MelodyNote[];
  home: string | null;
  /** the way back; absent in older drafts */
  past?: readonly Moment[];
}

const drafts = deviceDraft<NotesDraft>("notes-draft");

function notesOf({ tune }: Song): NotesDraft {
  return { notes: tune?.kind === "melody" ? tune.notes : [], home: tune?.home ?? null };
}

/** What is kept, and over it what was changed and not kept: undoing leads back to what is kept. */
function historyOf({ notes, draft }: { notes: readonly MelodyNote[]; draft: NotesDraft | null }): NoteHistory {
  if (draft?.past) return { ...beginHistory(draft.notes), past: draft.past };
  const begun = beginHistory(notes);
  return draft ? noteHistory(begun, { kind: "edit", notes: draft.notes, chosen: { from: 0, to: 0 } }) : begun;
}

/** The tune of a song under the pencil: its notes with their history, its home note, and what keeping makes of it. */
export function useMelodyEditor(song: Song) {
  // What stood in the song when the page came, or what was kept from here: anything else is a draft.
  const base = useRef<NotesDraft>(notesOf(song));
  const [found, setFound] = useState(() => drafts.load(song.id));
  const [history, dispatch] = useReducer(noteHistory, { notes: base.current.notes, draft: found }, historyOf);
  // Chosen or kept; without either it is what the notes say.
  const [settledHome, setHome] = useState<string | null>((found ?? base.current).home);
  const { notes, chosen } = history;
  const latest = useRef(history);
  useEffect(() => {
    latest.current = history;
  });
  useEffect(() => {
    if (notes === base.current.notes && settledHome === base.current.home) drafts.clear(song.id);
    else drafts.save(song.id, { notes, home: settledHome, past: stepsToKeep(latest.current) });
  }, [song.id, notes, settledHome]);
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

  /** Gives up what was found again; undoing brings it back. */
  const giveUp = () => {
    dispatch({ kind: "edit", notes: base.current.notes, chosen: { from: 0, to: 0 } });
    setHome(base.current.home);
    setFound(null);
    // The button that was pressed is gone with its notice.
    document.querySelector("h1")?.focus({ preventScroll: true });
  };
  const letGo = () => {
    base.current = { notes, home: settledHome };
    drafts.clear(song.id);
  };

  const toKeep: KeptTune | null = useMemo(() => keptTune(song, { kind: "melody", notes }, home), [song, notes, home]);
  return {
    history,
    dispatch,
    found: found !== null,
    giveUp,
    letGo,
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
