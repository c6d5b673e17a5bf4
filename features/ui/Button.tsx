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

// The web renderer makes every button a plain one and drops `type`.
const asSubmit = (node: View | null) => void (node as unknown as HTMLElement | null)?.setAttribute("type", "submit");

export function Button({ onPress, accessibleName, submit, expanded, testID, style, ...look }: ButtonProps) {
  const layout = useLayout();
  const off = look.disabled === true || look.busy === true;
  return (
    <Pressable
      {...(submit ? { ref: asSubmit } : null)}
      role="button"
      onPress={onPress}
      disabled={off}
      testID={testID}
      aria-label={accessibleName}
      {...webProps({ "aria-busy": look.busy || undefined, "aria-expanded": expanded })}
      style={[buttonBox(look, layout), style]}
    >
      <ButtonFace {...look} />
    </Pressable>
  );
}
