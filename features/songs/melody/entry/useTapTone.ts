import { useCallback, useEffect, useRef } from "react";
import { createTapTone, type TapTone } from "./tapTone";

/** The tone of this page: opened with the first note that is asked for, closed with the page. */
export function useTapTone(): () => TapTone {
  const tone = useRef<TapTone | null>(null);
  useEffect(
    () => () => {
      tone.current?.close();
      tone.current = null;
    },
    [],
  );
  return useCallback(() => (tone.current ??= createTapTone()), []);
}
