import { useQueryClient } from "@tanstack/react-query";
import { useCallback, useEffect, useRef, useState } from "react";
import { shelf } from "@/features/api/shelf";
import type { Song } from "@/shared/contract/song";
import type { KeyName } from "@/shared/music/keyName";
import { versionQueries } from "../history/versionQueries";
import { refreshShelf, songQueries } from "../../songQueries";
import { draftErrors, songFromDraft, type SongDraft } from "../songDraft";
import { draftStore } from "./draftStore";
import { contentOf, type SongContent } from "./mergeSongs";
import { createSongKeeper, type KeepState, type SongKeeper } from "./songKeeper";

export interface Keeping {
  state: KeepState;
  /** Keeps at once; true when all is kept. */
  keep: () => Promise<boolean>;
  /** After a clash: what is in the form from here on is a change of `theirs`; what is given up stays in the earlier versions. */
  settle: (theirs: Song, givenUp: SongContent | null) => void;
}

interface Asked {
  song: Song;
  draft: SongDraft;
  /** the song the draft began from, where it was found again on this device */
  base: Song | null;
  /** the draft was found again, and is still to be kept */
  restored: boolean;
  /** the key that the chart speaks of, worked out from its last letter */
  findKey: (draft: SongDraft) => KeyName | null;
  /** the shelf holds a newer state and nothing was typed here */
  onNewer: (song: Song) => void;
}

/** Keeps a song that is being changed by itself: a moment after typing, when the page is left, and when the connection is back. */
export function useKeeping({ song, draft, base, restored, findKey, onNewer }: Asked): Keeping {
  const client = useQueryClient();
  const [state, setState] = useState<KeepState>({ kind: "kept", at: null });
  const latest = useRef({ draft, findKey, onNewer });
  const first = useRef<SongDraft | null>(restored ? null : draft);
  const keptAt = useRef<Date | null>(null);
  useEffect(() => {
    latest.current = { draft, findKey, onNewer };
  });

  const [keeper] = useState<SongKeeper>(() =>
    createSongKeeper(base ?? song, {
      async put(next, version) {
        const kept = await shelf.put("songs", next, { version });
        client.setQueryData(songQueries.detail(kept.id).queryKey, kept);
        void refreshShelf(client);
        void client.invalidateQueries({ queryKey: versionQueries.list(kept.id).queryKey });
        return kept;
      },
      get: (id) => shelf.get("songs", id),
      current: () => contentNow(latest.current.draft, latest.current.findKey, song),
      onState: (next) => {
        if (next.kind === "kept") keptAt.current = next.at ?? keptAt.current;
        setState(next.kind === "kept" ? { kind: "kept", at: keptAt.current } : next);
      },
      onKept: (_, all) => {
        if (all) draftStore.clear(song.id, latest.current.draft);
      },
    }),
  );

  useEffect(() => {
    if (draft === first.current) return;
    // From here on going back to what stood first is a change like any other.
    first.current = null;
    draftStore.save(song.id, draft, keeper.base());
    keeper.touch();
  }, [draft, keeper, song.id]);
  useEffect(() => {
    if (keeper.follow(song)) latest.current.onNewer(song);
  }, [song, keeper]);
  useEffect(() => {
    const now = () => void keeper.keep();
    const hidden = () => {
      if (document.visibilityState === "hidden") now();
    };
    document.addEventListener("visibilitychange", hidden);
    window.addEventListener("online", now);
    return () => {
      document.removeEventListener("visibilitychange", hidden);
      window.removeEventListener("online", now);
      now();
    };
  }, [keeper]);

  return {
    state,
    keep: useCallback(() => keeper.keep(), [keeper]),
    settle: useCallback((theirs: Song, givenUp: SongContent | null) => keeper.settle(theirs, givenUp), [keeper]),
  };
}

function contentNow(draft: SongDraft, findKey: Asked["findKey"], song: Song): SongContent | null {
  const found = draft.key === null ? findKey(draft) : null;
  return Object.keys(draftErrors(draft, found)).length > 0 ? null : contentOf(songFromDraft(draft, found, song));
}
