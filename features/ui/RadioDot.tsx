import { View } from "react-native";
import { colors } from "./theme";

/** The round sign of a choice: a filled dot in its ring where it is on. Its meaning stands in the role of its parent. */
export function RadioDot({ on }: { on: boolean }) {
  return (
    <View
      style={{
        width: 22,
        height: 22,
        borderRadius: 11,
        borderWidth: 1.75,
        borderColor: on ? colors.plum : colors.inkSoft,
        alignItems: "center",
        justifyContent: "center",
        flexShrink: 0,
      }}
    >
      {on && <View style={{ width: 12, height: 12, borderRadius: 6, backgroundColor: colors.plum }} />}
    </View>
  );
}
