import { useId, useState } from "react";
import { Icon } from "./Icon";
import { colors, fonts } from "./theme";

export interface SelectProps<Value extends string> {
  label: string;
  options: readonly { value: Value; label: string }[];
  value: Value;
  onChange: (value: Value) => void;
  /** one of the words of a sentence, underlined; the label is for screen readers only */
  inline?: boolean;
  error?: string | undefined;
  testID?: string;
}

/** One of many from a list that the browser opens itself. */
export function Select<Value extends string>({ label, options, value, onChange, inline = false, error, testID }: SelectProps<Value>) {
  const id = useId();
  const [focused, setFocused] = useState(false);
  const list = (
    <select
      id={id}
      value={value}
      data-testid={testID}
      aria-label={inline ? label : undefined}
      aria-invalid={error === undefined ? undefined : true}
      aria-describedby={error === undefined ? undefined : `${id}-note`}
      onChange={(event) => onChange(event.target.value as Value)}
      onFocus={() => setFocused(true)}
      onBlur={() => setFocused(false)}
      style={inline ? inWords(focused) : inField(focused, error !== undefined)}
    >
      {options.map((option) => (
        <option key={option.value} value={option.value}>
          {option.label}
        </option>
      ))}
    </select>
  );
  if (inline) return list;
  return (
    <div style={{ display: "flex", flexDirection: "column", gap: 6, minWidth: 0 }}>
      <label htmlFor={id} style={{ font: `600 14px/18px ${fonts.text}`, color: colors.ink }}>
        {label}
      </label>
      <div style={{ position: "relative", display: "grid" }}>
        {list}
        <span style={{ position: "absolute", right: 12, top: 16, height: 20, pointerEvents: "none" }}>
          <Icon name="down" size={20} color={colors.inkSoft} />
        </span>
      </div>
      {error !== undefined && (
        <span id={`${id}-note`} aria-live="polite" style={{ font: `400 12px/16px ${fonts.text}`, color: colors.brick, display: "flex", gap: 5 }}>
          <Icon name="warning" size={16} color={colors.brick} />
          {error}
        </span>
      )}
    </div>
  );
}

const face = { appearance: "none", color: colors.ink, margin: 0 } as const;

function inField(focused: boolean, wrong: boolean): React.CSSProperties {
  const edge = focused ? colors.plum : wrong ? colors.brick : colors.inkSoft;
  return {
    ...face,
    font: `400 16px/22px ${fonts.text}`,
    minHeight: 52,
    minWidth: 0,
    border: `1.5px ${wrong ? "dashed" : "solid"} ${edge}`,
    borderRadius: 10,
    background: colors.card,
    padding: "8px 40px 8px 14px",
    boxShadow: focused ? `0 0 0 1.5px ${colors.plum}` : "none",
  };
}

function inWords(focused: boolean): React.CSSProperties {
  return {
    ...face,
    font: `600 16px/24px ${fonts.text}`,
    minHeight: 32,
    maxWidth: "100%",
    border: 0,
    borderBottom: `1.5px solid ${colors.plum}`,
    borderRadius: focused ? 4 : 0,
    background: "transparent",
    padding: 0,
    textOverflow: "ellipsis",
    ...(focused ? { outline: `2px solid ${colors.plum}`, outlineOffset: 3 } : null),
  };
}
