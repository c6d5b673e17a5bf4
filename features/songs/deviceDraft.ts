/** What is noted on this device and not kept with the song yet, song by song. */
export interface DeviceDraft<Content> {
  load(songId: string): Content | null;
  save(songId: string, content: Content): void;
  clear(songId: string): void;
}

/** Drafts of one kind, which a reload does not lose. Where the device keeps nothing there are none. */
export function deviceDraft<Content>(kind: string): DeviceDraft<Content> {
  const keyOf = (songId: string) => `larkspan.${kind}.${songId}`;
  const tried = <Result>(run: () => Result): Result | null => {
    try {
      return run();
    } catch {
      // A full or forbidden store, or a damaged draft, counts as none.
      return null;
    }
  };
  return {
    load: (songId) => tried(() => JSON.parse(localStorage.getItem(keyOf(songId)) ?? "null") as Content | null),
    save: (songId, content) => void tried(() => localStorage.setItem(keyOf(songId), JSON.stringify(content))),
    clear: (songId) => void tried(() => localStorage.removeItem(keyOf(songId))),
  };
}
