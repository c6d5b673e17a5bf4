import { useRef } from "react";
import { View } from "react-native";
import Svg, { Path } from "react-native-svg";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import { webProps, webStyle } from "@/features/ui/webStyle";

/** A shift of the whole song by semitones. */
export interface LadderShift {
  value: number;
  min: number;
  max: number;
  /** the key it leads to, glyphs: "F" */
  name: string;
  /** what is said of it besides, such as its score */
  says?: string;
  onChange: (semitones: number) => void;
}

/** The shift that a key leads to; null where the key means nothing here. */
export function shiftForKey(key: string, shift: Pick<LadderShift, "value" | "min" | "max">): number | null {
  const steps: Record<string, number> = {
    ArrowUp: 1,
    ArrowRight: 1,
    ArrowDown: -1,
    ArrowLeft: -1,
    PageUp: 12,
    PageDown: -12,
  };
  if (key === "Home") return shift.min;
  if (key === "End") return shift.max;
  const step = steps[key];
  return step === undefined ? null : clampShift(shift.value + step, shift);
}

/** The shift after dragging by `dy` px (down is positive), snapped to semitones. */
export function shiftForDrag(start: number, dy: number, step: number, shift: Pick<LadderShift, "min" | "max">): number {
  return clampShift(start - Math.round(dy / step), shift);
}

function clampShift(value: number, { min, max }: Pick<LadderShift, "min" | "max">): number {
  return Math.min(max, Math.max(min, value));
}

/** "5 up", "2 down", "as written". */
export function shiftWords(semitones: number): string {
  if (semitones === 0) return "as written";
  return `${Math.abs(semitones)} ${semitones > 0 ? "up" : "down"}`;
}

interface PointerLike {
  clientY: number;
  pointerId: number;
  currentTarget: { setPointerCapture: (id: number) => void };
}

/** The handle of the ladder, 48 wide and 112 high: drags the song by whole semitones, arrow keys do the same. */
export function ShiftHandle({
  shift,
  step,
  top,
  right,
}: {
  shift: LadderShift;
  step: number;
  top: number;
  right: number;
}) {
  const grip = useRef<{ y: number; value: number } | null>(null);
  const set = (next: number | null) => {
    if (next !== null && next !== shift.value) shift.onChange(next);
  };
  return (
    <View
      role="slider"
      aria-label="Move the song"
      aria-valuemin={shift.min}
      aria-valuemax={shift.max}
      aria-valuenow={shift.value}
      aria-valuetext={[shift.name, shiftWords(shift.value), shift.says].filter(Boolean).join(", ")}
      {...webProps({
        tabIndex: 0,
        "aria-orientation": "vertical",
        onKeyDown: (event: { key: string; preventDefault: () => void }) => {
          const next = shiftForKey(event.key, shift);
          if (next === null) return;
          event.preventDefault();
          set(next);
        },
        onPointerDown: (event: PointerLike) => {
          event.currentTarget.setPointerCapture(event.pointerId);
          grip.current = { y: event.clientY, value: shift.value };
        },
        onPointerMove: (event: PointerLike) => {
          if (grip.current) set(shiftForDrag(grip.current.value, event.clientY - grip.current.y, step, shift));
        },
        onPointerUp: () => {
          grip.current = null;
        },
        onPointerCancel: () => {
          grip.current = null;
        },
      })}
      style={[
        {
          position: "absolute",
          top,
          right,
          width: 48,
          height: 112,
          borderRadius: 24,
          borderWidth: 1.5,
          borderColor: colors.plum,
          backgroundColor: colors.card,
          alignItems: "center",
          justifyContent: "space-between",
          paddingVertical: 14,
        },
        webStyle({ cursor: "grab", touchAction: "none", userSelect: "none" }),
      ]}
    >
      <Svg width={12} height={10} viewBox="0 0 12 10" aria-hidden>
        <Path d="M0 9.8h12l-6-9.6z" fill={colors.plum} />
      </Svg>
      <View aria-hidden style={{ alignItems: "center" }}>
        <Text style={{ fontFamily: fonts.display, fontWeight: "700", fontSize: 20, lineHeight: 24 }}>{shift.name}</Text>
        <Text variant="tiny" tone="soft" style={{ textAlign: "center", lineHeight: 13 }}>
          {shift.value === 0 ? "written" : shiftWords(shift.value)}
        </Text>
      </View>
      <Svg width={12} height={10} viewBox="0 0 12 10" aria-hidden>
        <Path d="M0 .2h12l-6 9.6z" fill={colors.plum} />
      </Svg>
    </View>
  );
}
