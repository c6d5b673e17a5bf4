import { Pressable, View } from "react-native";
import { Text } from "./Text";
import { colors } from "./theme";
import { webProps } from "./webStyle";

export interface SwitchProps {
  label: string;
  hint?: string;
  on: boolean;
  onChange: (on: boolean) => void;
  testID?: string;
}

/** On or off, at once. */
export function Switch({ label, hint, on, onChange, testID }: SwitchProps) {
  return (
    <Pressable
      role="switch"
      aria-checked={on}
      onPress={() => onChange(!on)}
      testID={testID}
      {...webProps({
        // The web renderer lets Space press buttons only.
        onKeyDown: (event: React.KeyboardEvent) => {
          if (event.key !== " ") return;
          event.preventDefault();
          onChange(!on);
        },
      })}
      style={{ flexDirection: "row", alignItems: "center", gap: 12, minHeight: 48 }}
    >
      <View
        style={{
          width: 46,
          height: 26,
          borderRadius: 13,
          borderWidth: 1.5,
          borderColor: on ? colors.plum : colors.inkSoft,
          backgroundColor: on ? colors.plum : "transparent",
          justifyContent: "center",
          alignItems: on ? "flex-end" : "flex-start",
          paddingHorizontal: 3,
        }}
      >
        <View
          style={{ width: 17, height: 17, borderRadius: 9, backgroundColor: on ? colors.onPlum : colors.inkSoft }}
        />
      </View>
      <View style={{ flexShrink: 1 }}>
        <Text variant="label">{label}</Text>
        {hint !== undefined && (
          <Text variant="small" tone="soft">
            {hint}
          </Text>
        )}
      </View>
    </Pressable>
  );
}
