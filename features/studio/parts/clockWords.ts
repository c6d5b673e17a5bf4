/** A time in a take: "0:42", "10:05". */
export function clockWords(seconds: number): string {
  const whole = Math.max(0, Math.floor(seconds));
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, "0")}`;
}

/** A time as it is typed, "0:42" or "42"; null where it is none, or lies after the end of the take. */
function readClock(text: string, endS: number): number | null {
  const found = /^\s*(?:(\d{1,2}):)?(\d{1,3})\s*$/.exec(text);
  if (!found) return null;
  const seconds = Number(found[1] ?? 0) * 60 + Number(found[2]);
  return seconds <= endS ? seconds : null;
}
