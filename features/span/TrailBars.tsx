import { memo } from "react";
import Svg, { G, Path, Rect } from "react-native-svg";
import { colors } from "@/features/ui/theme";
import { ground } from "./Hatch";
import {
  glides,
  lean,
  strength,
  trailPace,
  trailSeconds,
  trailY,
  type TrailNote,
  type TrailPlace,
} from "./trailGeometry";

/** The moving layer is drawn anew from another start this often, so that it never grows. */
export const stretchS = 12;

export interface TrailBarsProps extends TrailPlace {
  notes: readonly TrailNote[];
  /** seconds at which the layer has its x = 0 */
  startS: number;
  now: number;
}

/** Fading in steps lets a bar be drawn once in a second instead of with every frame. */
const fadeSteps = 4;

/** What moves: a bar for each steady note, and the glides between them. The layer around it is shifted as time goes. */
export function TrailBars({ notes, startS, now, width, height, low, high }: TrailBarsProps) {
  const shape = { width, height, low, high, startS };
  return (
    <Svg
      width={trailPace({ width }) * (trailSeconds + stretchS)}
      height={height}
      aria-hidden
      style={{ position: "absolute", left: 0, top: 0, overflow: "visible" } as object}
    >
      {glides(notes).map(({ from, to }) => (
        <Glide key={to.start} from={from} to={to} {...shape} />
      ))}
      {notes.map((note) => (
        <TrailBar
          key={note.start}
          note={note}
          strong={Math.round(strength(note.end, now) / fadeSteps) * fadeSteps}
          {...shape}
        />
      ))}
    </Svg>
  );
}

interface LayerShape extends TrailPlace {
  startS: number;
}

/** One steady note: a bar 12 thick, leaning by its cents, with the sung line drawn in it. */
const TrailBar = memo(function TrailBar({ note, strong, ...shape }: { note: TrailNote; strong: number } & LayerShape) {
  const x = xOf(shape);
  const y = trailY(shape, note.midi);
  const middle = (x(note.start) + x(note.end)) / 2;
  const angle = lean(note.cents);
  const long = Math.max(14, (x(note.end) - x(note.start) + 8) / Math.cos((angle * Math.PI) / 180));
  const slope = Math.tan((angle * Math.PI) / 180);
  const sung = note.points
    .filter((_, index) => index % 2 === 0)
    .map((point) => {
      const along = x(point.t) - middle;
      const off = Math.max(-4.5, Math.min(4.5, (note.midi - point.midi) * 9));
      return `${(middle + along).toFixed(1)} ${(y + along * slope + off).toFixed(1)}`;
    });
  return (
    <G>
      <G transform={`translate(${middle} ${y}) rotate(${angle})`}>
        <Rect
          x={-long / 2}
          y={-6}
          width={long}
          height={12}
          rx={6}
          fill={`color-mix(in srgb,var(--lagoon) ${strong}%,${ground})`}
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
});

const Glide = memo(function Glide({ from, to, ...shape }: { from: TrailNote; to: TrailNote } & LayerShape) {
  const x = xOf(shape);
  const [x1, x2] = [x(from.end), x(to.start)];
  const y1 = trailY(shape, from.midi) + tilt(from, x);
  const y2 = trailY(shape, to.midi) - tilt(to, x);
  const bend = (x2 - x1) * 0.5;
  const points = [x1, y1, x1 + bend, y1, x2 - bend, y2, x2, y2].map((value) => value.toFixed(1));
  return (
    <Path
      d={`M${points.slice(0, 2).join(" ")}C${points.slice(2).join(" ")}`}
      fill="none"
      stroke={colors.inkSoft}
      strokeOpacity={0.75}
      strokeWidth={1.5}
    />
  );
});

function xOf({ width, startS }: LayerShape): (t: number) => number {
  const pace = trailPace({ width });
  return (t) => (t - startS) * pace;
}

/** How far the end of a leaning bar stands below its middle. */
function tilt(note: TrailNote, x: (t: number) => number): number {
  return ((x(note.end) - x(note.start)) / 2) * Math.tan((lean(note.cents) * Math.PI) / 180);
}
