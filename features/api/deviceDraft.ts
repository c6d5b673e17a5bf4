/** What is noted on this device and not kept with the song yet, song by song. */
export interface DeviceDraft<Content> {
  load(songId: string): Content | null;
  save(songId: string, content: Content): void;
  clear(songId: string): void;
}

/**
 * Drafts of one kind, which a reload does not lose. Where the device keeps nothing there are none.
 *
 * @param until how long they stand: until they are let go, or until the tab is closed
 */
export function deviceDraft<Content>(kind: string, until: "let go" | "tab" = "let go"): DeviceDraft<Content> {
  const store = () => (until === "tab" ? sessionStorage : localStorage);
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
    load: (songId) => tried(() => JSON.parse(store().getItem(keyOf(songId)) ?? "null") as Content | null),
    save: (songId, content) => void tried(() => store().setItem(keyOf(songId), JSON.stringify(content))),
    clear: (songId) => void tried(() => store().removeItem(keyOf(songId))),
  };
}
