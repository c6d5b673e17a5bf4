import { Link } from "expo-router";
import type { ReactNode } from "react";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { webStyle } from "@/features/ui/webStyle";
import { whyPath } from "@/features/ui/whyPath";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";

export interface WayColumnProps {
  songId: string;
  /** the key they lead into; null where the song has none */
  into: KeyName | null;
  shift: number;
  instrument: string;
  error: Error | null;
  children: ReactNode;
}

/** The right column of a wide song page. */
export function WayColumn({ songId, into, shift, instrument, error, children }: WayColumnProps) {
  return (
    <View testID="way-pane">
      <View
        style={{
          flexDirection: "row",
          flexWrap: "wrap",
          justifyContent: "space-between",
          alignItems: "baseline",
          columnGap: 12,
          minHeight: 28,
          marginBottom: 10,
        }}
      >
        <Heading level={2}>{into ? `Ways to play ${glyphs(keySign(into))}` : "Ways to play it"}</Heading>
        <Text variant="small" tone="soft" style={{ fontSize: 13 }}>
          {instrument}
        </Text>
      </View>
      {error && (
        <Notice
          kind="error"
          title="This is not saved"
        >{`${error.message} Your choice is still here; try again.`}</Notice>
      )}
      {children}
      {into && (
        <View style={{ marginTop: 12, gap: 4, alignItems: "flex-start" }}>
          <Link
            href={{
              pathname: "/songs/[id]/ways",
              params: { id: songId, key: into.tonic, shift: String(shift) },
            }}
            style={webStyle(link)}
          >
            All ways, wishes and instruments
          </Link>
          <Link href={whyPath(songId, into, shift)} style={webStyle(link)} testID="column-to-why">
            Why this works, step by step
          </Link>
          <Link
            href={{ pathname: "/songs/[id]/everyone", params: { id: songId, key: into.tonic, shift: String(shift) } }}
            style={webStyle(link)}
          >
            Everyone’s plan
          </Link>
        </View>
      )}
    </View>
  );
}

const link = {
  display: "inline-block",
  padding: "12px 0",
  font: "600 14px/20px Figtree",
  color: "var(--plum)",
  textDecorationLine: "underline",
  textUnderlineOffset: 3,
} as const;
