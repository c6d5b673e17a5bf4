import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { Chip } from "@/features/ui/Chip";
import { LiveText } from "@/features/ui/LiveText";
import { Text } from "@/features/ui/Text";
import { plural } from "@/shared/music/countWords";
import { studioQueries } from "../studioQueries";
import type { PupilPart } from "./pupilParts";

export interface WhoControlsProps {
  studioId: string;
  parts: readonly PupilPart[];
  onChoose: (memberIds: ReadonlySet<string>) => void;
}

/** Chooses everybody, nobody or a group at once; single pupils are ticked in the table. */
export function WhoControls({ studioId, parts, onChoose }: WhoControlsProps) {
  const groups = useQuery(studioQueries.groups(studioId)).data ?? [];
  const chosen = parts.filter(({ draft }) => draft.chosen).map(({ row }) => row.memberId);
  const all = parts.map(({ row }) => row.memberId);
  const is = (ids: readonly string[]) => ids.length === chosen.length && ids.every((id) => chosen.includes(id));
  const here = (ids: readonly string[]) => ids.filter((id) => all.includes(id));
  return (
    <View style={{ gap: 2 }}>
      <Text variant="label" style={{ fontWeight: "600" }}>
        To whom
      </Text>
      <View role="group" aria-label="To whom" style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8 }}>
        <Chip label="Everybody" selected={is(all)} onPress={() => onChoose(new Set(all))} testID="who-all" />
        {groups.map(({ id, name, memberIds }) => (
          <Chip
            key={id}
            label={name}
            selected={memberIds.length > 0 && is(here(memberIds))}
            onPress={() => onChoose(new Set(here(memberIds)))}
            testID={`who-${id}`}
          />
        ))}
        <Chip label="Nobody" selected={chosen.length === 0} onPress={() => onChoose(new Set())} testID="who-none" />
      </View>
      <LiveText variant="small" tone="soft" testID="chosen-count">
        {`${plural(chosen.length, "pupil")} chosen`}
      </LiveText>
    </View>
  );
}
