import { View } from "react-native";
import { KeySign } from "@/features/ui/KeySign";
import { LiveText } from "@/features/ui/LiveText";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { moveWords } from "@/shared/music/moveWords";
import type { GroupKey } from "./groupKey";
import { octaveWords, placeWords } from "./groupWords";

export interface FairestKeyProps {
  picked: GroupKey;
  fairest: GroupKey;
}

/** The key that is looked at: how fair it is, why, and who sings it in another octave. */
export function FairestKey({ picked, fairest }: FairestKeyProps) {
  const octaves = octaveWords(picked.parts);
  return (
    <View style={{ flexDirection: "row", gap: 16, alignItems: "flex-start" }} testID="fairest">
      <View style={{ minWidth: 56 }}>
        <KeySign of={picked.key} size={52} tone="plum" stacked />
      </View>
      <View style={{ flexShrink: 1, gap: 6, paddingTop: 2, borderColor: colors.line }}>
        <LiveText variant="body">
          <Text style={{ fontWeight: "600" }}>{placeWords(picked, fairest)}</Text>
          {`. Lowest score ${Math.round(picked.lowest)}, average ${Math.round(picked.mean)}. ${picked.reason}`}
        </LiveText>
        {octaves !== "" && (
          <Text variant="body" testID="octaves">
            {octaves}
          </Text>
        )}
        <Text variant="small" tone="soft">
          {`${moveWords(picked.shift).replace(/^./, (first) => first.toUpperCase())}.`}
        </Text>
      </View>
    </View>
  );
}
