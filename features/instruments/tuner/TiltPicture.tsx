import Svg, { G, Line, Rect } from "react-native-svg";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { median } from "@/shared/signal/median";
import { inTuneCents } from "./tunerState";

export interface TiltPictureProps {
  trail: readonly { t: number; cents: number }[];
  /** the note to reach */
  target: string;
  width: number;
  height: number;
  /** the same in words */
  label: string;
}

const left = 52;
const right = 16;
/** Cents at which the scale ends; near the note it is drawn wider than far from it. */
const edgeCents = 200;
const shownS = 2.4;
const barS = 0.3;

/** Height of so many cents off: the first few take up as much as the last hundred. */
function tiltY(cents: number, height: number): number {
  const scale = Math.asinh(edgeCents / 8);
  const share = Math.max(-1, Math.min(1, Math.asinh(cents / 8) / scale));
  return height / 2 - share * (height / 2 - 22);
}

/** As bars of the pitch trail lean: 0.4 degrees a cent, 14 at most, up where it is high. */
function tiltLean(cents: number): number {
  return -Math.max(-14, Math.min(14, cents * 0.4));
}

/** The last moments of one string about the line of its note: bars that lean by what is missing and lie level when it is there. */
export function TiltPicture({ trail, target, width, height, label }: TiltPictureProps) {
  const now = trail[trail.length - 1]?.t ?? 0;
  const pace = (width - left - right) / (shownS + barS);
  const long = Math.max(24, barS * pace - 6);
  const middle = height / 2;
  return (
    <Svg width={width} height={height} role="img" aria-label={label} testID="tilt-picture">
      {[-100, -20, 20, 100].map((cents) => (
        <G key={cents}>
          <Line
            x1={left}
            x2={width - right}
            y1={tiltY(cents, height)}
            y2={tiltY(cents, height)}
            stroke={colors.line}
            strokeWidth={1}
          />
          <SvgLabel x={left - 8} y={tiltY(cents, height) + 4} anchor="end">
            {`${cents > 0 ? "+" : "−"}${Math.abs(cents)}`}
          </SvgLabel>
        </G>
      ))}
      <Rect
        x={left}
        y={tiltY(inTuneCents, height)}
        width={width - left - right}
        height={tiltY(-inTuneCents, height) - tiltY(inTuneCents, height)}
        fill={colors.lagoon}
        opacity={0.16}
      />
      <Line x1={left} x2={width - right} y1={middle} y2={middle} stroke={colors.ink} strokeWidth={1.5} />
      <SvgLabel x={left - 8} y={middle + 6} size={16} weight="600" family="display" anchor="end" fill={colors.ink}>
        {target}
      </SvgLabel>
      {barsOf(trail, now).map(({ t, cents, newest }) => (
        <Bar
          key={t}
          x={width - right - long / 2 - (now - t) * pace}
          y={tiltY(cents, height)}
          cents={cents}
          newest={newest}
          long={long}
        />
      ))}
    </Svg>
  );
}

function Bar({ x, y, cents, newest, long }: { x: number; y: number; cents: number; newest: boolean; long: number }) {
  const off = Math.abs(cents);
  const color = off <= inTuneCents ? colors.lagoon : off <= 20 ? colors.honey : colors.brick;
  const dotted = off > 20;
  return (
    <G transform={`translate(${x} ${y}) rotate(${tiltLean(cents)})`} opacity={newest ? 1 : 0.76}>
      <Rect
        x={-long / 2}
        y={-6}
        width={long}
        height={12}
        rx={6}
        fill={dotted ? "none" : color}
        stroke={color}
        strokeWidth={1.5}
        {...(dotted ? { strokeDasharray: "3 3" } : null)}
      />
      {dotted && newest && (
        <SvgLabel x={0} y={cents > 0 ? -10 : 22} size={14} anchor="middle" fill={color}>
          {cents > 0 ? "▲" : "▼"}
        </SvgLabel>
      )}
    </G>
  );
}

/** One bar for each third of a second: the middle one of its readings. */
function barsOf(trail: readonly { t: number; cents: number }[], now: number) {
  const bars = new Map<number, { t: number; cents: number[] }>();
  for (const { t, cents } of trail) {
    if (t < now - shownS) continue;
    const key = Math.floor((now - t) / barS);
    const bar = bars.get(key) ?? { t: now - key * barS, cents: [] };
    bar.cents.push(cents);
    bars.set(key, bar);
  }
  return [...bars].map(([key, { t, cents }]) => ({ t, cents: median(cents), newest: key === 0 }));
}
