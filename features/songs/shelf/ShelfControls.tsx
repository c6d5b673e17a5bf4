import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Chip } from "@/features/ui/Chip";
import { Field } from "@/features/ui/Field";
import { Segmented } from "@/features/ui/Segmented";
import { Select } from "@/features/ui/Select";
import { useLayout } from "@/features/ui/useLayout";
import type { SongTag } from "@/shared/contract/songListing";
import { shelfSorts, type ShelfView } from "./shelfView";
import { useTyped } from "./useTyped";

export interface ShelfControlsProps {
  view: ShelfView;
  onView: (change: Partial<ShelfView>) => void;
  tags: readonly SongTag[];
}

/** Tags that are shown before one asks for all. */
const tagsShown = { phone: 6, middle: 10, wide: 12 } as const;

/** Search, order, tags, and the way to what was put aside. */
export function ShelfControls({ view, onView, tags }: ShelfControlsProps) {
  const layout = useLayout();
  const phone = layout === "phone";
  const [typed, setTyped] = useTyped(view.q, (q) => onView({ q }));
  const [allTags, setAllTags] = useState(false);
  const most = tagsShown[layout];
  const chosen = tags.find(({ tag }) => tag === view.tag) ?? (view.tag === null ? null : { tag: view.tag, count: 0 });
  const shown = allTags ? tags : tags.slice(0, most);
  const chips = chosen && !shown.some(({ tag }) => tag === chosen.tag) ? [chosen, ...shown] : shown;
  return (
    <div role="search" aria-label="Songs on the shelf" style={{ display: "flex", flexDirection: "column", gap: 12 }}>
      <View style={{ flexDirection: phone ? "column" : "row", gap: 12, alignItems: phone ? "stretch" : "flex-end" }}>
        <View style={phone ? null : { flexGrow: 1, flexShrink: 1, flexBasis: 320, minWidth: 0, maxWidth: 560 }}>
          <Field
            label="Search titles, tags and words"
            value={typed}
            onChangeText={setTyped}
            inputMode="search"
            autoComplete="off"
            testID="song-search"
          />
        </View>
        <View style={{ flexDirection: "row", gap: 12, alignItems: "flex-end", flexWrap: "wrap" }}>
          <View style={{ width: phone ? 168 : 200, flexGrow: phone ? 1 : 0 }}>
            <Select
              label="Order"
              options={shelfSorts}
              value={view.sort}
              onChange={(sort) => onView({ sort })}
              testID="song-sort"
            />
          </View>
          <Segmented
            label="Which songs"
            value={view.archived ? "archived" : "shelf"}
            options={[
              { value: "shelf", label: "Shelf" },
              { value: "archived", label: "Put aside" },
            ]}
            onChange={(which) => onView({ archived: which === "archived", tag: null })}
            testID="song-archive"
          />
        </View>
      </View>
      {chips.length > 0 && !view.archived && (
        <View role="group" aria-label="Tags" style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8 }}>
          {chips.map(({ tag, count }) => (
            <Chip
              key={tag}
              label={count > 0 ? `${tag} ${count}` : tag}
              selected={view.tag === tag}
              onPress={() => onView({ tag: view.tag === tag ? null : tag })}
              testID={`tag-${tag}`}
            />
          ))}
          {tags.length > most && (
            <Button
              kind="text"
              small
              label={allTags ? "Fewer tags" : `All ${tags.length} tags`}
              expanded={allTags}
              onPress={() => setAllTags(!allTags)}
            />
          )}
        </View>
      )}
    </div>
  );
}
