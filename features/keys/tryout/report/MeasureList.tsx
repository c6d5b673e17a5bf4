import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import type { Measures } from "@/shared/keys/takeMeasures";
import { measureWords, UNKNOWN } from "./measureWords";

/** What was measured, in words and numbers. */
export function MeasureList({ measures, spelling }: { measures: Measures; spelling: "sharps" | "flats" }) {
  return (
    <View role="list" style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 20, rowGap: 2 }}>
      {measureWords(measures, spelling)
        .filter(({ text }) => text !== UNKNOWN)
        .map(({ name, text, tone }) => (
          <View key={name} role="listitem">
            <Text variant="small">
              <Text tone="soft">{`${name}: `}</Text>
              <Text tone={tone} style={{ fontWeight: "600" }}>
                {text}
              </Text>
            </Text>
          </View>
        ))}
    </View>
  );
}
