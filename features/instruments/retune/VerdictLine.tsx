import { View } from "react-native";
import { Icon } from "@/features/ui/Icon";
import { Text, type TextTone } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { RetuneVerdict, TensionChange } from "@/shared/instruments/tension";
import { verdictWords } from "./retuneWords";

const looks = {
  fine: { icon: "check", tone: "lagoon", color: colors.lagoon },
  slack: { icon: "down", tone: "honey", color: colors.honeyText },
  tight: { icon: "up", tone: "honey", color: colors.honeyText },
  unsafe: { icon: "warning", tone: "brick", color: colors.brick },
} as const satisfies Record<RetuneVerdict, { icon: string; tone: TextTone; color: string }>;

/** Sign and words of a verdict. */
export function VerdictLine({ change }: { change: TensionChange }) {
  const { icon, tone, color } = looks[change.verdict];
  return (
    <View style={{ flexDirection: "row", gap: 6, alignItems: "center" }}>
      <Icon name={icon} size={18} color={color} />
      <Text variant="small" tone={tone} style={{ flexShrink: 1 }}>
        {verdictWords(change)}
      </Text>
    </View>
  );
}
