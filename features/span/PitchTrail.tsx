import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import Svg, { Circle, Rect } from "react-native-svg";
import { glyphs, noteName } from "@/shared/music/pitch";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import { ground } from "./Hatch";
import { stretchS, TrailBars } from "./TrailBars";
import { TrailGrid } from "./TrailGrid";
import {
  offsetWords,
  trailPace,
  trailScale,
  trailSeconds,
  trailX,
  trailY,
  type TrailNote,
  type TrailPlace,
} from "./trailGeometry";
import { createTrailRun, type Trail, type TrailMoment } from "./trailRun";

export interface PitchTrailProps {
  /** asked whenever the picture is drawn, which is at the pace of the screen */
  read: () => TrailMoment;
  width: number;
  height: number;
  /** lines shown; follows the singing unless told otherwise */
  scale?: { low: number; high: number };
  testID?: string;
}

/** Where people want no motion, the trail moves on only so often. */
const calmMs = 250;
/** Bars come into sight and go out of it at the left edge of the lines. */
const clipLeft = 44;

/**
 * The last 6 s: bars on note lines that lean where the singing was flat or sharp, and the glides between them. Three
 * layers: the lines stand still, the bars are drawn as notes change and moved on as time goes, the open end comes last.
 */
export function PitchTrail({ read, width, height, scale, testID }: PitchTrailProps) {
  const [run] = useState(createTrailRun);
  const followed = useRef<{ low: number; high: number } | null>(null);
  const [{ trail, now }, setDrawn] = useState(() => moment(read, run));
  const layer = useRef<View>(null);
  const startS = Math.floor(now / stretchS) * stretchS;
  const start = useRef(startS);

  const shown =
    scale ??
    trailScale(
      trail.notes.map(({ end: t, midi }) => ({ t, midi })),
      followed.current,
    );
  const place: TrailPlace = { width, height, low: shown.low, high: shown.high };
  const shift = (at: number, from: number) => trailX(place)(from - at) - clipLeft;
  useEffect(() => {
    followed.current = shown;
    start.current = startS;
  });

  useEffect(() => {
    const calm = window.matchMedia?.("(prefers-reduced-motion: reduce)").matches ?? false;
    const x = trailX({ width });
    let last = performance.now();
    let seen = "";
    let handle = requestAnimationFrame(function draw(atMs) {
      handle = requestAnimationFrame(draw);
      if (calm && atMs - last < calmMs) return;
      last = atMs;
      const next = moment(read, run);
      const element = layer.current as unknown as HTMLElement | null;
      if (element) element.style.transform = `translateX(${x(start.current - next.now) - clipLeft}px)`;
      const sign = signOf(next);
      if (sign !== seen) setDrawn(next);
      seen = sign;
    });
    return () => cancelAnimationFrame(handle);
  }, [read, run, width]);

  const last = trail.notes.at(-1) ?? null;
  const sounding = last && trail.newest && trail.newest.t - last.end < 0.25 ? last : null;
  return (
    <View
      role="img"
      aria-label={trailWords(sounding)}
      {...(testID === undefined ? null : { testID })}
      style={{ width, height }}
    >
      <TrailGrid {...place} />
      <View style={{ position: "absolute", left: clipLeft, right: 0, top: 0, bottom: 0, overflow: "hidden" }}>
        <View
          ref={layer}
          style={[
            { position: "absolute", left: 0, top: 0, width: trailPace(place) * stretchS, height },
            webStyle({ transform: `translateX(${shift(now, startS)}px)`, willChange: "transform" }),
          ]}
        >
          <TrailBars {...place} notes={trail.notes} startS={startS} now={now} />
        </View>
      </View>
      {trail.newest && (
        <OpenEnd x={trailX(place)(0)} y={trailY(place, clamped(endOf(trail, sounding), shown))} height={height} />
      )}
    </View>
  );
}

function moment(read: () => TrailMoment, run: ReturnType<typeof createTrailRun>): { trail: Trail; now: number } {
  const at = read();
  return { trail: run(at), now: at.now };
}

/** Changes when there is something new to draw; mere passing of time only moves the layer. */
function signOf({ trail: { notes, newest }, now }: { trail: Trail; now: number }): string {
  const last = notes.at(-1);
  const end = newest ? `${newest.t}/${Math.round(newest.midi * 20)}` : "";
  return `${notes.length} ${notes[0]?.start} ${last?.start} ${last?.end} ${end} ${Math.floor(now)}`;
}

/** The open end stands on its bar while the pitch stays near it, and goes ahead where the pitch has left. */
function endOf({ newest }: Trail, sounding: TrailNote | null): number {
  const pitch = newest?.midi ?? 0;
  return sounding && Math.abs(sounding.midi - pitch) < 0.7 ? sounding.midi : pitch;
}

function clamped(midi: number, { low, high }: { low: number; high: number }): number {
  return Math.max(low, Math.min(high, midi));
}

function OpenEnd({ x, y, height }: { x: number; y: number; height: number }) {
  return (
    <Svg
      width={28}
      height={height}
      viewBox={`-14 0 28 ${height}`}
      aria-hidden
      style={{ position: "absolute", left: x - 14, top: 0 }}
    >
      <Circle cx={0} cy={y} r={13} fill={ground} />
      <Circle cx={0} cy={y} r={11.5} fill="none" stroke={colors.plum} strokeWidth={1.75} />
      <Circle cx={0} cy={y} r={6} fill={colors.plum} />
    </Svg>
  );
}

function trailWords(sounding: TrailNote | null): string {
  const now =
    sounding === null
      ? "Nothing is sounding now."
      : `Now: ${glyphs(noteName(sounding.line))}, ${offsetWords(sounding.cents)}.`;
  return `The last ${trailSeconds} seconds of pitch against note lines. ${now} A bar that leans down is flat, one that leans up is sharp.`;
}

/** What the lean of a bar means. */
export function TrailLegend() {
  return (
    <Svg
      width={62}
      height={34}
      viewBox="-2 0 62 34"
      role="img"
      aria-label="A bar leaning down is flat, leaning up is sharp"
    >
      <Rect x={2} y={5} width={22} height={9} rx={4.5} fill={colors.lagoon} transform="rotate(12 13 9.5)" />
      <Rect x={30} y={5} width={22} height={9} rx={4.5} fill={colors.lagoon} transform="rotate(-12 41 9.5)" />
      <SvgLabel x={11} y={31} size={12} anchor="middle">
        flat
      </SvgLabel>
      <SvgLabel x={45} y={31} size={12} anchor="middle">
        sharp
      </SvgLabel>
    </Svg>
  );
}
