import { useState } from "react";

const storageKey = "larkspan-count-in";

/** Whether this device counts in before it listens; off until somebody wants it. */
export function useCountInSetting(): [boolean, (on: boolean) => void] {
  const [on, setOn] = useState(read);
  const choose = (next: boolean) => {
    setOn(next);
    try {
      window.localStorage.setItem(storageKey, next ? "on" : "off");
    } catch {
      // Storage may be shut off; the choice then lasts for this visit.
    }
  };
  return [on, choose];
}

/** For a take that is begun without the page that asks. */
export function wantsCountIn(): boolean {
  return read();
}

function read(): boolean {
  try {
    return window.localStorage.getItem(storageKey) === "on";
  } catch {
    return false;
  }
}
