import { Fragment } from "react";
import { Text as SvgText, TSpan } from "react-native-svg";
import { splitSigns } from "./textSigns";
import { colors, fonts } from "./theme";
import { webProps } from "./webStyle";

export interface SvgLabelProps {
  x: number;
  y: number;
  children: string;
  size?: number;
  family?: "display" | "text" | "mono";
  weight?: "400" | "500" | "600" | "700";
  fill?: string;
  anchor?: "start" | "middle" | "end";
  /** a rim of the ground, for words over a drawing */
  halo?: boolean;
}

/** Words inside a drawing, their accidentals from the music font, 1.2 times the size (small ones 1.35) and raised. */
export function SvgLabel({
  x,
  y,
  children,
  size = 12,
  family = "text",
  weight = "400",
  fill = colors.inkSoft,
  anchor = "start",
  halo = false,
}: SvgLabelProps) {
  const rim = halo
    ? { stroke: "var(--ground,var(--paper))", strokeWidth: 3.5, strokeLinejoin: "round", paintOrder: "stroke" }
    : {};
  return (
    <SvgText
      x={x}
      y={y}
      fill={fill}
      fontFamily={fonts[family]}
      fontSize={size}
      fontWeight={weight}
      textAnchor={anchor}
      {...webProps(rim)}
    >
      {splitSigns(children).map(({ text, kind }, index) =>
        kind === "accidental" ? (
          <Fragment key={index}>
            <TSpan
              fontFamily={fonts.music}
              fontSize={size * (size < 13 ? 1.35 : 1.2)}
              fontWeight="400"
              dy={-0.13 * size}
              {...webProps({ className: "mu" })}
            >
              {text}
            </TSpan>
            <TSpan dy={0.13 * size}>{"\u200B"}</TSpan>
          </Fragment>
        ) : (
          <TSpan key={index}>{text}</TSpan>
        ),
      )}
    </SvgText>
  );
}
