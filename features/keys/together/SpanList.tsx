import { useState } from "react";
import { View } from "react-native";
import { stripX, VoiceStrip } from "@/features/span/VoiceStrip";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import { spellingIn } from "../keyRows";
import type { GroupKey } from "./groupKey";
import { octaveNote } from "./groupWords";
import { groupScale } from "./groupScale";
import { SpanScale } from "@/features/span/SpanScale";

const tones = { comfort: "soft", reach: "honey", beyond: "brick" } as const;

/** Phone: each singer with the tune under its own band, all on one scale, and how it lies in words. */
export function SpanList({ picked }: { picked: GroupKey }) {
  const [width, setWidth] = useState(0);
  const scale = groupScale(picked);
  return (
    <View onLayout={({ nativeEvent }) => setWidth(Math.floor(nativeEvent.layout.width))}>
      {width > 0 && <SpanScale scale={scale} width={width} x={(midi) => stripX(midi, scale, width)} />}
      <View role="list" testID="span-list">
        {picked.parts.map((part) => (
          <View
            key={part.id}
            role="listitem"
            testID="span-row"
            style={{ borderTopWidth: 1, borderColor: colors.line, paddingVertical: 8, gap: 4 }}
          >
            <View style={{ flexDirection: "row", alignItems: "baseline", gap: 8 }}>
              <Text variant="strong" style={{ flexShrink: 1 }}>
                {part.name}
              </Text>
              {part.octaves !== 0 && (
                <Text variant="small" tone="soft">
                  {octaveNote(part.octaves)}
                </Text>
              )}
              <Text
                tone={part.fit === "beyond" ? "brick" : "ink"}
                style={{
                  marginLeft: "auto",
                  fontFamily: fonts.display,
                  fontWeight: "600",
                  fontSize: 20,
                  lineHeight: 22,
                }}
              >
                {String(Math.round(part.score))}
              </Text>
            </View>
            {width > 0 && (
              <VoiceStrip
                voice={part.voice}
                marks={part.marks}
                scale={scale}
                width={width}
                spelling={spellingIn(picked.key)}
              />
            )}
            <Text variant="small" tone={tones[part.fit]}>
              {part.words}
            </Text>
          </View>
        ))}
      </View>
    </View>
  );
}
