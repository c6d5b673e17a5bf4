import { useId, useState, type CSSProperties } from "react";
import { setSigns } from "./textSigns";
import { Icon } from "./Icon";
import { colors, fonts } from "./theme";

export interface SelectProps<Value extends string> {
  label: string;
  options: readonly { value: Value; label: string }[];
  value: Value;
  onChange: (value: Value) => void;
  /** one of the words of a sentence, underlined; the label is for screen readers only */
  inline?: boolean;
  /** inline, with nothing above and below: a finger finds it in a place of 48 */
  alone?: boolean;
  error?: string | undefined;
  testID?: string;
}

/** One of many from a list that the browser opens itself. The chosen one is set by the page, because a list sets no accidentals. */
export function Select<Value extends string>({
  label,
  options,
  value,
  onChange,
  inline = false,
  alone = false,
  error,
  testID,
}: SelectProps<Value>) {
  const id = useId();
  const [focused, setFocused] = useState(false);
  const shown = options.find((option) => option.value === value)?.label ?? "";
  const list = (
    <span style={{ position: "relative", ...(inline ? inWords(focused) : inField(focused, error !== undefined)) }}>
      <span aria-hidden style={{ overflow: "hidden", textOverflow: "ellipsis", whiteSpace: "nowrap" }}>
        {setSigns(shown)}
      </span>
      {!inline && <Icon name="down" size={20} color={colors.inkSoft} />}
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
        style={{
          position: "absolute",
          ...(alone ? aroundWords : { inset: 0, width: "100%", height: "100%" }),
          opacity: 0,
          cursor: "pointer",
          font: `400 16px/22px ${fonts.text}`,
        }}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </span>
  );
  if (inline) return list;
  return (
    <div style={{ display: "flex", flexDirection: "column", gap: 6, minWidth: 0 }}>
      <label htmlFor={id} style={{ font: `600 14px/18px ${fonts.text}`, color: colors.ink }}>
        {label}
      </label>
      {list}
      {error !== undefined && (
        <span
          id={`${id}-note`}
          aria-live="polite"
          style={{ font: `400 12px/16px ${fonts.text}`, color: colors.brick, display: "flex", gap: 5 }}
        >
          <Icon name="warning" size={16} color={colors.brick} />
          {error}
        </span>
      )}
    </div>
  );
}

function inField(focused: boolean, wrong: boolean): CSSProperties {
  const edge = focused ? colors.plum : wrong ? colors.brick : colors.inkSoft;
  return {
    display: "flex",
    alignItems: "center",
    justifyContent: "space-between",
    gap: 8,
    font: `400 16px/22px ${fonts.text}`,
    color: colors.ink,
    minHeight: 52,
    boxSizing: "border-box",
    border: `1.5px ${wrong ? "dashed" : "solid"} ${edge}`,
    borderRadius: 10,
    background: colors.card,
    padding: "8px 12px 8px 14px",
    boxShadow: focused ? `0 0 0 1.5px ${colors.plum}` : "none",
  };
}

/** px; wide enough for a short word, and high enough for its line of 26 */
const [beside, over] = [6, 11];
const aroundWords: CSSProperties = {
  ...{ left: -beside, width: `calc(100% + ${2 * beside}px)` },
  ...{ top: -over, height: `calc(100% + ${2 * over}px)` },
};

function inWords(focused: boolean): CSSProperties {
  return {
    display: "inline-flex",
    maxWidth: "100%",
    font: `600 16px/26px ${fonts.text}`,
    color: colors.ink,
    borderBottom: `1.5px solid ${colors.plum}`,
    ...(focused ? { outline: `2px solid ${colors.plum}`, outlineOffset: 3, borderRadius: 2 } : null),
  };
}
