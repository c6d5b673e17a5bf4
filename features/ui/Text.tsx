import { createContext, useContext, type ReactNode } from "react";
import { Text as NativeText, type StyleProp, type TextProps as NativeTextProps, type TextStyle } from "react-native";
import { setSigns } from "./textSigns";
import { colors, fonts } from "./theme";
import { webProps } from "./webStyle";

type TextVariant =
  "body" | "strong" | "small" | "tiny" | "label" | "title" | "display" | "number" | "mono" | "monoBold";
export type TextTone = "ink" | "soft" | "plum" | "onPlum" | "lagoon" | "honey" | "brick";

export interface TextProps extends NativeTextProps {
  /** inside another Text: none, so that the outer one goes on */
  variant?: TextVariant;
  tone?: TextTone;
  children?: ReactNode;
  style?: StyleProp<TextStyle>;
}

const face = (
  fontFamily: string,
  fontWeight: "400" | "500" | "600" | "700",
  fontSize: number,
  lineHeight: number,
): TextStyle => ({
  fontFamily,
  fontWeight,
  fontSize,
  lineHeight,
});

const variants: Record<TextVariant, TextStyle> = {
  body: face(fonts.text, "400", 16, 23),
  strong: face(fonts.text, "600", 16, 23),
  small: face(fonts.text, "400", 14, 20),
  tiny: face(fonts.text, "400", 12, 16),
  label: face(fonts.text, "500", 14, 20),
  title: { ...face(fonts.display, "700", 20, 24), letterSpacing: -0.2 },
  display: { ...face(fonts.display, "700", 36, 40), letterSpacing: -0.5 },
  number: face(fonts.display, "700", 52, 56),
  mono: face(fonts.mono, "400", 16, 22),
  monoBold: face(fonts.mono, "600", 16, 22),
};

const tones: Record<TextTone, string> = {
  ink: colors.ink,
  soft: colors.inkSoft,
  plum: colors.plum,
  onPlum: colors.onPlum,
  lagoon: colors.lagoon,
  honey: colors.honeyText,
  brick: colors.brick,
};

const InsideText = createContext(false);

/** All words on the page. Accidentals get their own span from the music font. */
export function Text({ variant, tone, style, children, ...rest }: TextProps) {
  const inside = useContext(InsideText);
  const kind = variant ?? (inside ? undefined : "body");
  const color = tone ?? (inside ? undefined : "ink");
  const mono = kind === "mono" || kind === "monoBold";
  return (
    <InsideText.Provider value>
      <NativeText
        {...rest}
        {...(mono ? webProps({ dataSet: { mono: "" } }) : null)}
        style={[kind && variants[kind], color && { color: tones[color] }, style]}
      >
        {setSigns(children)}
      </NativeText>
    </InsideText.Provider>
  );
}
