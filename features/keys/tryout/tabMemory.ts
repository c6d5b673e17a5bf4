/** What a tab remembers over a reload; without storage it only loses the safety against one. */
export function remember(name: string, value: unknown): void {
  try {
    if (value === null) sessionStorage.removeItem(name);
    else sessionStorage.setItem(name, JSON.stringify(value));
  } catch {
    // A browser that forbids storage.
  }
}

export function recall<Value>(name: string): Value | null {
  try {
    const found = sessionStorage.getItem(name);
    return found === null ? null : (JSON.parse(found) as Value);
  } catch {
    return null;
  }
}
