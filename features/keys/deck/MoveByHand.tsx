import { useState } from "react";
import { useWindowDimensions, View } from "react-native";
import { SpanLadder } from "@/features/span/SpanLadder";
import { ladderScale } from "@/features/span/ladderGeometry";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { KeySign } from "@/features/ui/KeySign";
import { Text } from "@/features/ui/Text";
import { fonts, sizes } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webProps } from "@/features/ui/webStyle";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { spellingIn, type KeyRow } from "../keyRows";
import { KeyPartBars } from "./KeyPartBars";

export interface MoveByHandProps {
  rows: readonly KeyRow[];
  /** on whole semitones */
  voice: SingingVoice;
  selected: KeyRow;
  onSelect: (row: KeyRow) => void;
}

/** A window may be of any width while it opens or is turned; a ladder needs room for its column, a mark and the handle. */
const leastWidth = 166;

/** The ladder with a handle: drags the tune by semitones through the voice, and every step has its score at once. */
export function MoveByHand({ rows, voice, selected, onSelect }: MoveByHandProps) {
  const [moved, setMoved] = useState<number | null>(null);
  const phone = useLayout() === "phone";
  const room = useWindowDimensions().width - (phone ? 2 * sizes.gutterPhone : 0);
  const shifts = rows.map(({ shift }) => shift);
  const row = nearestRow(rows, moved ?? selected.shift) ?? selected;
  // One scale for all keys, so that the ladder stands still while the tune moves.
  const scale = ladderScale(
    voice,
    rows.flatMap(({ marks }) => marks),
    0,
  );
  return (
    <View testID="move-by-hand" {...webProps({ dataSet: { screen: "" } })} style={{ marginTop: 28, gap: 12 }}>
      <View style={{ gap: 2 }}>
        <Heading level={2}>Move it by hand</Heading>
        <Text variant="small" tone="soft">
          Drag the handle, or use the arrow keys on it. The tune moves by semitones, and the score goes with it.
        </Text>
      </View>
      <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 32, rowGap: 16 }}>
        <SpanLadder
          voice={voice}
          marks={row.marks}
          step={12}
          width={Math.min(420, Math.max(leastWidth, room))}
          scale={scale}
          spelling={spellingIn(row.key)}
          shift={{
            value: row.shift,
            min: Math.min(...shifts),
            max: Math.max(...shifts),
            name: row.sign,
            says: `${row.score} of 100`,
            onChange: (shift) => setMoved(nearestRow(rows, shift)?.shift ?? shift),
          }}
        />
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 240, maxWidth: 360, gap: 10 }}>
          <View style={{ flexDirection: "row", justifyContent: "space-between", alignItems: "flex-end" }}>
            <KeySign of={row.key} size={52} />
            <Text variant="small" tone="soft" testID="moved-score">
              <Text
                tone={row.beyond ? "brick" : "lagoon"}
                style={{ fontFamily: fonts.display, fontWeight: "700", fontSize: 36, lineHeight: 36 }}
              >
                {row.score}
              </Text>
              {" of 100"}
            </Text>
          </View>
          <Text variant="strong" style={{ lineHeight: 21, minHeight: 63 }}>
            {row.reason}
          </Text>
          <View style={{ flexDirection: "row" }}>
            <KeyPartBars parts={row.parts} />
          </View>
          <View style={{ minHeight: 48 }}>
            {row !== selected && (
              <Button
                kind="secondary"
                small
                label={`Look at ${row.sign}`}
                onPress={() => {
                  onSelect(row);
                  setMoved(null);
                }}
                testID="look-at-moved"
              />
            )}
          </View>
        </View>
      </View>
    </View>
  );
}

/** The key whose move lies nearest; of two the lower one. */
export function nearestRow(rows: readonly KeyRow[], shift: number): KeyRow | null {
  return rows.reduce<KeyRow | null>((best, row) => {
    const [near, before] = [Math.abs(row.shift - shift), Math.abs((best?.shift ?? Infinity) - shift)];
    return near < before || (near === before && row.shift < (best?.shift ?? Infinity)) ? row : best;
  }, null);
}
