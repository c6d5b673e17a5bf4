import { useMemo, useState, type CSSProperties } from "react";
import { View } from "react-native";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { numberGlyphs } from "@/shared/coach/degrees";
import type { NumberedChord } from "@/shared/coach/numberedChords";
import type { Chart } from "@/shared/songs/chart";
import { chartRows } from "@/shared/sheets/chartRows";

export interface NumberedLinesProps {
  chart: Chart;
  chords: readonly NumberedChord[];
}

/** Sung rows that are shown: enough to see the numbers at work. */
const most = 4;
const size = 15;
/** Width of a letter of the mono face, of its size. */
const letter = 0.6;

/** The song's first lines, each chord with its number over it. */
export function NumberedLines({ chart, chords }: NumberedLinesProps) {
  const [width, setWidth] = useState(310);
  const rows = useMemo(() => {
    const numbers = new Map(chords.map(({ written, roman }) => [written, numberGlyphs(roman)]));
    const columns = Math.max(8, Math.floor(width / (size * letter)) - 1);
    const all = chartRows(chart, columns, (chord) => numbers.get(chord) ?? null);
    let sung = 0;
    return all.filter(({ kind, signs }) => {
      if (sung >= most) return false;
      if (signs.length > 0) sung += 1;
      return kind !== "remark";
    });
  }, [chart, chords, width]);
  return (
    <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} testID="numbered-lines">
      {rows.map(({ kind, words, signs }, index) => {
        if (kind === "blank") return <div key={index} style={{ height: 8 }} />;
        if (kind === "heading")
          return (
            <div key={index} style={heading}>
              {words}
            </div>
          );
        return (
          <div key={index} data-mono style={line}>
            {signs.length > 0 && (
              <div style={{ position: "relative", height: 2 * size * 1.35 }}>
                {signs.map(({ column, text, number }) => (
                  <span key={column} style={{ position: "absolute", left: `${column}ch`, top: 0, whiteSpace: "pre" }}>
                    <span style={{ display: "block", font: `600 13px/19px ${fonts.mono}`, color: colors.plum }}>
                      {number === null ? "\u00a0" : setSigns(number)}
                    </span>
                    <span style={{ display: "block", font: `600 ${size}px/20px ${fonts.mono}` }}>
                      {setSigns(text)}
                      <span style={unseen}>, </span>
                    </span>
                  </span>
                ))}
              </div>
            )}
            {words !== "" && <div style={{ whiteSpace: "pre", lineHeight: `${size * 1.3}px` }}>{words}</div>}
          </div>
        );
      })}
    </View>
  );
}

const heading: CSSProperties = { font: `600 13px/20px ${fonts.text}`, color: colors.inkSoft, margin: "2px 0 4px" };
const line: CSSProperties = { font: `400 ${size}px/20px ${fonts.mono}`, color: colors.ink, marginBottom: 6 };
