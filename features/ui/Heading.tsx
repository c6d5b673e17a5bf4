import { forwardRef, type ReactNode } from "react";
import { Text as NativeText, type StyleProp, type TextStyle } from "react-native";
import { setSigns } from "./textSigns";
import { colors, fonts } from "./theme";
import { webProps, webStyle } from "./webStyle";

export interface HeadingProps {
  level: 1 | 2 | 3;
  /** px; 36, 20 and 16 for the three levels unless told otherwise */
  size?: number;
  /** can take the focus by script, for the change of page */
  focusable?: boolean;
  children: ReactNode;
  style?: StyleProp<TextStyle>;
}

const usual = { 1: 36, 2: 20, 3: 16 } as const;

export const Heading = forwardRef<NativeText, HeadingProps>(function Heading(
  { level, size = usual[level], focusable, children, style },
  ref,
) {
  return (
    <NativeText
      ref={ref}
      role="heading"
      {...webProps({ "aria-level": level, ...(focusable ? { tabIndex: -1 } : null) })}
      style={[
        {
          color: colors.ink,
          fontFamily: fonts.display,
          fontWeight: "700",
          fontSize: size,
          lineHeight: Math.round(size * (size >= 26 ? 1.1 : 1.2)),
          letterSpacing: size >= 26 ? -0.015 * size : -0.01 * size,
        },
        webStyle({ textWrap: "balance" }),
        style,
      ]}
    >
      {setSigns(children)}
    </NativeText>
  );
});
