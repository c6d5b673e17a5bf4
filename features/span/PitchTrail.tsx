import { useRef } from "react";
import Svg, { Circle, G, Line, Path, Rect } from "react-native-svg";
import { glyphs, noteName } from "@/shared/music/pitch";
import type { LiveFrame } from "@/shared/voice/liveTracker";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors, mixtures } from "@/features/ui/theme";
import { ground } from "./Hatch";
import { isNatural } from "./ladderGeometry";
import {
  glides,
  lean,
  offsetWords,
  strength,
  trailNotes,
  trailPoints,
  trailScale,
  trailSeconds,
  type TrailNote,
  type TrailPoint,
} from "./trailGeometry";

export interface PitchTrailProps {
  /** of the live tracker, oldest first; older ones than 6 s are passed over */
  frames: readonly LiveFrame[];
  /** seconds, on the clock of the frames */
  now: number;
  width: number;
  height: number;
  /** lines shown; follows the singing unless told otherwise */
  scale?: { low: number; high: number };
  /** frozen after the take: without the open end */
  frozen?: boolean;
  testID?: string;
}

/** The last 6 s: bars on note lines that lean where the singing was flat or sharp, and the glides between them. */
export function PitchTrail({ frames, now, width, height, scale, frozen = false, testID }: PitchTrailProps) {
  const followed = useRef<{ low: number; high: number } | null>(null);
  const points = trailPoints(frames, now);
  const shown = scale ?? trailScale(points, followed.current);
  followed.current = shown;
  const notes = trailNotes(points);

  const left = 52;
  const nowX = width - 44;
  const foot = 38;
  const step = (height - foot - 10) / (shown.high - shown.low);
  const x = (t: number) => nowX - ((now - t) * (nowX - left)) / trailSeconds;
  const y = (midi: number) => 8 + (shown.high - midi) * step;
  const axis = height - 24;
  const lines = Array.from({ length: shown.high - shown.low + 1 }, (_, index) => shown.high - index);
  const last = notes[notes.length - 1];
  const sounding = last !== undefined && now - last.end < 0.25 ? last : null;
  const newest = points[points.length - 1];

  return (
    <Svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={trailWords(sounding)}
      {...(testID === undefined ? null : { testID })}
      style={{ display: "flex" }}
    >
      {lines.map((midi) => (
        <TrailLine
          key={midi}
          midi={midi}
          y={y(midi)}
          width={width}
          names={step >= 13 || midi % 12 === 0 || step * 2 >= 13}
        />
      ))}
      {Array.from({ length: trailSeconds + 1 }, (_, ago) => (
        <G key={ago}>
          <Line
            x1={x(now - ago)}
            x2={x(now - ago)}
            y1={axis}
            y2={axis + 5}
            stroke={colors.inkSoft}
            strokeOpacity={0.6}
            strokeWidth={1}
          />
          {ago % 2 === 0 && (
            <SvgLabel x={x(now - ago)} y={axis + 19} size={12} anchor="middle">
              {ago === 0 ? "now" : `${ago} s ago`}
            </SvgLabel>
          )}
        </G>
      ))}
      <Path
        d={glides(notes)
          .map(({ from, to }) =>
            glidePath(x(from.end), y(from.midi) + tilt(from, x), x(to.start), y(to.midi) - tilt(to, x)),
          )
          .join("")}
        fill="none"
        stroke={colors.inkSoft}
        strokeOpacity={0.75}
        strokeWidth={1.5}
      />
      {notes.map((note) => (
        <TrailBar key={note.start} note={note} points={points} x={x} y={y} now={now} />
      ))}
      <Line
        x1={nowX}
        x2={nowX}
        y1={0}
        y2={axis}
        stroke={colors.inkSoft}
        strokeOpacity={0.7}
        strokeWidth={1}
        strokeDasharray="2 4"
      />
      {!frozen && sounding && newest && <OpenEnd x={nowX} y={y(sounding.midi)} />}
    </Svg>
  );
}

function TrailLine({ midi, y, width, names }: { midi: number; y: number; width: number; names: boolean }) {
  const natural = isNatural(midi);
  const octave = midi % 12 === 0;
  return (
    <G>
      <Line
        x1={48}
        x2={width}
        y1={y}
        y2={y}
        stroke={octave ? mixtures.rungC : colors.line}
        strokeWidth={1}
        {...(natural ? null : { strokeDasharray: "1 7", strokeLinecap: "round" as const })}
      />
      {natural && names && (
        <SvgLabel
          x={40}
          y={y + 4.5}
          size={13}
          family="display"
          weight="600"
          anchor="end"
          fill={octave ? colors.ink : colors.inkSoft}
        >
          {noteName(midi)}
        </SvgLabel>
      )}
    </G>
  );
}

interface TrailBarProps {
  note: TrailNote;
  points: readonly TrailPoint[];
  x: (t: number) => number;
  y: (midi: number) => number;
  now: number;
}

/** One steady note: a bar 12 thick, leaning by its cents, with the sung line drawn in it. */
function TrailBar({ note, points, x, y, now }: TrailBarProps) {
  const middle = (x(note.start) + x(note.end)) / 2;
  const angle = lean(note.cents);
  const long = Math.max(14, (x(note.end) - x(note.start) + 8) / Math.cos((angle * Math.PI) / 180));
  const slope = Math.tan((angle * Math.PI) / 180);
  const sung = points
    .filter((point) => point.t >= note.start && point.t <= note.end)
    .filter((_, index) => index % 2 === 0)
    .map((point) => {
      const along = x(point.t) - middle;
      const off = Math.max(-4.5, Math.min(4.5, (note.midi - point.midi) * 9));
      return `${(middle + along).toFixed(1)} ${(y(note.midi) + along * slope + off).toFixed(1)}`;
    });
  return (
    <G>
      <G transform={`translate(${middle} ${y(note.midi)}) rotate(${angle})`}>
        <Rect
          x={-long / 2}
          y={-6}
          width={long}
          height={12}
          rx={6}
          fill={`color-mix(in srgb,var(--lagoon) ${strength(note.end, now)}%,${ground})`}
        />
      </G>
      {sung.length > 1 && (
        <Path
          d={`M${sung.join("L")}`}
          fill="none"
          stroke={ground}
          strokeWidth={1.25}
          strokeOpacity={0.85}
          strokeLinejoin="round"
        />
      )}
    </G>
  );
}

function OpenEnd({ x, y }: { x: number; y: number }) {
  return (
    <G>
      <Circle cx={x} cy={y} r={13} fill={ground} />
      <Circle cx={x} cy={y} r={11.5} fill="none" stroke={colors.plum} strokeWidth={1.75} />
      <Circle cx={x} cy={y} r={6} fill={colors.plum} />
    </G>
  );
}

/** How far the end of a leaning bar stands below its middle. */
function tilt(note: TrailNote, x: (t: number) => number): number {
  return ((x(note.end) - x(note.start)) / 2) * Math.tan((lean(note.cents) * Math.PI) / 180);
}

function glidePath(x1: number, y1: number, x2: number, y2: number): string {
  const bend = (x2 - x1) * 0.5;
  return `M${x1.toFixed(1)} ${y1.toFixed(1)}C${(x1 + bend).toFixed(1)} ${y1.toFixed(1)} ${(x2 - bend).toFixed(1)} ${y2.toFixed(1)} ${x2.toFixed(1)} ${y2.toFixed(1)}`;
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
