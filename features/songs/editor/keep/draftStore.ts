import type { Song } from "@/shared/contract/song";
import { newId } from "@/features/api/newId";
import { emptyDraft, type SongDraft } from "../songDraft";

/** What is typed and not kept yet. */
export interface StoredDraft {
  draft: SongDraft;
  /** the song it began from; null for a new one */
  base: Song | null;
}

interface Entry extends StoredDraft {
  at: number;
}

/** Each tab has its own, so that two tabs at one song never overwrite each other; a reload is the same tab. */
function tabName(): string {
  try {
    const kept = sessionStorage.getItem("larkspan.tab");
    if (kept) return kept;
    const name = newId();
    sessionStorage.setItem("larkspan.tab", name);
    return name;
  } catch {
    return "tab";
  }
}

const prefixOf = (id: string | null) => `larkspan.song-draft.${id ?? "new"}.`;
const keyOf = (id: string | null) => prefixOf(id) + tabName();

/** Drafts by their keys: this tab's own first, then the latest. */
function entries(id: string | null): { key: string; entry: Entry }[] {
  const found: { key: string; entry: Entry }[] = [];
  for (let index = 0; index < localStorage.length; index += 1) {
    const key = localStorage.key(index);
    if (!key?.startsWith(prefixOf(id))) continue;
    try {
      const kept = JSON.parse(localStorage.getItem(key) ?? "null") as Entry | null;
      if (kept?.draft) found.push({ key, entry: { ...kept, draft: { ...emptyDraft, ...kept.draft } } });
    } catch {
      // A damaged draft counts as none.
    }
  }
  const own = keyOf(id);
  return found.sort((a, b) => Number(b.key === own) - Number(a.key === own) || b.entry.at - a.entry.at);
}

/** What is typed and not kept yet, on this device, song by song. */
export const draftStore = {
  load(id: string | null): StoredDraft | null {
    try {
      const [first] = entries(id);
      return first ? { draft: first.entry.draft, base: first.entry.base } : null;
    } catch {
      return null;
    }
  },
  /** False where the device keeps nothing. */
  save(id: string | null, draft: SongDraft, base: Song | null): boolean {
    try {
      const entry: Entry = { draft, base, at: Date.now() };
      localStorage.setItem(keyOf(id), JSON.stringify(entry));
      return true;
    } catch {
      return false;
    }
  },
  /** Lets go of this tab's draft, and of others that say the same as what is kept now. */
  clear(id: string | null, kept?: SongDraft): void {
    try {
      for (const { key, entry } of entries(id))
        if (key === keyOf(id) || (kept && JSON.stringify(entry.draft) === JSON.stringify(kept)))
          localStorage.removeItem(key);
    } catch {
      return;
    }
  },
};
