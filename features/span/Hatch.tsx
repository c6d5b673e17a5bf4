import { useId } from "react";
import { Defs, Pattern, Rect } from "react-native-svg";
import { colors } from "@/features/ui/theme";

export const ground = "var(--ground,var(--paper))";

/** An id that may stand inside url(#…). */
export function useDrawingId(): string {
  return `d${useId().replace(/\W/g, "")}`;
}

export interface HatchProps {
  id: string;
  /** px from line to line */
  pitch: number;
  /** thickness of a line */
  line: number;
  lineOpacity?: number;
  /** colour under the lines */
  under?: string;
  underOpacity?: number;
}

/** Diagonal honey lines: what lies in reach. */
export function Hatch({ id, pitch, line, lineOpacity = 1, under = ground, underOpacity = 1 }: HatchProps) {
  return (
    <Defs>
      <Pattern id={id} width={pitch} height={pitch} patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        {under !== "none" && <Rect width={pitch} height={pitch} fill={under} fillOpacity={underOpacity} />}
        <Rect width={line} height={pitch} fill={colors.honey} fillOpacity={lineOpacity} />
      </Pattern>
    </Defs>
  );
}
