import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";

/** How far the walk has come: in words, and as a row of bars of which those walked are filled. */
export function StepProgress({ at, count }: { at: number; count: number }) {
  return (
    <View style={{ flexDirection: "row", alignItems: "center", gap: 12 }} testID="step-progress">
      <Text variant="small" tone="soft">{`Step ${at + 1} of ${count}`}</Text>
      <View aria-hidden style={{ flexDirection: "row", gap: 5, flexGrow: 1 }}>
        {Array.from({ length: count }, (_, k) => (
          <View
            key={k}
            style={{
              flexGrow: 1,
              height: 6,
              borderRadius: 3,
              borderWidth: 1,
              borderColor: k <= at ? colors.plum : colors.inkSoft,
              backgroundColor: k <= at ? colors.plum : "transparent",
            }}
          />
        ))}
      </View>
    </View>
  );
}
