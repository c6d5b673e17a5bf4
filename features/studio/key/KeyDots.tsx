import Svg, { Circle, G, Line, Rect } from "react-native-svg";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { tonicPitchClass, type Mode } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import type { ClassKey } from "../judge/judgePupils";
import { dotPicture, dotPlaces, xOfKey, yOfScore, type Dot } from "./dotPlaces";

export interface KeyDotsProps {
  /** all twelve */
  keys: readonly ClassKey[];
  mode: Mode;
  picked: ClassKey;
  onPick: (key: ClassKey) => void;
}

const { left, column, height, base, radius } = dotPicture;
const width = left + 12 * column + 8;
const columnWide = 40;

/** Every key, every pupil: one dot is one voice's score. A key is picked by its column. */
export function KeyDots({ keys, mode, picked, onPick }: KeyDotsProps) {
  const shown = [...keys].sort((a, b) => tonicPitchClass(a.tonic) - tonicPitchClass(b.tonic));
  const sign = (tonic: string) => glyphs(keySign({ tonic, mode }));
  return (
    <div
      role="group"
      aria-label="Every key, every pupil: pick a key"
      style={{ position: "relative", width, height, flexShrink: 0 }}
    >
      <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden>
        {[100, 50].map((score) => (
          <G key={score}>
            <Line
              x1={left}
              x2={width}
              y1={yOfScore(score)}
              y2={yOfScore(score)}
              stroke={colors.line}
              {...(score === 100 ? null : { strokeDasharray: "2 4" })}
            />
            <SvgLabel x={left - 6} y={yOfScore(score) + 4} size={11} family="mono" anchor="end">
              {String(score)}
            </SvgLabel>
          </G>
        ))}
        <Line x1={left} x2={width} y1={base} y2={base} stroke={colors.line} />
        {shown.map((key, index) => {
          const on = key.tonic === picked.tonic;
          return (
            <G key={key.tonic}>
              {on && (
                <Rect
                  x={xOfKey(index) - columnWide / 2}
                  y={2}
                  width={columnWide}
                  height={height - 4}
                  rx={10}
                  fill={colors.card}
                  stroke={colors.plum}
                  strokeWidth={1.5}
                />
              )}
              {dotPlaces(key, index).map((dot, k) => (
                <ScoreDot key={k} dot={dot} on={on} />
              ))}
              <SvgLabel
                x={xOfKey(index)}
                y={119}
                size={on ? 16 : 13}
                family={on ? "display" : "mono"}
                weight={on ? "600" : "400"}
                anchor="middle"
                fill={colors.ink}
              >
                {sign(key.tonic)}
              </SvgLabel>
            </G>
          );
        })}
      </Svg>
      {shown.map((key, index) => (
        <button
          key={key.tonic}
          type="button"
          aria-pressed={key.tonic === picked.tonic}
          aria-label={`${sign(key.tonic)}: lowest score ${Math.round(key.worst)}, average ${Math.round(key.mean)}${key.beyond ? ", beyond somebody’s range" : ""}`}
          data-testid={`dots-${key.tonic}`}
          onClick={() => onPick(key)}
          style={{
            position: "absolute",
            left: xOfKey(index) - columnWide / 2,
            top: 2,
            width: columnWide,
            height: height - 4,
            border: 0,
            padding: 0,
            background: "none",
            borderRadius: 10,
            cursor: "pointer",
          }}
        />
      ))}
    </div>
  );
}

/** Solid: comfortable; crossed: some in reach; open: some beyond the range. */
function ScoreDot({ dot: { x, y, fit }, on }: { dot: Dot; on: boolean }) {
  const under = on ? colors.card : colors.paper;
  if (fit === "beyond") return <Circle cx={x} cy={y} r={radius} fill={under} stroke={colors.brick} strokeWidth={1.2} />;
  if (fit === "comfort") return <Circle cx={x} cy={y} r={radius} fill={colors.lagoon} />;
  return (
    <G>
      <Circle cx={x} cy={y} r={radius} fill={colors.honey} />
      <Line x1={x - 1.7} x2={x + 1.7} y1={y + 1.7} y2={y - 1.7} stroke={under} strokeWidth={1.1} />
    </G>
  );
}
