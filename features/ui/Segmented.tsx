import { Pressable, View } from "react-native";
import { Text } from "./Text";
import { colors, sizes } from "./theme";
import { useRadioKeys } from "./useRadioKeys";
import { webProps } from "./webStyle";

export interface SegmentedProps<Value extends string> {
  options: readonly { value: Value; label: string }[];
  value: Value;
  onChange: (value: Value) => void;
  /** what is chosen here, in words */
  label: string;
  testID?: string;
}

/** A few short options side by side, one of them chosen. */
export function Segmented<Value extends string>({ options, value, onChange, label, testID }: SegmentedProps<Value>) {
  const keys = useRadioKeys(
    options.map((option) => option.value),
    value,
    onChange,
  );
  return (
    <View
      role="radiogroup"
      aria-label={label}
      testID={testID}
      style={{
        flexDirection: "row",
        borderRadius: sizes.radius,
        borderWidth: 1.5,
        borderColor: colors.inkSoft,
        backgroundColor: colors.card,
        padding: 3,
        gap: 3,
      }}
    >
      {options.map((option, index) => {
        const on = option.value === value;
        return (
          <Pressable
            key={option.value}
            role="radio"
            aria-checked={on}
            onPress={() => onChange(option.value)}
            {...webProps(keys(index))}
            style={{
              flexGrow: 1,
              flexShrink: 1,
              minHeight: 44,
              alignItems: "center",
              justifyContent: "center",
              paddingHorizontal: 10,
              borderRadius: 11,
              backgroundColor: on ? colors.plum : "transparent",
            }}
          >
            <Text
              variant="label"
              tone={on ? "onPlum" : "ink"}
              style={{ fontWeight: on ? "600" : "500", textAlign: "center" }}
            >
              {option.label}
            </Text>
          </Pressable>
        );
      })}
    </View>
  );
}
