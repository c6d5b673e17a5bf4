const storageKey = "larkspan.unread-file";

/** The name of a recording that this tab began to read and never got to the end of; null where there is none. */
export function unreadFile(): string | null {
  try {
    return sessionStorage.getItem(storageKey);
  } catch {
    return null;
  }
}

export function noteUnreadFile(name: string | null): void {
  try {
    if (name === null) sessionStorage.removeItem(storageKey);
    else sessionStorage.setItem(storageKey, name);
  } catch {
    // A browser that forbids storage says nothing after a reload.
  }
}
