import { memo, startTransition, useEffect, useState, type CSSProperties } from "react";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { glyphs } from "@/shared/music/pitch";
import type { Chart, ChartLine } from "@/shared/songs/chart";
import type { ChartToken } from "@/shared/songs/chordLine";
import { expandTabs } from "@/shared/songs/reflow";
import { chartCells } from "./chartCells";
import { firstLines, sameLine, sameLines, type ShownPlace, type ShownSection } from "./shownLines";

export interface ChartViewProps {
  chart: Chart;
  /** px; 15 on the phone, 17 in the wide column */
  size?: number;
  /** level of the section headings */
  level?: 2 | 3;
  /** so many lines and no more; else all, the later ones a moment after the first */
  most?: number;
  /** the line that is being worked on */
  marked?: ShownPlace | null;
}

/** Lines drawn in one go: a page or two of them, so that a very long chart never holds up the page. */
const atOnce = 150;

/** A chart to read: every chord over its syllable, at any width. */
export function ChartView({ chart, size = 15, level = 2, most = Infinity, marked = null }: ChartViewProps) {
  const [grown, setGrown] = useState(atOnce);
  const limit = Math.min(most, grown);
  const { sections, rest } = firstLines(chart, limit);
  const grows = rest > 0 && limit < most;
  useEffect(() => {
    if (grows) startTransition(() => setGrown(grown + atOnce));
  }, [grows, grown]);
  return (
    <View testID="chart" style={{ gap: 18 }}>
      {sections.map((section, index) => (
        <Section
          key={index}
          section={section}
          size={size}
          level={level}
          marked={marked?.section === index ? marked.line : null}
        />
      ))}
    </View>
  );
}

interface SectionProps {
  section: ShownSection;
  size: number;
  level: 2 | 3;
  marked: number | null;
}

const Section = memo(
  function Section({ section: { label, lines }, size, level, marked }: SectionProps) {
    return (
      <View>
        {label !== null && (
          <View style={{ flexDirection: "row", alignItems: "center", gap: 10, marginBottom: 8 }}>
            <Heading level={level} size={14} style={{ color: colors.inkSoft, fontWeight: "600", letterSpacing: 0 }}>
              {label.replace(timesBehind, "×$1")}
            </Heading>
            <View style={{ flexGrow: 1, height: 1, backgroundColor: colors.line }} />
          </View>
        )}
        {lines.map((line, index) => (
          <Line key={index} line={line} size={size} marked={index === marked} />
        ))}
      </View>
    );
  },
  (before, now) =>
    before.size === now.size &&
    before.level === now.level &&
    before.marked === now.marked &&
    before.section.label === now.section.label &&
    sameLines(before.section.lines, now.section.lines),
);

/** How often a part comes, behind its name. */
const timesBehind = /\(?\b[x×]\s?(\d{1,2})\)?$/i;

interface LineProps {
  line: ChartLine;
  size: number;
  marked: boolean;
}

const Line = memo(
  function Line({ marked, ...drawn }: LineProps) {
    return marked ? (
      <div data-marked="" style={markStyle}>
        <DrawnLine {...drawn} />
      </div>
    ) : (
      <DrawnLine {...drawn} />
    );
  },
  (before, now) => before.size === now.size && before.marked === now.marked && sameLine(before.line, now.line),
);

/** A bar beside the line that stands outside of it, so that nothing moves. */
const markStyle: CSSProperties = { boxShadow: `-7px 0 0 0 ${colors.paper}, -10px 0 0 0 ${colors.plum}` };

function DrawnLine({ line, size }: Omit<LineProps, "marked">) {
  if (line.kind === "blank") return <div style={{ height: size * 0.8 }} />;
  if (line.kind === "comment")
    return (
      <Text variant="small" tone="soft" style={{ fontStyle: "italic", marginBottom: 4 }}>
        {line.text.trim()}
      </Text>
    );
  if (line.kind === "lyrics") return <Row lyrics={expandTabs(line.lyrics)} chords={[]} size={size} />;
  const lyrics = line.kind === "sung" ? expandTabs(line.lyrics) : "";
  return <Row lyrics={lyrics} chords={withoutTabs(line)} size={size} />;
}

/** The chords at the columns they stand in once tabs are counted out, as the words' tabs are. */
function withoutTabs({ written, chords }: Extract<ChartLine, { written: string }>): readonly ChartToken[] {
  if (!written.includes("\t")) return chords;
  return chords.map((chord) => ({ ...chord, column: expandTabs(written.slice(0, chord.column)).length }));
}

const wholes: CSSProperties = { display: "flex", flexWrap: "wrap", alignItems: "flex-end", marginBottom: 3 };
const cellStyle: CSSProperties = { maxWidth: "100%" };

/**
 * One line: cells side by side that wrap as wholes. The chord stands before its words in the document, as it is read.
 * Plain elements: a long chart has tens of thousands of them.
 */
function Row({ lyrics, chords, size }: { lyrics: string; chords: readonly ChartToken[]; size: number }) {
  const sung = lyrics.trim() !== "";
  const over: CSSProperties = { position: "relative", height: size * 1.35 };
  const words: CSSProperties = { display: "block", whiteSpace: "pre", lineHeight: sung ? `${size * 1.3}px` : "4px" };
  const cut = lyrics.length > longest ? lyrics.lastIndexOf(" ", longest) + 1 || longest : lyrics.length;
  return (
    <div data-mono="" style={{ ...wholes, font: `400 ${size}px/${size * 1.2}px ${fonts.mono}`, color: colors.ink }}>
      {chartCells(lyrics.slice(0, cut), chords).map((cell, index) => (
        <div key={index} style={cellStyle}>
          {cell.chords.length > 0 && (
            <div style={over}>
              {cell.chords.map((chord) => (
                <Sign key={chord.column} chord={chord} />
              ))}
            </div>
          )}
          <span aria-hidden={sung ? undefined : true} style={words}>
            {sung ? setSigns(cell.text) : " ".repeat(cell.width)}
          </span>
        </div>
      ))}
      {cut < lyrics.length && (
        <span style={{ ...words, whiteSpace: "pre-wrap", overflowWrap: "anywhere" }}>{lyrics.slice(cut)}</span>
      )}
    </div>
  );
}

/** Behind so many letters no chord stands over a line: what is left of it is drawn in one piece. */
const longest = 2100;

const tones: Partial<Record<ChartToken["kind"], CSSProperties>> = {
  chord: { color: colors.plum },
  "no-chord": { color: colors.plum },
  unread: {
    color: colors.honeyText,
    textDecoration: "underline dotted",
    textDecorationThickness: 2,
    textUnderlineOffset: 3,
  },
};
/** Nor does it go with what is copied from the chart. */
const spokenOnly: CSSProperties = { ...unseen, userSelect: "none" };

function Sign({ chord: { column, text, kind } }: { chord: ChartToken }) {
  const place: CSSProperties = {
    position: "absolute",
    bottom: 0,
    left: `${column}ch`,
    whiteSpace: "pre",
    fontWeight: 600,
    color: colors.inkSoft,
  };
  const unread = kind === "unread";
  return (
    <span style={{ ...place, ...tones[kind] }} title={unread ? "Not read as a chord: it stays as it is" : undefined}>
      {setSigns(glyphs(text))}
      {unread && <span style={spokenOnly}>, not read</span>}
    </span>
  );
}
