const key = "larkspan.has-session";

// Where storage is refused the flag lives for this page only.
let spare: boolean | null = null;

/** Remembers that a session may exist, so that first-time visitors send no refresh that must fail. Holds no secret. */
export const sessionHint = {
  present(): boolean {
    try {
      return localStorage.getItem(key) !== null;
    } catch {
      // Nothing can be remembered here, so the cookie has to be asked once.
      return spare ?? true;
    }
  },
  set(): void {
    spare = true;
    try {
      localStorage.setItem(key, "1");
    } catch {
      return;
    }
  },
  clear(): void {
    spare = false;
    try {
      localStorage.removeItem(key);
    } catch {
      return;
    }
  },
  /** Tells about changes made by other tabs. */
  onChange(listener: (present: boolean) => void): () => void {
    if (typeof window === "undefined") return () => undefined;
    const heard = (event: StorageEvent) => {
      if (event.key === key) listener(event.newValue !== null);
    };
    window.addEventListener("storage", heard);
    return () => window.removeEventListener("storage", heard);
  },
};
