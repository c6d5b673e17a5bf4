const storageKey = "larkspan-under-16";

/** Whether the singer of this voice said on this device that they are under 16. */
export function isUnder16(voiceId: string | null): boolean {
  return voiceId !== null && stored().includes(voiceId);
}

/** Remembers it on this device only: nobody else needs an age. */
export function rememberAge(voiceId: string, under16: boolean): void {
  const others = stored().filter((id) => id !== voiceId);
  try {
    localStorage.setItem(storageKey, JSON.stringify(under16 ? [...others, voiceId] : others));
  } catch {
    // Storage may be shut off; the question is then asked afresh.
  }
}

function stored(): string[] {
  try {
    const ids: unknown = JSON.parse(localStorage.getItem(storageKey) ?? "[]");
    return Array.isArray(ids) ? ids.filter((id) => typeof id === "string") : [];
  } catch {
    return [];
  }
}
