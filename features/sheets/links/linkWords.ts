import type { SheetLink } from "@/shared/contract/sheetLink";

const day = (instant: string) =>
  new Date(instant).toLocaleDateString("en-GB", { day: "numeric", month: "long", year: "numeric" });

/** How a link stands, in a line; `now` as an ISO instant. */
export function linkState(
  { expiresAt, revokedAt, openedAt }: SheetLink,
  now: string,
): { live: boolean; words: string } {
  if (revokedAt !== null) return { live: false, words: `Ended by you on ${day(revokedAt)}` };
  if (expiresAt <= now) return { live: false, words: `Ran out on ${day(expiresAt)}` };
  const opened = openedAt === null ? "not opened yet" : `last opened on ${day(openedAt)}`;
  return { live: true, words: `Open until ${day(expiresAt)}, ${opened}` };
}

/** Until when a shared sheet can be seen. */
export function untilWords(expiresAt: string): string {
  return `This link works until ${day(expiresAt)}.`;
}
