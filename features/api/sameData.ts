/** Equal as JSON data, whatever the order of the properties. */
export function sameData(a: unknown, b: unknown): boolean {
  const sorted = (_: string, value: unknown) =>
    value !== null && typeof value === "object" && !Array.isArray(value)
      ? Object.fromEntries(Object.entries(value).sort(([x], [y]) => (x < y ? -1 : 1)))
      : value;
  return JSON.stringify(a, sorted) === JSON.stringify(b, sorted);
}
