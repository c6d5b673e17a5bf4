import { useState } from "react";
import { View } from "react-native";
import Svg, { Circle, G, Line, Path, Polyline, Rect } from "react-native-svg";
import { Hatch, useDrawingId } from "@/features/span/Hatch";
import { isNatural, semitonesOf } from "@/features/span/ladderGeometry";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import type { Take } from "@/shared/contract/take";
import { bandWords, noteWord } from "../noteWords";
import { TrendTable } from "./TrendTable";
import { trendPlaces, trendPoints, type DayTime, type TrendPoint } from "./trendPoints";

export interface TrendPictureProps {
  /** of one voice */
  takes: readonly Take[];
}

const height = 300;
const names = 36;
const topPad = 12;
const foot = 66;
const gap = 30;

/** Range and comfort of each take over the dates, when in the day, and whether warmed up. The same as a table on demand. */
export function TrendPicture({ takes }: TrendPictureProps) {
  const [width, setWidth] = useState(0);
  const [asTable, setAsTable] = useState(false);
  const all = trendPoints(takes);
  // The oldest wait in the table where the picture is too narrow for all.
  const points = all.slice(-Math.max(2, Math.floor((width - names - 40) / gap)));
  return (
    <View role="region" aria-label="Over time" style={{ gap: 8 }} testID="trend">
      <Heading level={2}>Over time</Heading>
      <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)}>
        {width > 0 && <Drawing points={points} width={width} />}
      </View>
      <Legend />
      <Button
        kind="text"
        icon={asTable ? "minus" : "plus"}
        label="The same as a table"
        expanded={asTable}
        onPress={() => setAsTable(!asTable)}
        flush
        testID="trend-as-table"
      />
      {asTable && <TrendTable points={[...all].reverse()} />}
    </View>
  );
}

function Drawing({ points, width }: { points: readonly TrendPoint[]; width: number }) {
  const id = useDrawingId();
  const low = Math.min(...points.map(({ range }) => range.lowMidi)) - 1;
  const high = Math.max(...points.map(({ range }) => range.highMidi)) + 1;
  const step = (height - topPad - foot) / (high - low);
  const y = (midi: number) => topPad + (high - midi) * step;
  const places = trendPlaces(points, names + 24, width - 24, gap);
  const at = (k: number) => places[k] ?? 0;
  const line = (of: (point: TrendPoint) => number) => points.map((point, k) => `${at(k)},${y(of(point))}`).join(" ");
  const rungs = semitonesOf({ low, high }).filter(isNatural);
  // Neighbours like E and F would run into each other.
  const named = rungs.filter((midi) => step >= 13 || (step >= 6.5 ? [0, 4, 7, 9] : [0, 7]).includes(midi % 12));
  return (
    <Svg width={width} height={height} role="img" aria-label={trendWords(points)}>
      <Hatch id={id} pitch={6} line={2.4} />
      {rungs.map((midi) => (
        <Line
          key={midi}
          x1={names}
          x2={width}
          y1={y(midi)}
          y2={y(midi)}
          stroke={midi % 12 === 0 ? mixtures.rungC : colors.line}
        />
      ))}
      {named.map((midi) => (
        <SvgLabel key={midi} x={names - 8} y={y(midi) + 4} size={12} family="display" weight="600" anchor="end">
          {noteWord(midi)}
        </SvgLabel>
      ))}
      <Polyline points={line(({ comfort }) => comfort.highMidi)} fill="none" stroke={colors.lagoon} strokeWidth={1.5} />
      <Polyline points={line(({ comfort }) => comfort.lowMidi)} fill="none" stroke={colors.lagoon} strokeWidth={1.5} />
      {points.map((point, k) => (
        <TakeColumn key={point.id} point={point} x={at(k)} y={y} half={step / 2} hatch={id} />
      ))}
      {points.map((point, k) => (
        <DayMark key={point.id} point={point} x={at(k)} y={height - foot + 24} />
      ))}
      <Dates points={points} places={places} width={width} />
    </Svg>
  );
}

