/** Lengths to enter notes with, in quarter notes. */
export const noteLengths = [
  { value: "0.5", label: "Eighth" },
  { value: "0.75", label: "Dotted eighth" },
  { value: "1", label: "Quarter" },
  { value: "1.5", label: "Dotted quarter" },
  { value: "2", label: "Half" },
  { value: "3", label: "Dotted half" },
  { value: "4", label: "Whole" },
] as const;

export type NoteLength = (typeof noteLengths)[number]["value"];

/** A length as the lists show it, in quarter notes: "½", "1½", "0.8". */
export function lengthSign(duration: number): string {
  const whole = Math.floor(duration);
  const part = { 0: "", 0.25: "¼", 0.5: "½", 0.75: "¾" }[duration - whole];
  if (part === undefined) return duration.toFixed(duration < 1 ? 2 : 1);
  return whole === 0 ? part : `${whole}${part}`;
}

/** The same for those who listen to it. */
export function lengthWords(duration: number): string {
  const known = noteLengths.find(({ value }) => Number(value) === duration);
  if (known) return known.label.toLowerCase();
  return `${Math.round(duration * 100) / 100} beats`;
}

/** The next longer or shorter of the usual lengths. */
export function nextLength(duration: number, by: 1 | -1): number {
  const usual = [0.25, ...noteLengths.map(({ value }) => Number(value)), 6, 8];
  const next =
    by === 1 ? usual.find((each) => each > duration + 0.01) : usual.findLast((each) => each < duration - 0.01);
  return next ?? duration;
}
