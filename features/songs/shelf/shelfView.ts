/** By what the shelf is ordered. */
export type ShelfSort = "played" | "title" | "key" | "fit" | "newest";

/** What of the shelf is shown, as the address keeps it. */
export interface ShelfView {
  q: string;
  tag: string | null;
  sort: ShelfSort;
  /** the songs put aside, instead of the shelf */
  archived: boolean;
}

export const shelfSorts: readonly { value: ShelfSort; label: string }[] = [
  { value: "title", label: "Title" },
  { value: "played", label: "Played lately" },
  { value: "newest", label: "Newest" },
  { value: "key", label: "Key" },
  { value: "fit", label: "Fit for my voice" },
];

/** What an address holds; anything it says that is not known is left aside. */
export function readView(params: Record<string, string | string[] | undefined>): ShelfView {
  const one = (name: string) => {
    const value = params[name];
    return (Array.isArray(value) ? value[0] : value) ?? "";
  };
  const sort = shelfSorts.find(({ value }) => value === one("sort"))?.value ?? "title";
  return { q: one("q"), tag: one("tag") === "" ? null : one("tag"), sort, archived: one("shelf") === "archived" };
}

/** The same for an address; what goes without saying is left out. */
export function viewParams(view: ShelfView): Record<"q" | "tag" | "sort" | "shelf", string | undefined> {
  return {
    q: view.q.trim() === "" ? undefined : view.q,
    tag: view.tag ?? undefined,
    sort: view.sort === "title" ? undefined : view.sort,
    shelf: view.archived ? "archived" : undefined,
  };
}

/** What was found, as a screen reader says it after typing. */
export function foundWords(view: ShelfView, total: number): string {
  const songs = `${total} ${total === 1 ? "song" : "songs"}`;
  if (view.q.trim() !== "") return `${songs} found`;
  if (view.tag !== null) return `${songs} with the tag ${view.tag}`;
  return view.archived ? `${songs} put aside` : songs;
}
