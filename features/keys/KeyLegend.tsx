import { View } from "react-native";
import Svg, { Circle, Rect } from "react-native-svg";
import { Hatch, useDrawingId } from "@/features/span/Hatch";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";

/** What the marks in the spans mean. */
export function KeyLegend({ children }: { children?: string }) {
  const id = useDrawingId();
  return (
    <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 28, rowGap: 6, marginTop: 14 }}>
      <Item words="sits well">
        <Rect x={1} width={10} height={16} rx={3} fill={colors.lagoon} />
      </Item>
      <Item words="reach">
        <Hatch id={id} pitch={5} line={2} under={colors.honey} underOpacity={0.16} />
        <Rect x={1} y={1} width={10} height={14} rx={3} fill={`url(#${id})`} stroke={colors.honey} />
      </Item>
      <Item words="beyond, ▲ above, ▼ below">
        <Rect
          x={1}
          y={1}
          width={10}
          height={14}
          rx={3}
          fill="none"
          stroke={colors.brick}
          strokeWidth={1.5}
          strokeDasharray="1.5 2"
        />
      </Item>
      <Item words="home note">
        <Rect x={1} width={10} height={16} rx={3} fill={colors.lagoon} />
        <Circle cx={6} cy={8} r={2.6} fill={colors.paper} />
      </Item>
      <Text variant="small" tone="soft" style={{ fontSize: 13 }}>
        The taller the mark, the longer the tune stays on that note.
      </Text>
      {children !== undefined && (
        <Text variant="small" tone="soft" style={{ fontSize: 13 }}>
          {children}
        </Text>
      )}
    </View>
  );
}

function Item({ words, children }: { words: string; children: React.ReactNode }) {
  return (
    <View style={{ flexDirection: "row", alignItems: "center", gap: 8 }}>
      <Svg width={12} height={16} aria-hidden>
        {children}
      </Svg>
      <Text variant="small" tone="soft" style={{ fontSize: 13 }}>
        {words}
      </Text>
    </View>
  );
}
