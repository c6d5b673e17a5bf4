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

/** How far beyond its letters a link can be pressed, px; links beneath each other stand `linkGap` apart. */
const reach = { tall: 14, wide: 6 };
export const linkGap = 2 * reach.tall;

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
          // Each side by its own name: React Native drops lengths written in one line, and the link shrinks to its letters.
          paddingVertical: reach.tall,
          marginVertical: -reach.tall,
          paddingHorizontal: reach.wide,
          marginHorizontal: -reach.wide,
        },
        webStyle({
          textDecorationLine: "underline",
          textDecorationThickness: 1,
          textUnderlineOffset: 3,
          whiteSpace: "normal",
          display: "inline-block",
        }),
        style,
      ]}
    >
      {setSigns(children)}
    </Link>
  );
}
