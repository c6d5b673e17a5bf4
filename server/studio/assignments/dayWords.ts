/** A day such as "2026-12-10" as mails say it: "10 December". */
export function dayWords(day: string): string {
  return new Date(`${day}T00:00:00Z`).toLocaleDateString("en-GB", { day: "numeric", month: "long", timeZone: "UTC" });
}
