import { View } from "react-native";
import { Field } from "@/features/ui/Field";
import { Select } from "@/features/ui/Select";
import { useLayout } from "@/features/ui/useLayout";
import type { StudioGroup } from "@/shared/contract/studio/group";
import { rosterFilters, rosterSorts, type RosterView } from "./rosterView";

export interface RosterControlsProps {
  view: RosterView;
  onView: (change: Partial<RosterView>) => void;
  groups: readonly Pick<StudioGroup, "id" | "name">[];
}

/** Search, which pupils are shown, their order and group; on wide screens in one line. */
export function RosterControls({ view, onView, groups }: RosterControlsProps) {
  const phone = useLayout() === "phone";
  const part = { flexGrow: 1, flexShrink: 1, flexBasis: phone ? 140 : 150, maxWidth: phone ? 600 : 220 } as const;
  return (
    <div role="search" aria-label="Pupils" style={{ display: "flex", flexWrap: "wrap", gap: 12 }}>
      <View style={{ flexGrow: 2, flexBasis: phone ? 300 : 260, maxWidth: phone ? 600 : 420 }}>
        <Field
          label="Search names, instruments, songs"
          value={view.q}
          onChangeText={(q) => onView({ q })}
          inputMode="search"
          autoComplete="off"
          testID="pupil-search"
        />
      </View>
      <View style={part}>
        <Select
          label="Show"
          options={rosterFilters}
          value={view.filter}
          onChange={(filter) => onView({ filter })}
          testID="pupil-filter"
        />
      </View>
      <View style={part}>
        <Select
          label="Order"
          options={rosterSorts}
          value={view.sort}
          onChange={(sort) => onView({ sort })}
          testID="pupil-sort"
        />
      </View>
      {groups.length > 0 && (
        <View style={part}>
          <Select
            label="Group"
            options={[
              { value: "", label: "All groups" },
              ...groups.map(({ id, name }) => ({ value: id, label: name })),
            ]}
            value={view.group ?? ""}
            onChange={(group) => onView({ group: group === "" ? null : group })}
            testID="pupil-group"
          />
        </View>
      )}
    </div>
  );
}
