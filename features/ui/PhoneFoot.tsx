import type { ReactNode } from "react";
import { View, type ViewStyle } from "react-native";
import { useShell } from "./ShellContext";
import { colors, sizes } from "./theme";
import { webStyle } from "./webStyle";

/** Stays at the foot of the phone while the page passes under it: over the bar, in reach of the thumb. */
export function PhoneFoot({ style, children }: { style?: ViewStyle; children: ReactNode }) {
  const { barHidden } = useShell();
  return (
    <View
      style={[
        { gap: 10, paddingTop: 8, paddingBottom: 14, backgroundColor: colors.paper, zIndex: 1 },
        webStyle({
          position: "sticky",
          bottom: barHidden ? 0 : `calc(${sizes.bar}px + env(safe-area-inset-bottom))`,
        }),
        style,
      ]}
    >
      {children}
    </View>
  );
}
