import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { newId } from "@/features/api/newId";
import { shelf } from "@/features/api/shelf";
import { refreshShelf, useChangeSong, useRemoveSong } from "../../songQueries";
import { copyOf } from "./songCopy";

/** A song as far as actions need it. */
export interface ActedOn {
  id: string;
  title: string;
  playedAt: string | null;
  archivedAt: string | null;
}

/** What was just done, in words, with the way back where there is one. */
export interface DoneNotice {
  words: string;
  undo: (() => void) | null;
  /** leads to what came of it */
  open: string | null;
}

/** What can be done with a song from a list or from its page, and what was done last. */
export function useSongActions() {
  const client = useQueryClient();
  const change = useChangeSong();
  const remove = useRemoveSong();
  const [notice, setNotice] = useState<DoneNotice | null>(null);
  const duplicate = useMutation({
    mutationFn: async (id: string) => shelf.put("songs", copyOf(await shelf.get("songs", id), newId(), new Date())),
    onSuccess: async (copy) => {
      setNotice({ words: `“${copy.title}” stands on your shelf.`, undo: null, open: copy.id });
      await refreshShelf(client);
    },
  });
  const done = (words: string, undo: (() => void) | null = null) => setNotice({ words, undo, open: null });

  const put = (song: ActedOn, archivedAt: string | null, words: string, back: (() => void) | null) =>
    change.mutate({ id: song.id, change: { archivedAt } }, { onSuccess: () => done(words, back) });
  const archive = (song: ActedOn) =>
    put(song, new Date().toISOString(), `“${song.title}” is put aside.`, () =>
      put(song, null, `“${song.title}” is back on your shelf.`, null),
    );
  const restore = (song: ActedOn) =>
    put(song, null, `“${song.title}” is back on your shelf.`, () =>
      put(song, song.archivedAt ?? new Date().toISOString(), `“${song.title}” is put aside again.`, null),
    );
  const played = (song: ActedOn) =>
    change.mutate(
      { id: song.id, change: { playedAt: new Date().toISOString() } },
      {
        onSuccess: () =>
          done(`“${song.title}” was played today.`, () =>
            change.mutate(
              { id: song.id, change: { playedAt: song.playedAt } },
              { onSuccess: () => done(`“${song.title}” is as it was.`) },
            ),
          ),
      },
    );
  return {
    archive,
    restore,
    played,
    duplicate: (song: ActedOn) => duplicate.mutate(song.id),
    remove: (song: ActedOn, after: () => void) =>
      remove.mutate(song.id, {
        onSuccess: () => {
          done(`“${song.title}” is deleted.`);
          after();
        },
      }),
    removal: remove,
    notice,
    /** what the last action failed of */
    error: change.error ?? duplicate.error,
    dismiss: () => {
      setNotice(null);
      change.reset();
      duplicate.reset();
    },
  };
}

export type SongActions = ReturnType<typeof useSongActions>;
