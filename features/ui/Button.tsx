import { Pressable, type StyleProp, type ViewStyle } from "react-native";
import { ButtonFace, buttonBox, type ButtonLook } from "./ButtonFace";
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
  const off = look.disabled === true || look.busy === true;
  return (
    <Pressable
      role="button"
      onPress={onPress}
      disabled={off}
      testID={testID}
      aria-label={accessibleName}
      {...webProps({ "aria-busy": look.busy || undefined, "aria-expanded": expanded, ...(submit ? { type: "submit" } : null) })}
      style={[buttonBox(look), style]}
    >
      <ButtonFace {...look} />
    </Pressable>
  );
}
