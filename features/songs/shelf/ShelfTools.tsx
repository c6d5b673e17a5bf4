import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { songPages } from "@/features/api/songPages";
import type { SongListing } from "@/shared/contract/songListing";
import { ExportChoices } from "../exchange/ExportChoices";
import { Dialog } from "@/features/ui/Dialog";
import type { ShelfView } from "./shelfView";

export interface ShelfToolsProps {
  view: ShelfView;
  songs: readonly SongListing[];
  total: number;
  chosen: ReadonlySet<string> | null;
  onChosen: (chosen: ReadonlySet<string> | null) => void;
}

/** Choosing songs, and exporting the chosen ones or all that were found. */
export function ShelfTools({ view, songs, total, chosen, onChosen }: ShelfToolsProps) {
  const [exporting, setExporting] = useState(false);
  if (total === 0) return null;
  const some = chosen !== null && chosen.size > 0;
  const count = some ? chosen.size : total;
  const what = `${count} ${count === 1 ? "song" : "songs"}`;
  return (
    <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 4, marginHorizontal: -8 }}>
      <Button
        kind="text"
        small
        label={chosen === null ? "Choose songs" : "Done choosing"}
        onPress={() => onChosen(chosen === null ? new Set() : null)}
        testID="choose-songs"
      />
      <Button
        kind="text"
        small
        label={chosen === null ? "Export all of these" : `Export ${chosen.size} chosen`}
        disabled={chosen !== null && chosen.size === 0}
        onPress={() => setExporting(true)}
        testID="export-songs"
      />
      {exporting && (
        <Dialog title={`Export ${what}`} onClose={() => setExporting(false)} testID="export-dialog">
          <ExportChoices count={count} ids={() => (some ? [...chosen] : everyId(view, songs, total))} />
        </Dialog>
      )}
    </View>
  );
}

/** The ids of all songs that a view finds, also of those that are not on the page yet. */
async function everyId(
  { q, tag, archived }: ShelfView,
  here: readonly SongListing[],
  total: number,
): Promise<string[]> {
  if (here.length >= total) return here.map(({ id }) => id);
  const ids: string[] = [];
  let cursor: string | null = null;
  do {
    const page: Awaited<ReturnType<typeof songPages.get>> = await songPages.get({
      q,
      tag,
      archived,
      limit: 200,
      cursor,
    });
    ids.push(...page.items.map(({ id }) => id));
    cursor = page.next;
  } while (cursor !== null);
  return ids;
}
