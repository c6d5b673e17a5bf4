import { useEffect, useRef } from "react";
import { Pressable, type StyleProp, type View, type ViewStyle } from "react-native";
import { ButtonFace, buttonBox, type ButtonLook } from "./ButtonFace";
import { useLayout } from "./useLayout";
import { webProps } from "./webStyle";

export interface ButtonProps extends ButtonLook {
  onPress: () => void;
  /** what a screen reader says where the label alone is not enough; must contain the label */
  accessibleName?: string;
  /** inside a Form: sends it */
  submit?: boolean;
  /** for a button that opens and closes something */
  expanded?: boolean;
  testID?: string;
  style?: StyleProp<ViewStyle>;
}

export function Button({ onPress, accessibleName, submit, expanded, testID, style, ...look }: ButtonProps) {
  const layout = useLayout();
  const node = useRef<View>(null);
  const busy = look.busy === true;
  useEffect(() => {
    // The web renderer drops `type`, and would take the focus from a button that it is told is off.
    const button = node.current as unknown as HTMLElement | null;
    if (submit) button?.setAttribute("type", busy ? "button" : "submit");
    if (busy) button?.setAttribute("aria-disabled", "true");
    return () => button?.removeAttribute("aria-disabled");
  }, [submit, busy]);
  return (
    <Pressable
      ref={node}
      role="button"
      onPress={busy ? null : onPress}
      disabled={look.disabled === true}
      testID={testID}
      aria-label={accessibleName}
      {...webProps({ "aria-busy": look.busy || undefined, "aria-expanded": expanded })}
      style={[buttonBox(look, layout), style]}
    >
      <ButtonFace {...look} />
    </Pressable>
  );
}
