import { Link, type Href } from "expo-router";
import type { StyleProp, TextStyle } from "react-native";
import { setSigns } from "./textSigns";
import { colors, fonts } from "./theme";
import { webStyle } from "./webStyle";

export interface TextLinkProps {
  href: Href;
  children: string;
  /** px */
  size?: number;
  testID?: string;
  style?: StyleProp<TextStyle>;
}

/** A link among words. */
export function TextLink({ href, children, size = 14, testID, style }: TextLinkProps) {
  return (
    <Link
      href={href}
      testID={testID}
      style={[
        {
          color: colors.plum,
          fontFamily: fonts.text,
          fontWeight: "600",
          fontSize: size,
          lineHeight: Math.round(size * 1.45),
        },
        webStyle({
          textDecorationLine: "underline",
          textDecorationThickness: 1,
          textUnderlineOffset: 3,
          whiteSpace: "normal",
          display: "inline-block",
          padding: "10px 6px",
          margin: "-10px -6px",
        }),
        style,
      ]}
    >
      {setSigns(children)}
    </Link>
  );
}
