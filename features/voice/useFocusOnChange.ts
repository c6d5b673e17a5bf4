import { useEffect, useRef } from "react";
import type { RecorderState } from "./recorder/recorder";

/** The button that was pressed is gone with its step: the focus goes on to the new heading, or to Stop while listening. */
export function useFocusOnChange(step: RecorderState["step"]): void {
  const before = useRef(step);
  useEffect(() => {
    if (before.current === step) return;
    before.current = step;
    if (step === "asking" || step === "stopping" || step === "listening" || step === "counting") return;
    document.querySelector<HTMLElement>("h1")?.focus({ preventScroll: true });
    window.scrollTo(0, 0);
  }, [step]);
}
