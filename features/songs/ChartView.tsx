import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webProps, webStyle } from "@/features/ui/webStyle";
import { glyphs } from "@/shared/music/pitch";
import type { Chart, ChartLine, ChartSection } from "@/shared/songs/chart";
import type { ChartToken } from "@/shared/songs/chordLine";
import { chartCells } from "./chartCells";

export interface ChartViewProps {
  chart: Chart;
  /** px; 15 on the phone, 17 in the wide column */
  size?: number;
  /** level of the section headings */
  level?: 2 | 3;
}

/** A chart to read: every chord over its syllable, at any width. */
export function ChartView({ chart, size = 15, level = 2 }: ChartViewProps) {
  return (
    <View testID="chart" style={{ gap: 18 }}>
      {chart.sections.map((section, index) => (
        <Section key={index} section={section} size={size} level={level} />
      ))}
    </View>
  );
}

function Section({ section, size, level }: { section: ChartSection; size: number; level: 2 | 3 }) {
  const lines = section.lines.slice(firstUsed(section.lines), lastUsed(section.lines) + 1);
  if (section.label === null && lines.length === 0) return null;
  return (
    <View>
      {section.label !== null && (
        <View style={{ flexDirection: "row", alignItems: "center", gap: 10, marginBottom: 8 }}>
          <Heading level={level} size={14} style={{ color: colors.inkSoft, fontWeight: "600", letterSpacing: 0 }}>
            {section.label}
          </Heading>
          <View style={{ flexGrow: 1, height: 1, backgroundColor: colors.line }} />
        </View>
      )}
      {lines.map((line, index) => (
        <Line key={index} line={line} size={size} />
      ))}
    </View>
  );
}

function Line({ line, size }: { line: ChartLine; size: number }) {
  if (line.kind === "blank") return <View style={{ height: size * 0.8 }} />;
  if (line.kind === "comment")
    return (
      <Text variant="small" tone="soft" style={{ fontStyle: "italic", marginBottom: 4 }}>
        {line.text.trim()}
      </Text>
    );
  if (line.kind === "lyrics") return <Row lyrics={line.lyrics} chords={[]} size={size} />;
  return <Row lyrics={line.kind === "sung" ? line.lyrics : ""} chords={line.chords} size={size} />;
}

/** One line: cells side by side that wrap as wholes. The chord stands before its words in the document, as it is read. */
function Row({ lyrics, chords, size }: { lyrics: string; chords: readonly ChartToken[]; size: number }) {
  const sung = lyrics.trim() !== "";
  return (
    <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "flex-end", marginBottom: 3 }}>
      {chartCells(lyrics, chords).map((cell, index) => (
        <View key={index} style={webStyle({ maxWidth: "100%" })}>
          {cell.chords.length > 0 && (
            <View style={[{ height: size * 1.35 }, webStyle({ fontSize: size, position: "relative" })]}>
              {cell.chords.map((chord) => (
                <Text
                  key={chord.column}
                  variant="monoBold"
                  tone={chord.kind === "chord" || chord.kind === "no-chord" ? "plum" : "soft"}
                  style={[
                    { position: "absolute", bottom: 0, fontSize: size, lineHeight: size * 1.2 },
                    webStyle({ left: `${chord.column}ch`, whiteSpace: "pre" }),
                  ]}
                >
                  {glyphs(chord.text)}
                </Text>
              ))}
            </View>
          )}
          <Text
            variant="mono"
            {...webProps({ "aria-hidden": sung ? undefined : true })}
            style={[{ fontSize: size, lineHeight: sung ? size * 1.3 : 4 }, webStyle({ whiteSpace: "pre" })]}
          >
            {sung ? cell.text : " ".repeat(cell.width)}
          </Text>
        </View>
      ))}
    </View>
  );
}

function firstUsed(lines: readonly ChartLine[]): number {
  const index = lines.findIndex((line) => line.kind !== "blank");
  return index < 0 ? lines.length : index;
}

function lastUsed(lines: readonly ChartLine[]): number {
  return lines.reduce((last, line, index) => (line.kind === "blank" ? last : index), -1);
}
