import { useId } from "react";
import { Pressable, View } from "react-native";
import { RadioDot } from "./RadioDot";
import { Text } from "./Text";
import { colors } from "./theme";
import { useRadioKeys } from "./useRadioKeys";
import { webProps } from "./webStyle";

export interface ChoiceProps<Value extends string> {
  label: string;
  options: readonly { value: Value; label: string; hint?: string }[];
  value: Value | null;
  onChange: (value: Value) => void;
  /** keeps the label for screen readers only */
  hideLabel?: boolean;
  testID?: string;
}

/** A radio group, one option under the other. */
export function Choice<Value extends string>({
  label,
  options,
  value,
  onChange,
  hideLabel = false,
  testID,
}: ChoiceProps<Value>) {
  const labelId = useId();
  const keys = useRadioKeys(
    options.map((option) => option.value),
    value,
    onChange,
  );
  return (
    <View
      role="radiogroup"
      testID={testID}
      {...(hideLabel ? { "aria-label": label } : { "aria-labelledby": labelId })}
      style={{ gap: 8 }}
    >
      {!hideLabel && (
        <Text variant="label" nativeID={labelId} style={{ fontWeight: "600", lineHeight: 18 }}>
          {label}
        </Text>
      )}
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
              flexDirection: "row",
              alignItems: "center",
              gap: 12,
              minHeight: 52,
              paddingHorizontal: 14,
              paddingVertical: 8,
              borderRadius: 10,
              borderWidth: 1.5,
              borderColor: on ? colors.plum : colors.line,
              backgroundColor: colors.card,
            }}
          >
            <RadioDot on={on} />
            <View style={{ flexShrink: 1, flexGrow: 1 }}>
              <Text variant="body" style={{ fontWeight: on ? "600" : "400" }}>
                {option.label}
              </Text>
              {option.hint !== undefined && (
                <Text variant="small" tone="soft">
                  {option.hint}
                </Text>
              )}
            </View>
          </Pressable>
        );
      })}
    </View>
  );
}
