import { useId } from "react";
import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";

export interface DayFieldProps {
  label: string;
  /** "2026-12-10"; "" for none */
  value: string;
  onChange: (day: string) => void;
  error?: string | undefined;
  testID?: string;
}

/** A day of the calendar, chosen with what the browser brings for it. */
export function DayField({ label, value, onChange, error, testID }: DayFieldProps) {
  const id = useId();
  return (
    <View style={{ gap: 6 }}>
      <label htmlFor={id} style={{ font: `600 14px/18px ${fonts.text}`, color: colors.ink }}>
        {label}
      </label>
      <input
        id={id}
        type="date"
        value={value}
        onChange={(event) => onChange(event.target.value)}
        data-testid={testID}
        aria-invalid={error === undefined ? undefined : true}
        aria-describedby={error === undefined ? undefined : `${id}-note`}
        style={{
          boxSizing: "border-box",
          width: "100%",
          minHeight: 52,
          border: `1.5px ${error === undefined ? "solid" : "dashed"} ${error === undefined ? colors.inkSoft : colors.brick}`,
          borderRadius: 10,
          background: colors.card,
          color: colors.ink,
          padding: "8px 14px",
          font: `400 16px/22px ${fonts.text}`,
        }}
      />
      {error !== undefined && (
        <View nativeID={`${id}-note`}>
          <Text variant="tiny" tone="brick">
            {error}
          </Text>
        </View>
      )}
    </View>
  );
}
