import { emptyDraft, type SongDraft } from "./songDraft";

const keyOf = (id: string | null) => `larkspan.song-draft.${id ?? "new"}`;

/**
 * Songs being written, kept on this device until they are saved. Written at once on every change:
 * a reload in the middle must find the last letter.
 */
export const draftStore = {
  load(id: string | null): SongDraft | null {
    try {
      const kept = JSON.parse(localStorage.getItem(keyOf(id)) ?? "null") as Partial<SongDraft> | null;
      return kept === null || typeof kept !== "object" ? null : { ...emptyDraft, ...kept };
    } catch {
      return null;
    }
  },
  /** False where this browser keeps nothing. */
  save(id: string | null, draft: SongDraft): boolean {
    try {
      localStorage.setItem(keyOf(id), JSON.stringify(draft));
      return true;
    } catch {
      return false;
    }
  },
  clear(id: string | null): void {
    try {
      localStorage.removeItem(keyOf(id));
    } catch {
      return;
    }
  },
};
