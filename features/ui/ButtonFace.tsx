import { ActivityIndicator, View, type ViewStyle } from "react-native";
import { Icon, type IconName } from "./Icon";
import { Text } from "./Text";
import { colors, sizes } from "./theme";

export type ButtonKind = "primary" | "secondary" | "text";

export interface ButtonLook {
  label: string;
  kind?: ButtonKind;
  icon?: IconName;
  busy?: boolean;
  disabled?: boolean;
  /** 48 high instead of 56 */
  small?: boolean;
}

/** The box of a button or of a link that looks like one. */
export function buttonBox({ kind = "primary", small, disabled }: Omit<ButtonLook, "label">): ViewStyle {
  const text = kind === "text";
  return {
    flexDirection: "row",
    alignItems: "center",
    justifyContent: "center",
    minHeight: text || small ? sizes.target : 56,
    minWidth: sizes.target,
    borderRadius: sizes.radius,
    paddingHorizontal: text ? 8 : 20,
    paddingVertical: 8,
    backgroundColor: kind === "primary" ? (disabled ? colors.line : colors.plum) : "transparent",
    borderWidth: kind === "secondary" ? 1.5 : 0,
    borderStyle: "solid",
    borderColor: disabled ? colors.line : colors.plum,
  };
}

function faceTone(kind: ButtonKind, disabled: boolean | undefined) {
  if (disabled) return "soft" as const;
  return kind === "primary" ? ("onPlum" as const) : ("plum" as const);
}

export function ButtonFace({ label, kind = "primary", icon, busy, disabled }: ButtonLook) {
  const tone = faceTone(kind, disabled);
  const color = { soft: colors.inkSoft, onPlum: colors.onPlum, plum: colors.plum }[tone];
  return (
    <View style={{ flexDirection: "row", alignItems: "center", justifyContent: "center", gap: 10, flexShrink: 1 }}>
      {busy ? <ActivityIndicator size={20} color={color} aria-hidden /> : icon ? <Icon name={icon} size={24} color={color} /> : null}
      <Text variant="strong" tone={tone} style={{ lineHeight: 20, textAlign: "center", flexShrink: 1 }}>
        {label}
      </Text>
    </View>
  );
}
