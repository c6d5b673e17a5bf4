import { useState } from "react";
import { Pressable, View } from "react-native";
import { VoiceStrip, VoiceStripHeader } from "@/features/span/VoiceStrip";
import { Button } from "@/features/ui/Button";
import { Icon } from "@/features/ui/Icon";
import { KeySign } from "@/features/ui/KeySign";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { webProps, webStyle } from "@/features/ui/webStyle";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { commonScale, spellingIn, type KeyRow } from "../keyRows";

export interface KeyListProps {
  /** best first */
  rows: readonly KeyRow[];
  /** on whole semitones */
  voice: SingingVoice;
  selected: KeyRow;
  onSelect: (row: KeyRow) => void;
  /** what is said of the decided key */
  markOf: (row: KeyRow) => string | null;
  pinned: (row: KeyRow) => boolean;
}

const nextShown = 4;

/** The other keys in short rows: the next four, or all twelve. A press brings a key's card to the front. */
export function KeyList({ rows, voice, selected, onSelect, markOf, pinned }: KeyListProps) {
  const [all, setAll] = useState(false);
  const shown = all ? rows : rows.filter((row) => row !== selected).slice(0, nextShown);
  const scale = commonScale(
    shown.filter((row) => !row.beyond),
    voice,
  );
  return (
    <View style={{ marginTop: 12 }}>
      <View
        aria-hidden
        style={{
          flexDirection: "row",
          gap: 10,
          alignItems: "flex-end",
          paddingBottom: 4,
          borderBottomWidth: 1,
          borderColor: colors.line,
        }}
      >
        <Text variant="tiny" tone="soft" style={{ width: 44 }}>
          {all ? "All" : "Next"}
        </Text>
        <VoiceStripHeader voice={voice} scale={scale} width={112} />
        <Text variant="tiny" tone="soft" style={{ flexGrow: 1, textAlign: "right" }}>
          reason, of 100
        </Text>
      </View>
      <View role="list" testID="key-list">
        {shown.map((row) => (
          <View role="listitem" key={row.shift} style={{ borderBottomWidth: 1, borderColor: colors.line }}>
            <Pressable
              role="button"
              onPress={() => onSelect(row)}
              testID={`key-${row.key.tonic}`}
              {...webProps({ "aria-pressed": row === selected })}
              style={{
                minHeight: 48,
                flexDirection: "row",
                gap: 10,
                alignItems: "center",
                paddingVertical: 4,
                backgroundColor: row === selected ? colors.card : "transparent",
              }}
            >
              <View style={{ width: 44, flexDirection: "row", alignItems: "center" }}>
                <KeySign of={row.key} size={20} stacked />
                {pinned(row) && (
                  <>
                    <Icon name="bookmarkFilled" size={14} color={colors.plum} />
                    <Text style={webStyle(unseen)}>pinned</Text>
                  </>
                )}
              </View>
              <View aria-hidden>
                <VoiceStrip voice={voice} marks={row.marks} scale={scale} width={112} spelling={spellingIn(row.key)} />
              </View>
              <Text variant="tiny" tone="soft" style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0 }}>
                {markOf(row) !== null && (
                  <Text tone="plum" style={{ fontWeight: "600" }}>{`${sentence(markOf(row) ?? "")} `}</Text>
                )}
                {row.reason}
              </Text>
              <Text variant="monoBold" tone={row.beyond ? "brick" : "ink"} style={{ width: 24, textAlign: "right" }}>
                {row.score}
              </Text>
            </Pressable>
          </View>
        ))}
      </View>
      <Button
        kind="text"
        icon={all ? "up" : "forward"}
        label={all ? "Fewer keys" : "All 12 keys"}
        expanded={all}
        onPress={() => setAll(!all)}
        testID="all-keys"
        flush
      />
    </View>
  );
}

function sentence(words: string): string {
  return `${words.charAt(0).toUpperCase()}${words.slice(1)}.`;
}
