const key = "larkspan.has-session";
const open = "1";
const over = "ended";

// Where storage is refused the flag lives for this page only.
let spare: string | null | undefined;

function read(): string | null {
  try {
    return localStorage.getItem(key);
  } catch {
    // Nothing can be remembered here, so the cookie has to be asked once.
    return spare === undefined ? open : spare;
  }
}

function write(value: string | null): void {
  spare = value;
  try {
    if (value === null) localStorage.removeItem(key);
    else localStorage.setItem(key, value);
  } catch {
    return;
  }
}

/** What another tab did to the session. */
export type HintChange = "opened" | "ended" | "signed-out";

/**
 * Remembers that a session may exist, so that first-time visitors send no refresh that must fail, and that one ran out,
 * so that its owner is not taken for a stranger. Holds no secret.
 */
export const sessionHint = {
  present: () => read() === open,
  ended: () => read() === over,
  set: () => write(open),
  end: () => write(over),
  clear: () => write(null),
  /** Tells about changes made by other tabs. */
  onChange(listener: (change: HintChange) => void): () => void {
    if (typeof window === "undefined") return () => undefined;
    const heard = ({ key: changed, newValue }: StorageEvent) => {
      if (changed === key) listener(newValue === null ? "signed-out" : newValue === over ? "ended" : "opened");
    };
    window.addEventListener("storage", heard);
    return () => window.removeEventListener("storage", heard);
  },
};
