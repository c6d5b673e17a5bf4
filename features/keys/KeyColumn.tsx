import { Pressable, View } from "react-native";
import { KeySpan } from "@/features/span/KeySpan";
import { keySpanWidth, keySpanX } from "@/features/span/keySpanGeometry";
import type { Scale } from "@/features/span/ladderGeometry";
import { KeySign } from "@/features/ui/KeySign";
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
  /** what is said of the decided key */
  markOf: (row: KeyRow) => string | null;
}

const spanWidth = 174;
const rowHeight = 46;

/** All twelve keys beside a chart: the choice changes chart and ways at once. */
export function KeyColumn({ rows, voice, selected, onSelect, markOf }: KeyColumnProps) {
  const scale = commonScale(rows, voice);
  const step = Math.min(5.6, (spanWidth / keySpanWidth(scale, 5.6)) * 5.6);
  const values = rows.map((row) => String(row.shift));
  const keys = useRadioKeys(values, selected ? String(selected.shift) : null, (value) => {
    const row = rows.find((each) => String(each.shift) === value);
    if (row) onSelect(row);
  });
  const names = bandNames(voice, scale, step);
  return (
    <View>
      <View role="radiogroup" aria-label="Keys, best first" testID="key-column">
        {rows.map((row, index) => {
          const on = row === selected;
          const mark = markOf(row);
          return (
            <Pressable
              key={row.shift}
              role="radio"
              aria-checked={on}
              aria-label={mark === null ? row.spoken : `${row.spoken} This is ${mark}.`}
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
              <View style={{ width: 56 }}>
                <KeySign of={row.key} size={20} stacked tone={row.beyond ? "soft" : "ink"} />
              </View>
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
              <View style={{ flexGrow: 1, alignItems: "flex-end", paddingRight: 10 }}>
                <Text
                  tone={row.beyond ? "brick" : on ? "lagoon" : "ink"}
                  style={{ fontFamily: fonts.display, fontWeight: "600", fontSize: on ? 20 : 16, lineHeight: 22 }}
                >
                  {row.score}
                </Text>
                {mark !== null && (
                  <Text variant="tiny" tone="plum" style={{ fontWeight: "600", lineHeight: 14 }}>
                    {mark.split(" for ")[0]}
                  </Text>
                )}
              </View>
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
              webStyle({ transform: "translateX(-50%)", whiteSpace: "nowrap" }),
            ]}
          >
            {name}
          </Text>
        ))}
      </View>
    </View>
  );
}

/** Names under the edges of the comfort band; one between them where two would touch. */
function bandNames({ comfort }: SingingVoice, scale: Scale, step: number): { name: string; x: number }[] {
  const low = { name: glyphs(noteName(comfort.lowMidi)), x: 66 + keySpanX(comfort.lowMidi, scale, step) - step / 2 };
  const high = { name: glyphs(noteName(comfort.highMidi)), x: 66 + keySpanX(comfort.highMidi, scale, step) + step / 2 };
  if (high.x - low.x >= 36) return [low, high];
  return [{ name: `${low.name} to ${high.name}`, x: (low.x + high.x) / 2 }];
}