function TakeColumn({
  point: { range, comfort, held },
  x,
  y,
  half,
  hatch,
}: {
  point: TrendPoint;
  x: number;
  y: (midi: number) => number;
  half: number;
  hatch: string;
}) {
  const top = y(range.highMidi) - half;
  const bottom = y(range.lowMidi) + half;
  return (
    <G>
      <Rect
        x={x - 7}
        y={top}
        width={14}
        height={bottom - top}
        rx={5}
        fill={`url(#${hatch})`}
        stroke={colors.honey}
        strokeWidth={1}
      />
      <Rect
        x={x - 7}
        y={y(comfort.highMidi) - half}
        width={14}
        height={y(comfort.lowMidi) - y(comfort.highMidi) + 2 * half}
        rx={5}
        fill={colors.lagoon}
      />
      {held &&
        [top, bottom].map((edge) => (
          <Line key={edge} x1={x - 12} x2={x + 12} y1={edge} y2={edge} stroke={colors.ink} strokeWidth={2.5} />
        ))}
    </G>
  );
}

/** Shape: time of day. Filled: warmed up; open: not; open and broken: not said. */
function DayMark({
  point: { dayTime, warmedUp },
  x,
  y,
}: {
  point: Pick<TrendPoint, "dayTime" | "warmedUp">;
  x: number;
  y: number;
}) {
  const look = {
    fill: warmedUp ? colors.ink : "none",
    stroke: colors.ink,
    strokeWidth: 1.75,
    ...(warmedUp === null ? { strokeDasharray: "2.5 2.5" } : null),
  };
  if (dayTime === "morning")
    return <Path d={`M${x} ${y - 7}L${x + 7} ${y + 5}H${x - 7}Z`} strokeLinejoin="round" {...look} />;
  if (dayTime === "afternoon") return <Rect x={x - 6} y={y - 6} width={12} height={12} rx={1.5} {...look} />;
  return <Circle cx={x} cy={y} r={6.5} {...look} />;
}

/** As many dates as have room, the newest first. */
function Dates({ points, places, width }: { points: readonly TrendPoint[]; places: readonly number[]; width: number }) {
  const shown: { x: number; words: string }[] = [];
  for (let k = points.length - 1; k >= 0; k -= 1) {
    const x = Math.min(width - 26, Math.max(26, places[k] ?? 0));
    const point = points[k];
    if (point && (shown.at(-1)?.x ?? Infinity) - x >= 58) shown.push({ x, words: dayWords(point.at) });
  }
  return shown.map(({ x, words }) => (
    <SvgLabel key={x} x={x} y={height - 12} size={12} anchor="middle">
      {words}
    </SvgLabel>
  ));
}

function Legend() {
  const item = (words: string, mark: React.ReactNode) => (
    <View key={words} style={{ flexDirection: "row", alignItems: "center", gap: 6 }}>
      <Svg width={18} height={18} aria-hidden>
        {mark}
      </Svg>
      <Text variant="small" tone="soft">
        {words}
      </Text>
    </View>
  );
  const shape = (dayTime: DayTime, warmedUp: boolean | null) => <DayMark point={{ dayTime, warmedUp }} x={9} y={9} />;
  return (
    <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 16, rowGap: 4 }}>
      {item("comfort", <Rect x={4} y={2} width={10} height={14} rx={4} fill={colors.lagoon} />)}
      {item(
        "range",
        <Rect x={4} y={2} width={10} height={14} rx={4} fill="none" stroke={colors.honey} strokeWidth={2} />,
      )}
      {item("guided hold", <Line x1={2} x2={16} y1={9} y2={9} stroke={colors.ink} strokeWidth={2.5} />)}
      {item("morning", shape("morning", false))}
      {item("afternoon", shape("afternoon", false))}
      {item("evening", shape("evening", false))}
      {item("filled: warmed up", shape("evening", true))}
      {item("broken: not said", shape("evening", null))}
    </View>
  );
}

function dayWords(at: Date): string {
  return new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "short" }).format(at);
}

function trendWords(points: readonly TrendPoint[]): string {
  const first = points[0];
  const last = points.at(-1);
  if (!first || !last) return "";
  const one = (point: TrendPoint) => `range ${bandWords(point.range)}, comfort ${bandWords(point.comfort)}`;
  return `${points.length} takes from ${dayWords(first.at)} to ${dayWords(last.at)}. First: ${one(first)}. Last: ${one(last)}. The table below has them all.`;
}
