import { useRef } from "react";
import { webProps } from "@/features/ui/webStyle";

/**
 * A press that counts at the moment the finger comes down, not when it leaves: what is tapped in time must not wait.
 * Keyboards and screen readers, which have no finger, count with the press.
 */
export function useTap(onTap: () => void) {
  const down = useRef(false);
  const lift = () => {
    down.current = false;
  };
  return {
    onPress: () => {
      if (!down.current) onTap();
      lift();
    },
    ...webProps({
      onPointerDown: () => {
        down.current = true;
        onTap();
      },
      onPointerLeave: lift,
      onPointerCancel: lift,
    }),
  };
}
