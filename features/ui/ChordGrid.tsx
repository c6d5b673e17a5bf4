import { View } from "react-native";
import Svg, { Circle, G, Line, Rect } from "react-native-svg";
import { glyphs } from "@/shared/music/pitch";
import { gridWindow } from "@/shared/ways/gridWindow";
import type { Shape } from "@/shared/ways/way";
import {
  cardMeasure,
  fretY,
  nameLines,
  pieceMeasure,
  spokenGrid,
  stringX,
  type GridMeasure,
} from "./chordGridGeometry";
import { SvgLabel } from "./SvgLabel";
import { Text } from "./Text";
import { colors } from "./theme";
import { useLayout } from "./useLayout";
import { webStyle } from "./webStyle";

export interface ChordGridProps {
  /** name of the shape, ASCII or glyphs */
  name: string;
  shape: Shape;
  /** number of strings */
  strings: number;
  /** fret of the capo, 0 for none */
  capo?: number;
  /** what is heard, where it differs from the shape's name */
  sounds?: string | undefined;
  leftHanded?: boolean;
  /** note names of the strings in playing order, for the words */
  stringNames?: readonly string[] | undefined;
  /** what the frets are called, from the open string on, where that is not their number */
  fretNames?: readonly string[] | undefined;
  /** lines kept for the name, so that neighbours begin at one height; as many as it takes unless told otherwise */
  nameHeight?: number;
  /** px; by the layout unless told otherwise */
  measure?: GridMeasure;
  testID?: string;
}

interface DrawnDot {
  x: number;
  y: number;
  finger: number;
  root: boolean;
  inBarre: boolean;
}

function Dot({ x, y, finger, root, inBarre, radius }: DrawnDot & { radius: number }) {
  return (
    <G>
      {(root || !inBarre) && <Circle cx={x} cy={y} r={radius} fill={root ? colors.plum : colors.ink} />}
      {finger > 0 && (
        <SvgLabel
          x={x}
          y={y + radius / 2}
          size={radius * 1.48}
          weight="600"
          anchor="middle"
          fill={root ? colors.onPlum : colors.paper}
        >
          {String(finger)}
        </SvgLabel>
      )}
    </G>
  );
}

