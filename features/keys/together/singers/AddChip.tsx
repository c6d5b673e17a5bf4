import { Pressable, View } from "react-native";
import { Icon } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { webProps, webStyle } from "@/features/ui/webStyle";

export interface AddChipProps {
  label: string;
  /** the notes */
  hint: string;
  /** for a singer that can be there once: whether it is */
  pressed?: boolean;
  onPress: () => void;
  testID: string;
}

/** Adds one singer at a tap; one that can be there once goes again at the next. */
export function AddChip({ label, hint, pressed, onPress, testID }: AddChipProps) {
  return (
    <Pressable
      role="button"
      onPress={onPress}
      testID={testID}
      {...webProps({ "aria-pressed": pressed })}
      style={{
        flexDirection: "row",
        alignItems: "center",
        gap: 6,
        minHeight: 48,
        paddingLeft: 10,
        paddingRight: 14,
        borderRadius: 999,
        borderWidth: 1,
        borderColor: pressed ? colors.plum : colors.inkSoft,
        backgroundColor: pressed ? mixtures.soft : colors.card,
      }}
    >
      <Icon name={pressed ? "check" : "plus"} size={18} color={colors.plum} />
      <View style={{ flexShrink: 1 }}>
        <Text variant="label" style={{ lineHeight: 18 }}>
          <Text style={webStyle(unseen)}>{pressed ? "" : "Add "}</Text>
          {label}
        </Text>
        <Text variant="tiny" tone="soft" style={{ lineHeight: 15 }}>
          {hint}
        </Text>
      </View>
    </Pressable>
  );
}
