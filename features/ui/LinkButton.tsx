import { Link, type Href } from "expo-router";
import type { StyleProp, TextStyle } from "react-native";
import { ButtonFace, buttonBox, type ButtonLook } from "./ButtonFace";
import { useLayout } from "./useLayout";
import { webProps, webStyle } from "./webStyle";

export interface LinkButtonProps extends Omit<ButtonLook, "busy" | "disabled"> {
  href: Href;
  accessibleName?: string;
  replace?: boolean;
  testID?: string;
  style?: StyleProp<TextStyle>;
}

/** A link that looks like a button: it leads to another page. */
export function LinkButton({ href, accessibleName, replace = false, testID, style, ...look }: LinkButtonProps) {
  const layout = useLayout();
  return (
    <Link
      href={href}
      replace={replace}
      testID={testID}
      aria-label={accessibleName}
      {...webProps({ "data-button": "" })}
      style={[buttonBox(look, layout) as TextStyle, webStyle({ display: "flex" }), style]}
    >
      <ButtonFace {...look} />
    </Link>
  );
}
