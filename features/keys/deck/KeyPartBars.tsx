import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import { partMaxima } from "@/shared/keys/keyParts";
import type { KeyParts } from "@/shared/keys/keyScore";
import { partNames } from "../partWords";

/** The five parts of a score, each as points of its most and as a bar. */
export function KeyPartBars({ parts }: { parts: KeyParts }) {
  return (
    <View
      role="list"
      style={{ flexGrow: 1, flexShrink: 1, flexBasis: 88, minWidth: 0, justifyContent: "space-between", gap: 7 }}
    >
      {partNames.map(({ part, name }) => (
        <View role="listitem" key={part}>
          <Text variant="tiny" tone="soft" style={{ fontWeight: "500", lineHeight: 15 }}>
            {name}
          </Text>
          <View style={{ flexDirection: "row", alignItems: "baseline", gap: 4 }}>
            <Text variant="monoBold" style={{ lineHeight: 19 }}>
              {parts[part]}
            </Text>
            <Text variant="tiny" tone="soft">{`of ${partMaxima[part]}`}</Text>
          </View>
          <View
            aria-hidden
            style={[
              { height: 6, borderRadius: 3, marginTop: 2, overflow: "hidden" },
              webStyle({ boxShadow: "inset 0 0 0 1px color-mix(in srgb, var(--inkSoft) 60%, var(--line))" }),
            ]}
          >
            <View
              style={{
                height: 6,
                borderRadius: 3,
                backgroundColor: colors.lagoon,
                width: `${(100 * parts[part]) / partMaxima[part]}%`,
              }}
            />
          </View>
        </View>
      ))}
    </View>
  );
}
