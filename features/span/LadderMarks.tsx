import { Circle, G, Path, Rect } from "react-native-svg";
import type { KeyMark, SingingVoice } from "@/shared/keys/keyScore";
import { colors } from "@/features/ui/theme";
import { ground } from "./Hatch";
import { markLength, sideOf, yOf, type Scale } from "./ladderGeometry";

export interface LadderMarksProps {
  id: string;
  marks: readonly KeyMark[];
  voice: SingingVoice | null;
  scale: Scale;
  step: number;
  pad: number;
  /** edge that the marks start from */
  x: number;
  /** 1 to the right of the column, -1 to the left */
  direction: 1 | -1;
  height: number;
  perPercent: number;
}

/** The song beside the column: ink where it sits well, hatched in reach, dotted with ▲ or ▼ beyond. */
export function LadderMarks({
  id,
  marks,
  voice,
  scale,
  step,
  pad,
  x,
  direction,
  height,
  perPercent,
}: LadderMarksProps) {
  return (
    <G>
      {marks.map((mark) => {
        const length = markLength(mark.share, perPercent, height);
        const y = yOf(mark.midi, scale, step, pad);
        const left = direction === 1 ? x : x - length;
        if (mark.zone === "comfort") {
          return (
            <G key={mark.midi}>
              <Rect x={left} y={y - height / 2} width={length} height={height} rx={height / 2} fill={colors.ink} />
              {mark.home && <Circle cx={x + direction * height} cy={y} r={height * 0.26} fill={ground} />}
            </G>
          );
        }
        const beyond = mark.zone === "beyond";
        const tip = x + direction * (length + 6);
        const up = voice === null || sideOf(mark.midi, voice) === "above";
        const rise = up ? -7.2 : 7.2;
        return (
          <G key={mark.midi}>
            <Rect
              x={left + 0.75}
              y={y - height / 2 + 0.75}
              width={length - 1.5}
              height={height - 1.5}
              rx={(height - 1.5) / 2}
              fill={beyond ? "none" : `url(#${id}s)`}
              stroke={beyond ? colors.brick : colors.honey}
              strokeWidth={1.5}
              {...(beyond ? { strokeDasharray: "0.1 3.2", strokeLinecap: "round" as const } : null)}
            />
            {mark.home && (
              <Circle
                cx={x + direction * height}
                cy={y}
                r={height * 0.26}
                fill={beyond ? colors.brick : colors.honey}
              />
            )}
            {beyond && (
              <Path d={`M${direction === 1 ? tip : tip - 9} ${y - rise / 2}h9l-4.5 ${rise}z`} fill={colors.brick} />
            )}
          </G>
        );
      })}
    </G>
  );
}