/** The neck from the front, drawn after the bass side at the left; left-handed grids are mirrored. */
export function ChordGrid({
  name,
  shape,
  strings,
  capo = 0,
  sounds,
  leftHanded = false,
  stringNames,
  fretNames,
  nameHeight,
  measure,
  testID,
}: ChordGridProps) {
  const layout = useLayout();
  const size = measure ?? (layout === "phone" ? cardMeasure : pieceMeasure);
  const window = gridWindow(shape);
  const upTheNeck = window.first > 1;
  const radius = size.dot;
  const nut = 18;
  const top = capo > 0 && upTheNeck ? nut + 14 : nut;
  const bottom = top + window.rows * size.fret;
  const left = 20;
  const right = left + (strings - 1) * size.string;
  const indices = Array.from({ length: strings }, (_, index) => index);
  const x = (index: number) => stringX(index, strings, size, leftHanded);
  const { barre } = shape;
  const lines = nameLines(glyphs(name));
  const named = fretNames ? Array.from({ length: window.rows }, (_, row) => window.first + row) : [];
  const words = spokenGrid({
    name: glyphs(name),
    shape,
    capo,
    sounds: sounds === undefined ? undefined : glyphs(sounds),
    stringNames: stringNames?.map(glyphs),
    fretNames,
  });

  return (
    <View testID={testID} style={{ alignItems: "center", flexShrink: 0 }}>
      <View
        aria-hidden
        style={{ minHeight: 18 * Math.max(lines.length, nameHeight ?? 0), justifyContent: "flex-end", paddingLeft: 10 }}
      >
        {lines.map((line) => (
          <Text
            key={line}
            variant="monoBold"
            style={[{ fontSize: 14, lineHeight: 18, textAlign: "center" }, webStyle({ whiteSpace: "nowrap" })]}
          >
            {line}
          </Text>
        ))}
      </View>
      <Svg
        width={right + 10}
        height={bottom + 3}
        viewBox={`0 0 ${right + 10} ${bottom + 3}`}
        role="img"
        aria-label={words}
        // Names such as 13½ reach out to the left.
        style={webStyle({ overflow: "visible" })}
      >
        {Array.from({ length: window.rows + 1 }, (_, row) => row)
          .slice(upTheNeck ? 0 : 1)
          .map((row) => (
            <Line
              key={row}
              x1={left}
              x2={right}
              y1={top + row * size.fret}
              y2={top + row * size.fret}
              stroke={colors.inkSoft}
              strokeOpacity={0.55}
              strokeWidth={1}
            />
          ))}
        {indices.map((index) => (
          <Line
            key={index}
            x1={x(index)}
            x2={x(index)}
            y1={top}
            y2={bottom}
            stroke={colors.inkSoft}
            strokeWidth={1.25}
          />
        ))}
        {top > nut &&
          indices.map((index) => (
            <Line
              key={index}
              x1={x(index)}
              x2={x(index)}
              y1={nut + 5}
              y2={top}
              stroke={colors.inkSoft}
              strokeWidth={1.25}
              strokeDasharray="2 2.5"
            />
          ))}
        {capo > 0 ? (
          <G>
            <Rect x={left - 6} y={nut - 4} width={right - left + 12} height={8} rx={4} fill={colors.ink} />
            <SvgLabel x={10} y={nut + 4} size={12} family="display" weight="600" anchor="end" fill={colors.ink}>
              {String(capo)}
            </SvgLabel>
          </G>
        ) : (
          !upTheNeck && (
            <Line
              x1={left - 0.5}
              x2={right + 0.5}
              y1={nut - 0.5}
              y2={nut - 0.5}
              stroke={colors.ink}
              strokeWidth={3}
              strokeLinecap="round"
            />
          )
        )}
        {named.map((fret) => (
          <SvgLabel
            key={fret}
            x={9}
            y={fretY(fret, window, top, size) + 4}
            size={fret === window.first ? 12 : 11}
            family="display"
            weight="600"
            anchor="end"
            fill={colors.inkSoft}
          >
            {fretNames?.[fret] ?? ""}
          </SvgLabel>
        ))}
        {upTheNeck && !fretNames && (
          <SvgLabel
            x={10}
            y={fretY(window.first, window, top, size) + 4}
            size={12}
            family="display"
            weight="600"
            anchor="end"
            fill={colors.ink}
          >
            {String(window.first)}
          </SvgLabel>
        )}
        {barre && (
          <Rect
            x={Math.min(x(barre.fromString), x(barre.toString)) - radius}
            y={fretY(barre.fret, window, top, size) - radius}
            width={Math.abs(x(barre.toString) - x(barre.fromString)) + 2 * radius}
            height={2 * radius}
            rx={radius}
            fill={colors.ink}
          />
        )}
        {indices.map((index) => {
          const fret = shape.frets[index];
          const root = shape.roots.includes(index);
          if (fret === null || fret === undefined) {
            return (
              <Line
                key={index}
                x1={x(index) - 4}
                x2={x(index) + 4}
                y1={7}
                y2={7}
                stroke={colors.inkSoft}
                strokeWidth={2}
                strokeLinecap="round"
              />
            );
          }
          if (fret === 0) {
            return (
              <Circle
                key={index}
                cx={x(index)}
                cy={7}
                r={4.25}
                fill="none"
                stroke={root ? colors.plum : colors.ink}
                strokeWidth={root ? 2.5 : 1.75}
              />
            );
          }
          const inBarre =
            barre !== null &&
            fret === barre.fret &&
            index >= Math.min(barre.fromString, barre.toString) &&
            index <= Math.max(barre.fromString, barre.toString);
          return (
            <Dot
              key={index}
              x={x(index)}
              y={fretY(fret, window, top, size)}
              finger={shape.fingers[index] ?? 0}
              root={root}
              inBarre={inBarre}
              radius={radius}
            />
          );
        })}
      </Svg>
      {sounds !== undefined && (
        <Text variant="tiny" tone="soft" aria-hidden style={{ paddingLeft: 10, marginTop: 3, textAlign: "center" }}>
          {`sounds ${glyphs(sounds)}`}
        </Text>
      )}
    </View>
  );
}
