import type { TextStyle } from "react-native";
import { View } from "react-native";
import { keySignParts, keyWords } from "@/shared/music/keyWords";
import type { KeyName } from "@/shared/music/keyName";
import { glyphs } from "@/shared/music/pitch";
import { Text, type TextTone } from "./Text";
import { fonts } from "./theme";
import { unseen } from "./unseen";
import { webStyle } from "./webStyle";

export interface KeySignProps {
  of: KeyName;
  /** of the tonic, px */
  size: number;
  tone?: TextTone;
  /** the mode under the tonic, for narrow columns */
  stacked?: boolean;
}

/** A key at a glance: the tonic large, a mode other than major and minor small beside or under it, and spoken in full. */
export function KeySign({ of: key, size, tone = "ink", stacked = false }: KeySignProps) {
  const { large, mode } = keySignParts(key);
  const tonic: TextStyle = {
    fontFamily: fonts.display,
    fontWeight: "700",
    fontSize: size,
    lineHeight: Math.round(size * (size > 40 ? 0.9 : 1.16)),
    ...(size > 40 ? { letterSpacing: -1 } : null),
  };
  if (mode === "")
    return (
      <Text tone={tone} style={tonic}>
        {glyphs(large)}
      </Text>
    );
  const small = stacked ? Math.max(10, Math.min(13, Math.round(size * 0.5))) : Math.max(12, Math.round(size * 0.42));
  return (
    <View
      style={{
        flexDirection: stacked ? "column" : "row",
        alignItems: stacked ? "flex-start" : "baseline",
        columnGap: 4,
      }}
    >
      <Text style={webStyle(unseen)}>{glyphs(keyWords(key))}</Text>
      <Text tone={tone} aria-hidden style={tonic}>
        {glyphs(large)}
      </Text>
      <Text
        tone="soft"
        aria-hidden
        style={{ fontFamily: fonts.display, fontWeight: "600", fontSize: small, lineHeight: small + 2 }}
      >
        {mode}
      </Text>
    </View>
  );
}
