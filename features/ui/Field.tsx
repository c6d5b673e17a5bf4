import { useId, useState } from "react";
import { TextInput, View, type TextInputProps } from "react-native";
import { Icon } from "./Icon";
import { Text } from "./Text";
import { colors, fonts } from "./theme";
import { webProps, webStyle } from "./webStyle";

export interface FieldProps {
  label: string;
  value: string;
  onChangeText: (text: string) => void;
  onBlur?: () => void;
  /** what is wrong and what to do, in words */
  error?: string | undefined;
  hint?: string | undefined;
  placeholder?: string;
  multiline?: boolean;
  /** lines shown at first, for a multiline field */
  rows?: number;
  /** charts stand in the mono face */
  mono?: boolean;
  secure?: boolean;
  autoComplete?: TextInputProps["autoComplete"];
  inputMode?: TextInputProps["inputMode"];
  autoFocus?: boolean;
  disabled?: boolean;
  testID?: string;
}

const lineHeight = 22;

export function Field({
  label,
  value,
  onChangeText,
  onBlur,
  error,
  hint,
  multiline,
  rows = 8,
  mono,
  secure,
  autoComplete,
  disabled,
  testID,
  ...rest
}: FieldProps) {
  const id = useId();
  const noteId = `${id}-note`;
  const [focused, setFocused] = useState(false);
  const note = error ?? hint;
  // An address or a password, shown or not, is no prose: no dictionary looks at it.
  const exact =
    secure === true ||
    autoComplete === "email" ||
    autoComplete === "one-time-code" ||
    autoComplete === "new-password" ||
    autoComplete === "current-password";
  return (
    <View style={{ gap: 6 }}>
      <label htmlFor={id} style={{ font: `600 14px/18px ${fonts.text}`, color: colors.ink }}>
        {label}
      </label>
      <TextInput
        nativeID={id}
        value={value}
        onChangeText={onChangeText}
        multiline={multiline ?? false}
        secureTextEntry={secure ?? false}
        editable={disabled !== true}
        onFocus={() => setFocused(true)}
        onBlur={() => {
          setFocused(false);
          onBlur?.();
        }}
        testID={testID}
        {...(autoComplete === undefined ? null : { autoComplete })}
        {...rest}
        {...webProps({
          "aria-invalid": error === undefined ? undefined : true,
          "aria-describedby": note === undefined ? undefined : noteId,
          autoCapitalize: exact ? "none" : undefined,
        })}
        // Told here: what the sheet says of placeholders is weaker than React Native's own class.
        placeholderTextColor={colors.inkSoft}
        blurOnSubmit={false}
        spellCheck={!exact && mono !== true}
        autoCorrect={!exact && mono !== true}
        style={[
          {
            minHeight: multiline ? rows * lineHeight + 28 : 52,
            borderWidth: 1.5,
            borderStyle: error === undefined ? "solid" : "dashed",
            borderColor: focused ? colors.plum : error === undefined ? colors.inkSoft : colors.brick,
            borderRadius: 10,
            backgroundColor: colors.card,
            color: colors.ink,
            paddingHorizontal: 14,
            paddingVertical: multiline ? 12 : 8,
            fontFamily: mono ? fonts.mono : fonts.text,
            fontSize: 16,
            lineHeight,
          },
          webStyle({
            boxShadow: focused ? "0 0 0 1.5px var(--plum)" : "none",
            ...(multiline ? { resize: "vertical" } : null),
            ...(mono ? { whiteSpace: "pre", overflowX: "auto" } : null),
          }),
        ]}
      />
      {note !== undefined && (
        <View
          nativeID={noteId}
          {...(error === undefined ? null : webProps({ "aria-live": "polite" }))}
          style={{ flexDirection: "row", gap: 5, alignItems: "flex-start" }}
        >
          {error !== undefined && <Icon name="warning" size={16} color={colors.brick} />}
          <Text variant="tiny" tone={error === undefined ? "soft" : "brick"} style={{ flexShrink: 1 }}>
            {note}
          </Text>
        </View>
      )}
    </View>
  );
}
