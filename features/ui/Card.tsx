import type { ReactNode } from "react";
import { View, type StyleProp, type ViewStyle } from "react-native";
import { colors, sizes } from "./theme";
import { webStyle } from "./webStyle";

export interface CardProps {
  /** the chosen one of several: a plum line of 2 */
  selected?: boolean;
  /** an error: dashed brick line */
  error?: boolean;
  children: ReactNode;
  testID?: string;
  style?: StyleProp<ViewStyle>;
}

/** A raised surface: hairline, radius 14, no shadow. Pieces drawn inside take the card as their ground. */
export function Card({ selected = false, error = false, children, testID, style }: CardProps) {
  return (
    <View
      testID={testID}
      style={[
        {
          backgroundColor: colors.card,
          borderRadius: sizes.radius,
          borderWidth: selected ? 2 : 1,
          borderStyle: error ? "dashed" : "solid",
          borderColor: error ? colors.brick : selected ? colors.plum : colors.line,
          padding: selected ? 15 : 16,
        },
        webStyle({ ["--ground" as string]: "var(--card)" }),
        style,
      ]}
    >
      {children}
    </View>
  );
}
