import { ApiError } from "@/features/api/apiError";
import type { Song } from "@/shared/contract/song";
import { contentOf, sameContent, type SongContent } from "./mergeSongs";

export type KeepState =
  /** `at`: when it was last kept here; null if nothing was changed yet */
  | { kind: "kept"; at: Date | null }
  | { kind: "keeping" }
  /** something is missing or wrong in the form */
  | { kind: "unfinished" }
  | { kind: "failed"; error: Error }
  /** somebody changed it meanwhile: `base` is what both began from */
  | { kind: "clash"; base: Song; theirs: Song };

export interface KeeperPlace {
  /** `version`: the state before must stay in the earlier versions */
  put: (song: Song, version: boolean) => Promise<Song>;
  get: (id: string) => Promise<Song>;
  /** what is to be kept now; null while it cannot be, because something is missing */
  current: () => SongContent | null;
  onState: (state: KeepState) => void;
  /** a song was kept, and whether it is all that there is to keep */
  onKept: (song: Song, all: boolean) => void;
}

/** Milliseconds without a change after which a song is kept. */
const idle = 1500;

export type SongKeeper = ReturnType<typeof createSongKeeper>;

/** Keeps a song by itself a moment after each change: one at a time, never over a change made elsewhere. */
export function createSongKeeper(first: Song, place: KeeperPlace) {
  let base = first;
  let timer: ReturnType<typeof setTimeout> | null = null;
  let running: Promise<boolean> | null = null;
  let again = false;
  let clashing = false;
  let aside: SongContent | null = null;
  let version = false;

  const stopTimer = () => {
    if (timer !== null) clearTimeout(timer);
    timer = null;
  };

  async function keepOnce(): Promise<boolean> {
    const content = place.current();
    if (clashing) return false;
    if (content === null) {
      place.onState({ kind: "unfinished" });
      return false;
    }
    if (aside === null && sameContent(content, base)) {
      place.onKept(base, true);
      place.onState({ kind: "kept", at: null });
      return true;
    }
    place.onState({ kind: "keeping" });
    try {
      if (aside !== null) base = await place.put({ ...base, ...aside }, true);
      aside = null;
      base = await place.put({ ...base, ...content }, version);
      version = false;
    } catch (error) {
      return refused(error, content);
    }
    return settled(content);
  }

  function settled(content: SongContent): boolean {
    const now = place.current();
    const all = now !== null && sameContent(now, content);
    place.onKept(base, all);
    if (all) place.onState({ kind: "kept", at: new Date() });
    else again = true;
    return all;
  }

  async function refused(error: unknown, content: SongContent): Promise<boolean> {
    if (!(error instanceof ApiError && error.code === "changed-elsewhere")) {
      place.onState({ kind: "failed", error: error as Error });
      return false;
    }
    try {
      const theirs = await place.get(base.id);
      if (sameContent(theirs, base)) {
        // Only its tags or the like were changed: both stand.
        base = theirs;
        again = true;
        return false;
      }
      if (sameContent(theirs, content)) {
        base = theirs;
        return settled(content);
      }
      clashing = true;
      place.onState({ kind: "clash", base, theirs });
    } catch (failure) {
      place.onState({ kind: "failed", error: failure as Error });
    }
    return false;
  }

  async function run(): Promise<boolean> {
    let done = false;
    do {
      again = false;
      done = await keepOnce();
    } while (again);
    return done;
  }

  /** Keeps at once. True when all that there is is kept. */
  async function keep(): Promise<boolean> {
    stopTimer();
    while (running) {
      again = true;
      await running;
    }
    running = run();
    try {
      return await running;
    } finally {
      running = null;
    }
  }

  return {
    /** the song as it was last kept, as far as is known here */
    base: () => base,
    keep,
    /** Something was changed: it is kept when nothing more is for a moment. */
    touch() {
      stopTimer();
      if (clashing) return;
      place.onState({ kind: "keeping" });
      timer = setTimeout(() => void keep(), idle);
    },
    /**
     * Both sides are decided: from here on `theirs` is what is changed, and it stays in the earlier versions;
     * what is given up here goes there too.
     */
    settle(theirs: Song, givenUp: SongContent | null) {
      clashing = false;
      version = true;
      aside = givenUp;
      base = theirs;
    },
    /** The place holds a newer state, and nothing here differs from the old one. */
    follow(newer: Song): boolean {
      const content = place.current();
      if (running || clashing || newer.revision <= base.revision || !content || !sameContent(content, base))
        return false;
      base = newer;
      return !sameContent(content, contentOf(newer));
    },
    stop: stopTimer,
  };
}
