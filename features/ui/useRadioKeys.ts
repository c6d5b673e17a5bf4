import { useRef } from "react";
import type { View } from "react-native";

/** Where the arrow keys lead from one of `count` radio buttons; null for other keys. */
export function radioTarget(key: string, index: number, count: number): number | null {
  if (key === "ArrowRight" || key === "ArrowDown") return (index + 1) % count;
  if (key === "ArrowLeft" || key === "ArrowUp") return (index - 1 + count) % count;
  if (key === "Home") return 0;
  if (key === "End") return count - 1;
  return null;
}

/** Keyboard of a radio group: one stop for Tab, arrows choose, Space chooses. */
export function useRadioKeys<Value extends string>(
  values: readonly Value[],
  value: Value | null,
  onChange: (value: Value) => void,
) {
  const items = useRef<(View | null)[]>([]);
  const chosen = value === null ? -1 : values.indexOf(value);
  return (index: number) => ({
    ref: (item: View | null) => {
      items.current[index] = item;
    },
    tabIndex: (index === Math.max(chosen, 0) ? 0 : -1) as 0 | -1,
    onKeyDown: (event: { key: string; preventDefault: () => void }) => {
      const target = event.key === " " ? index : radioTarget(event.key, index, values.length);
      const next = target === null ? undefined : values[target];
      if (target === null || next === undefined) return;
      event.preventDefault();
      onChange(next);
      items.current[target]?.focus();
    },
  });
}
