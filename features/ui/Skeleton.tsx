import { View } from "react-native";
import { LiveText } from "./LiveText";
import { colors } from "./theme";

export interface SkeletonProps {
  /** one bar for each, in px; the real layout's heights */
  bars?: readonly { height?: number; width?: number | `${number}%` }[];
  /** said to screen readers and shown beneath: what is being done */
  words?: string;
}

const usual: NonNullable<SkeletonProps["bars"]> = [
  { height: 40, width: 220 },
  { width: "82%" },
  { width: "58%" },
  { height: 96 },
];

/** Grey bars in the places of what is coming. */
export function Skeleton({ bars = usual, words = "Loading" }: SkeletonProps) {
  return (
    <View aria-busy style={{ gap: 10 }}>
      {bars.map(({ height = 14, width = "100%" }, index) => (
        <View
          key={index}
          aria-hidden
          style={{ height, width, borderRadius: height > 20 ? 10 : 7, backgroundColor: colors.line }}
        />
      ))}
      <LiveText variant="small" tone="soft">
        {words}
      </LiveText>
    </View>
  );
}
