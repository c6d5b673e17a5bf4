import { Link } from "expo-router";
import { useWindowDimensions, View, type TextStyle } from "react-native";
import { VoiceStrip } from "@/features/span/VoiceStrip";
import { Card } from "@/features/ui/Card";
import { Icon } from "@/features/ui/Icon";
import { KeySign } from "@/features/ui/KeySign";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { moveWords } from "@/shared/music/moveWords";
import { glyphs, noteName } from "@/shared/music/pitch";
import { commonScale, spellingIn } from "../keyRows";
import type { KeyInHand } from "../songKeys";

export interface MyKeyCardProps {
  songId: string;
  inHand: KeyInHand;
  /** on whole semitones; null while no voice is known */
  voice: SingingVoice | null;
}

const before = {
  decided: "My key",
  best: "Best for your voice",
  nearest: "No key holds the whole tune; this one comes nearest",
  written: "As written",
} as const;

/** The key in hand with its span, as a way to all twelve. */
export function MyKeyCard({ songId, inHand, voice }: MyKeyCardProps) {
  const { key, shift, row, because } = inHand;
  const stripWidth = Math.min(176, Math.max(96, useWindowDimensions().width - 222));
  const name = (midi: number) => glyphs(noteName(midi, spellingIn(key)));
  return (
    <Link
      href={{ pathname: "/songs/[id]/keys", params: { id: songId } }}
      testID="my-key"
      style={webStyle({ display: "flex" })}
    >
      <Card
        style={{
          flexGrow: 1,
          flexShrink: 1,
          minWidth: 0,
          flexDirection: "row",
          alignItems: "center",
          gap: 14,
          paddingVertical: 12,
          paddingHorizontal: 14,
        }}
      >
        <KeySign of={key} size={36} stacked />
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0, gap: 4 }}>
          <Text variant="small">
            <Text style={{ fontWeight: "600" }}>{before[because]}</Text>
            {because === "written" ? ". See which key suits your voice." : `, ${moveWords(shift)}`}
          </Text>
          {row && voice && (
            <View style={{ flexDirection: "row", alignItems: "center", gap: 6 }}>
              <Text tone="soft" style={end}>
                {name(row.lowMidi)}
              </Text>
              <VoiceStrip
                voice={voice}
                marks={row.marks}
                scale={commonScale([row], voice)}
                width={stripWidth}
                spelling={spellingIn(key)}
              />
              <Text tone="soft" style={end}>
                {name(row.highMidi)}
              </Text>
            </View>
          )}
        </View>
        <Icon name="forward" color={colors.plum} />
      </Card>
    </Link>
  );
}

const end: TextStyle = { fontFamily: fonts.display, fontWeight: "600", fontSize: 13, lineHeight: 16 };
