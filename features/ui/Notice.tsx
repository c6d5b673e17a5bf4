import type { ReactNode } from "react";
import { View } from "react-native";
import { Icon, type IconName } from "./Icon";
import { Text, type TextTone } from "./Text";
import { colors, sizes } from "./theme";
import { webStyle } from "./webStyle";

type NoticeKind = "caution" | "error" | "offline" | "good";

export interface NoticeProps {
  kind: NoticeKind;
  title?: string;
  children: ReactNode;
  /** a button under the words */
  action?: ReactNode;
  testID?: string;
}

const looks: Record<NoticeKind, { icon: IconName; color: string; tone: TextTone; ground: string }> = {
  caution: { icon: "warning", color: colors.honeyText, tone: "honey", ground: "var(--warm)" },
  error: { icon: "warning", color: colors.brick, tone: "brick", ground: "var(--card)" },
  offline: { icon: "offline", color: colors.ink, tone: "ink", ground: "var(--card)" },
  good: { icon: "check", color: colors.lagoon, tone: "lagoon", ground: "var(--tint)" },
};

/** A remark beside the content: sign, words and, where something can be done, a button. */
export function Notice({ kind, title, children, action, testID }: NoticeProps) {
  const look = looks[kind];
  return (
    <View
      role={kind === "error" ? "alert" : "status"}
      testID={testID}
      style={[
        {
          flexDirection: "row",
          gap: 10,
          padding: 12,
          borderRadius: sizes.radius,
          borderWidth: 1,
          borderStyle: kind === "error" ? "dashed" : "solid",
          borderColor: kind === "error" ? colors.brick : colors.line,
          backgroundColor: look.ground,
        },
        webStyle({ ["--ground" as string]: look.ground }),
      ]}
    >
      <Icon name={look.icon} size={20} color={look.color} />
      <View style={{ flexShrink: 1, flexGrow: 1, gap: 4 }}>
        {title !== undefined && (
          <Text variant="strong" tone={look.tone} style={{ lineHeight: 20 }}>
            {title}
          </Text>
        )}
        {typeof children === "string" ? <Text variant="small">{children}</Text> : children}
        {action !== undefined && action !== null && (
          // Begins where the words begin, however wide the notice is.
          <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>{action}</View>
        )}
      </View>
    </View>
  );
}
