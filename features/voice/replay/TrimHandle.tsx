import { useEffect, useRef } from "react";
import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webProps, webStyle } from "@/features/ui/webStyle";
import type { TakePart } from "../recorder/takeProtocol";

/** The handles keep this distance: less is never enough to read notes from. */
export const leastPartS = 2;
/** Keys come in rows; the part is read when they pause. */
const keyPauseMs = 600;

export interface TrimHandleProps {
  end: "start" | "end";
  part: TakePart;
  seconds: number;
  /** px that the whole take is wide, and where it begins */
  width: number;
  left: number;
  height: number;
  disabled: boolean;
  /** while it moves */
  onChange: (part: TakePart) => void;
  /** when it rests */
  onCommit: (part: TakePart) => void;
}

/** One end of the part that is used: dragged, or moved by the arrow keys. */
export function TrimHandle({ end, part, seconds, width, left, height, disabled, onChange, onCommit }: TrimHandleProps) {
  const at = end === "start" ? part.startS : part.endS;
  const from = end === "start" ? 0 : Math.min(seconds, part.startS + leastPartS);
  const to = end === "start" ? Math.max(0, part.endS - leastPartS) : seconds;
  const grip = useRef<number | null>(null);
  const latest = useRef(part);
  const pause = useRef<ReturnType<typeof setTimeout> | null>(null);
  useEffect(() => () => void (pause.current && clearTimeout(pause.current)), []);
  const move = (wanted: number) => {
    const tenths = Math.round(wanted * 10) / 10;
    const next = Math.max(from, Math.min(to, tenths >= seconds - 0.05 && end === "end" ? seconds : tenths));
    latest.current = end === "start" ? { ...part, startS: next } : { ...part, endS: next };
    onChange(latest.current);
  };
  const pointer = {
    onPointerDown: (event: React.PointerEvent<HTMLElement>) => {
      if (disabled) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      latest.current = part;
      grip.current = event.clientX - (at / seconds) * width;
    },
    onPointerMove: (event: React.PointerEvent<HTMLElement>) => {
      if (grip.current !== null) move(((event.clientX - grip.current) / width) * seconds);
    },
    onPointerUp: () => {
      if (grip.current !== null) onCommit(latest.current);
      grip.current = null;
    },
    onPointerCancel: () => {
      if (grip.current !== null) onCommit(latest.current);
      grip.current = null;
    },
    onKeyDown: (event: React.KeyboardEvent<HTMLElement>) => {
      const next = timeForKey(event.key, at, from, to);
      if (next === null || disabled) return;
      event.preventDefault();
      move(next);
      if (pause.current) clearTimeout(pause.current);
      pause.current = setTimeout(() => onCommit(latest.current), keyPauseMs);
    },
  };
  return (
    <View
      role="slider"
      aria-label={end === "start" ? "Start of the part that is used" : "End of the part that is used"}
      aria-valuemin={Math.round(from * 10) / 10}
      aria-valuemax={Math.round(to * 10) / 10}
      aria-valuenow={Math.round(at * 10) / 10}
      aria-valuetext={`${at.toFixed(1)} seconds`}
      aria-disabled={disabled}
      testID={`trim-${end}`}
      {...webProps({ tabIndex: 0, ...pointer })}
      style={[
        {
          position: "absolute",
          left: left + (at / seconds) * width - 22,
          top: 0,
          width: 44,
          height: height + 44,
          alignItems: "center",
        },
        webStyle({ cursor: disabled ? "default" : "ew-resize", touchAction: "none", userSelect: "none" }),
      ]}
    >
      <View style={{ width: 2, height, backgroundColor: colors.plum }} />
      <View
        style={{
          minWidth: 44,
          height: 32,
          borderRadius: 16,
          backgroundColor: disabled ? colors.inkSoft : colors.plum,
          alignItems: "center",
          justifyContent: "center",
        }}
      >
        <Text variant="tiny" tone="onPlum" style={{ fontWeight: "600" }}>
          {at.toFixed(1)}
        </Text>
      </View>
    </View>
  );
}

/** Where a key leads a handle, in seconds; null where the key means nothing here. */
export function timeForKey(key: string, at: number, from: number, to: number): number | null {
  const steps: Record<string, number> = {
    ArrowLeft: -0.1,
    ArrowDown: -0.1,
    ArrowRight: 0.1,
    ArrowUp: 0.1,
    PageDown: -1,
    PageUp: 1,
  };
  if (key === "Home") return from;
  if (key === "End") return to;
  const step = steps[key];
  return step === undefined ? null : Math.max(from, Math.min(to, at + step));
}
