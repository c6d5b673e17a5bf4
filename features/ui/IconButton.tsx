import { Pressable, type StyleProp, type ViewStyle } from "react-native";
import { Icon, type IconName } from "./Icon";
import { colors, sizes } from "./theme";
import { webProps } from "./webStyle";

export interface IconButtonProps {
  icon: IconName;
  /** what it does, in words */
  label: string;
  onPress: () => void;
  /** for a button that stays in or out, such as a pin */
  pressed?: boolean;
  disabled?: boolean;
  color?: string;
  testID?: string;
  style?: StyleProp<ViewStyle>;
}

export function IconButton({
  icon,
  label,
  onPress,
  pressed,
  disabled,
  color = colors.ink,
  testID,
  style,
}: IconButtonProps) {
  return (
    <Pressable
      role="button"
      aria-label={label}
      onPress={onPress}
      disabled={disabled}
      testID={testID}
      {...webProps({ "aria-pressed": pressed, title: label })}
      style={[
        {
          width: sizes.target,
          height: sizes.target,
          alignItems: "center",
          justifyContent: "center",
          borderRadius: sizes.radius,
          opacity: disabled ? 0.5 : 1,
        },
        style,
      ]}
    >
      <Icon name={icon} color={color} />
    </Pressable>
  );
}
