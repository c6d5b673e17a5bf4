import { ActivityIndicator, View, type ViewStyle } from "react-native";
import { Icon, type IconName } from "./Icon";
import { Text } from "./Text";
import { colors, sizes } from "./theme";
import type { Layout } from "./useLayout";

export type ButtonKind = "primary" | "secondary" | "text";

export interface ButtonLook {
  label: string;
  kind?: ButtonKind;
  icon?: IconName;
  busy?: boolean;
  disabled?: boolean;
  /** 48 high instead of 56 */
  small?: boolean;
  /** stands at the left under text, its label's edge at the text's */
  flush?: boolean;
}

/** The box of a button or of a link that looks like one: 56 high with corners of 14 on the phone, a pill of 48 on wider screens. */
export function buttonBox(
  { kind = "primary", small, flush, disabled }: Omit<ButtonLook, "label">,
  layout: Layout,
): ViewStyle {
  const text = kind === "text";
  const phone = layout === "phone";
  const side = text ? 8 : 20;
  return {
    flexDirection: "row",
    alignItems: "center",
    justifyContent: "center",
    minHeight: text || small || !phone ? sizes.target : 56,
    minWidth: sizes.target,
    borderRadius: phone ? sizes.radius : 999,
    paddingHorizontal: side,
    paddingVertical: 8,
    backgroundColor: kind === "primary" ? (disabled ? colors.line : colors.plum) : "transparent",
    borderWidth: kind === "secondary" ? 1.5 : 0,
    borderStyle: "solid",
    borderColor: disabled ? colors.line : colors.plum,
    ...(flush && { alignSelf: "flex-start", marginLeft: -side }),
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
      {busy ? (
        <ActivityIndicator size={20} color={color} aria-hidden />
      ) : icon ? (
        <Icon name={icon} size={24} color={color} />
      ) : null}
      <Text variant="strong" tone={tone} style={{ lineHeight: 20, textAlign: "center", flexShrink: 1 }}>
        {label}
      </Text>
    </View>
  );
}
