import Svg, { Circle, Line } from "react-native-svg";
import type { SheetStrokes } from "@/shared/sheets/sheet";
import { strokesHeight, strokesPicture } from "@/shared/sheets/strokesPicture";
import { pieceTones } from "./pieceTones";
import { SvgLabel } from "./SvgLabel";
import { colors } from "./theme";

/** What the right hand does in a bar, drawn as it stands on the sheet: arrows over the count. */
export function StrokeLine({ strokes, width = 240 }: { strokes: SheetStrokes; width?: number }) {
  const { pieces, words } = strokesPicture(strokes, { x: 0, y: 0, width });
  return (
    <Svg width={width} height={strokesHeight} role="img" aria-label={words}>
      {pieces.map((piece, index) => {
        if (piece.kind === "line") {
          const { x1, y1, x2, y2, width: strokeWidth, tone } = piece;
          return (
            <Line key={index} {...{ x1, y1, x2, y2, strokeWidth }} stroke={pieceTones[tone]} strokeLinecap="round" />
          );
        }
        if (piece.kind === "dot") {
          const { x, y, radius, stroke, tone } = piece;
          const look =
            stroke === null
              ? { fill: pieceTones[tone] }
              : { fill: "none", stroke: pieceTones[tone], strokeWidth: stroke };
          return <Circle key={index} cx={x} cy={y} r={radius} {...look} />;
        }
        const run = piece.kind === "text" ? piece.runs[0] : undefined;
        return run ? (
          <SvgLabel key={index} x={run.x} y={run.y} size={run.size} family="mono" fill={colors.ink}>
            {run.text}
          </SvgLabel>
        ) : null;
      })}
    </Svg>
  );
}
