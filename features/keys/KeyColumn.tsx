import { Pressable, View } from "react-native";
import { KeySpan } from "@/features/span/KeySpan";
import { keySpanWidth, keySpanX } from "@/features/span/keySpanGeometry";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import { useRadioKeys } from "@/features/ui/useRadioKeys";
import { webProps, webStyle } from "@/features/ui/webStyle";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { glyphs, noteName } from "@/shared/music/pitch";
import { commonScale, spellingIn, type KeyRow } from "./keyRows";

export interface KeyColumnProps {
  rows: readonly KeyRow[];
  /** on whole semitones */
  voice: SingingVoice;
  selected: KeyRow | null;
  onSelect: (row: KeyRow) => void;
}

const spanWidth = 174;
const rowHeight = 46;

/** All twelve keys beside a chart: the choice changes chart and ways at once. */
export function KeyColumn({ rows, voice, selected, onSelect }: KeyColumnProps) {
  const scale = commonScale(rows, voice);
  const step = Math.min(5.6, (spanWidth / keySpanWidth(scale, 5.6)) * 5.6);
  const values = rows.map((row) => String(row.shift));
  const keys = useRadioKeys(values, selected ? String(selected.shift) : null, (value) => {
    const row = rows.find((each) => String(each.shift) === value);
    if (row) onSelect(row);
  });
  const names = [voice.comfort.lowMidi, voice.comfort.highMidi].map((midi, index) => ({
    name: glyphs(noteName(midi)),
    x: 66 + keySpanX(midi, scale, step) + (index === 0 ? -step / 2 : step / 2),
  }));
  return (
    <View>
      <View role="radiogroup" aria-label="Keys, best first" testID="key-column">
        {rows.map((row, index) => {
          const on = row === selected;
          return (
            <Pressable
              key={row.shift}
              role="radio"
              aria-checked={on}
              aria-label={row.spoken}
              onPress={() => onSelect(row)}
              testID={`key-${row.key.tonic}`}
              {...webProps(keys(index))}
              style={[
                {
                  height: rowHeight,
                  flexDirection: "row",
                  alignItems: "center",
                  borderTopWidth: 1,
                  borderColor: colors.line,
                  backgroundColor: on ? colors.card : "transparent",
                  paddingLeft: 10,
                },
                webStyle(on ? { boxShadow: `inset 4px 0 0 ${colors.plum}` } : {}),
              ]}
            >
              <Text
                style={{
                  width: 56,
                  fontFamily: fonts.display,
                  fontWeight: "700",
                  fontSize: 20,
                  lineHeight: 24,
                  color: row.beyond ? colors.inkSoft : colors.ink,
                }}
              >
                {row.sign}
              </Text>
              <View aria-hidden style={{ width: spanWidth }}>
                <KeySpan
                  voice={voice}
                  marks={row.marks}
                  scale={scale}
                  perSemitone={step}
                  height={rowHeight - 1}
                  spelling={spellingIn(row.key)}
                  selected={on}
                />
              </View>
              <Text
                tone={row.beyond ? "brick" : on ? "lagoon" : "ink"}
                style={{
                  flexGrow: 1,
                  textAlign: "right",
                  paddingRight: 10,
                  fontFamily: fonts.display,
                  fontWeight: "600",
                  fontSize: on ? 20 : 16,
                  lineHeight: 24,
                }}
              >
                {row.score}
              </Text>
            </Pressable>
          );
        })}
      </View>
      <View aria-hidden style={{ height: 22, borderTopWidth: 1, borderColor: colors.line }}>
        {names.map(({ name, x }) => (
          <Text
            key={name}
            variant="mono"
            tone="lagoon"
            style={[
              { position: "absolute", left: x, fontSize: 12, lineHeight: 22 },
              webStyle({ transform: "translateX(-50%)" }),
            ]}
          >
            {name}
          </Text>
        ))}
      </View>
    </View>
  );
}
