import { View } from "react-native";
import { colors } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { effortWord } from "./rosterWords";

const heights = [7, 9, 11, 13, 16];

/** How a take felt: five bars, filled up to the answer; warmer from 4 on. */
export function EffortBars({ effort }: { effort: number | null }) {
  const said = effort ?? 0;
  const color = said >= 5 ? colors.brick : said === 4 ? colors.honey : colors.lagoon;
  return (
    <View style={{ flexDirection: "row", alignItems: "flex-end", gap: 2, flexShrink: 0 }}>
      {heights.map((height, k) => (
        <View
          key={height}
          aria-hidden
          style={{
            width: 5,
            height,
            borderRadius: 1.5,
            borderWidth: k < said ? 0 : 1,
            borderColor: colors.inkSoft,
            backgroundColor: k < said ? color : "transparent",
          }}
        />
      ))}
      <span style={unseen}>
        {effort === null ? "not said how it felt" : `felt ${effort} of 5, ${effortWord(effort)}`}
      </span>
    </View>
  );
}
