import { View } from "react-native";
import { Chip } from "@/features/ui/Chip";
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

/** Search, order, group, and which pupils are shown. */
export function RosterControls({ view, onView, groups }: RosterControlsProps) {
  const phone = useLayout() === "phone";
  const half = { flexGrow: 1, flexShrink: 1, flexBasis: phone ? 140 : 180, maxWidth: phone ? 600 : 240 } as const;
  return (
    <div role="search" aria-label="Pupils" style={{ display: "flex", flexDirection: "column", gap: phone ? 4 : 12 }}>
      <View style={{ flexDirection: phone ? "column" : "row", gap: 12, alignItems: phone ? "stretch" : "flex-end" }}>
        <View style={phone ? null : { flexGrow: 1, flexBasis: 260, maxWidth: 420 }}>
          <Field
            label="Search names, instruments and songs"
            value={view.q}
            onChangeText={(q) => onView({ q })}
            inputMode="search"
            autoComplete="off"
            testID="pupil-search"
          />
        </View>
        <View style={{ flexDirection: "row", gap: 12, flexGrow: phone ? 0 : 1 }}>
          <View style={half}>
            <Select
              label="Order"
              options={rosterSorts}
              value={view.sort}
              onChange={(sort) => onView({ sort })}
              testID="pupil-sort"
            />
          </View>
          {groups.length > 0 && (
            <View style={half}>
              <Select
                label="Group"
                options={[
                  { value: "", label: "Everybody" },
                  ...groups.map(({ id, name }) => ({ value: id, label: name })),
                ]}
                value={view.group ?? ""}
                onChange={(group) => onView({ group: group === "" ? null : group })}
                testID="pupil-group"
              />
            </View>
          )}
        </View>
      </View>
      <View role="group" aria-label="Which pupils" style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8 }}>
        {rosterFilters.map(({ value, label }) => (
          <Chip
            key={value}
            label={label}
            selected={view.filter === value}
            onPress={() => onView({ filter: value })}
            testID={`filter-${value}`}
          />
        ))}
      </View>
    </div>
  );
}
