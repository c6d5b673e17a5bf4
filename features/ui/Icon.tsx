import Svg, { Circle, Path, Rect } from "react-native-svg";
import { colors } from "./theme";

/** Line drawings on a square of 24, in lines of 1.75. Circles are [cx, cy, r], filled where a fourth part says so. */
interface Drawing {
  paths?: readonly string[];
  circles?: readonly (readonly [number, number, number, "filled"?])[];
  rect?: { x: number; y: number; width: number; height: number; rx: number };
  filled?: boolean;
}

const drawings = {
  voice: {
    rect: { x: 8.5, y: 3, width: 7, height: 18, rx: 3.5 },
    paths: ["M4 8.5h2M4 15.5h2M18 12h2.5M18 7.5h1.5M18 16.5h1.5"],
  },
  songs: {
    paths: ["M5 4.5h10.5L19 8v11.5H5z", "M8.5 12.5h7M8.5 16h5"],
    circles: [
      [9, 8.6, 1.1, "filled"],
      [12.8, 8.6, 1.1, "filled"],
    ],
  },
  instruments: {
    paths: [
      "M14.2 9.8 20 4M18 3.2 20.8 6",
      "M13.6 8.2a3 3 0 0 0-4.4.4c-.7 1-1.4 1.4-2.6 1.6a5 5 0 1 0 7.2 7.2c.2-1.2.6-1.9 1.6-2.6a3 3 0 0 0 .4-4.4z",
    ],
    circles: [[10.2, 13.8, 1.4]],
  },
  studio: {
    paths: ["M3.5 11 12 4l8.5 7", "M6 9.5V20h12V9.5", "M8.8 20a3.2 3.2 0 0 1 6.4 0"],
    circles: [[12, 12.7, 1.9]],
  },
  person: { circles: [[12, 9, 3.6]], paths: ["M5 20a7 7 0 0 1 14 0"] },
  mic: { rect: { x: 9, y: 3, width: 6, height: 11, rx: 3 }, paths: ["M5.5 11.5a6.5 6.5 0 0 0 13 0M12 18v3"] },
  stop: { rect: { x: 5, y: 5, width: 14, height: 14, rx: 3 }, filled: true },
  play: { paths: ["M8 5.5v13l10.5-6.5z"] },
  pause: { paths: ["M8.5 5.5v13M15.5 5.5v13"] },
  again: { paths: ["M19 12a7 7 0 1 1-2.3-5.2M19 4v4h-4"] },
  undo: { paths: ["M8.5 5 4.5 9l4 4", "M5 9h9.5a5 5 0 0 1 0 10H9"] },
  redo: { paths: ["m15.5 5 4 4-4 4", "M19 9H9.5a5 5 0 0 0 0 10H15"] },
  back: { paths: ["m14.5 5.5-6.5 6.5 6.5 6.5"] },
  forward: { paths: ["m9.5 5.5 6.5 6.5-6.5 6.5"] },
  up: { paths: ["m5.5 14.5 6.5-6.5 6.5 6.5"] },
  down: { paths: ["m5.5 9.5 6.5 6.5 6.5-6.5"] },
  close: { paths: ["m6 6 12 12M18 6 6 18"] },
  check: { paths: ["m5.5 12.5 4.2 4.2 8.8-9.2"] },
  plus: { paths: ["M12 5v14M5 12h14"] },
  minus: { paths: ["M5 12h14"] },
  warning: { paths: ["M12 4 3.5 19h17z", "M12 10v4.2M12 16.6v.2"] },
  offline: { paths: ["M4 15.5a8 8 0 0 1 2-9M18.5 8a8 8 0 0 1 1.2 7.5M9 19h6M4 4l16 16"] },
  bookmark: { paths: ["M7 4h10v16l-5-4-5 4z"] },
  bookmarkFilled: { paths: ["M7 4h10v16l-5-4-5 4z"], filled: true },
  edit: { paths: ["M5 19l1-4L16 5l3 3L9 18z", "M14 7l3 3"] },
  trash: { paths: ["M5 7h14M10 4h4M7 7l1 13h8l1-13", "M10.5 11v5.5M13.5 11v5.5"] },
  search: { circles: [[11, 11, 6]], paths: ["m15.5 15.5 4.5 4.5"] },
  more: {
    circles: [
      [5.5, 12, 1.4, "filled"],
      [12, 12, 1.4, "filled"],
      [18.5, 12, 1.4, "filled"],
    ],
  },
  file: { paths: ["M6 3.5h8l4 4v13H6z", "M14 3.5v4h4"] },
  morning: {
    circles: [[12, 12, 3.8]],
    paths: ["M12 3v2M12 19v2M3 12h2M19 12h2M5.6 5.6 7 7M17 17l1.4 1.4M5.6 18.4 7 17M17 7l1.4-1.4"],
  },
  lamplight: { paths: ["M19 14.5A7.5 7.5 0 0 1 9.5 5a7.5 7.5 0 1 0 9.5 9.5z"] },
} as const satisfies Record<string, Drawing>;

export type IconName = keyof typeof drawings;

export interface IconProps {
  name: IconName;
  size?: number;
  /** any CSS colour; the colour of the words beside it unless told otherwise */
  color?: string;
}

/** Decoration only: the words stand beside it or in the label of its button. */
export function Icon({ name, size = 24, color = "currentColor" }: IconProps) {
  const { paths = [], circles = [], rect, filled }: Drawing = drawings[name];
  return (
    <Svg width={size} height={size} viewBox="0 0 24 24" aria-hidden style={{ flexShrink: 0 }}>
      {rect && <Rect {...rect} fill={filled ? color : "none"} stroke={color} strokeWidth={1.75} />}
      {paths.map((d) => (
        <Path
          key={d}
          d={d}
          fill={filled ? color : "none"}
          stroke={color}
          strokeWidth={1.75}
          strokeLinecap="round"
          strokeLinejoin="round"
        />
      ))}
      {circles.map(([cx, cy, r, solid]) => (
        <Circle
          key={`${cx},${cy}`}
          cx={cx}
          cy={cy}
          r={r}
          fill={solid ? color : "none"}
          stroke={solid ? "none" : color}
          strokeWidth={1.75}
        />
      ))}
    </Svg>
  );
}

/** The sign of the house: a voice column on four lines with a lark across it. */
export function Mark({ size = 34 }: { size?: number }) {
  return (
    <Svg width={size} height={size} viewBox="0 0 34 34" aria-hidden>
      <Path d="M3 5h28M3 13h28M3 21h28M3 29h28" stroke={colors.ink} strokeWidth={1.3} strokeOpacity={0.5} fill="none" />
      <Rect x={11} y={7} width={12} height={20} rx={6} fill={colors.lagoon} />
      <Path d="M6 17.5q5.5-6.5 11-1q5.5-5.5 11 1" fill="none" stroke={colors.paper} strokeWidth={2.4} />
    </Svg>
  );
}
