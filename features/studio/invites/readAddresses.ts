/** What was typed or pasted as addresses, taken apart. */
export interface ReadAddresses {
  /** each once, in the order in which they stand */
  emails: string[];
  /** what does not look like an address */
  unread: string[];
}

/** How many are invited at once at most. */
const mostAtOnce = 50;

const address = /^[^\s@<>]+@[^\s@<>.]+(?:\.[^\s@<>.]+)+$/;

/**
 * Addresses out of a text: one a line, or with commas or semicolons between them; a name before an address in angle
 * brackets is left out, as mail programs write it. The server looks closer.
 */
export function readAddresses(text: string): ReadAddresses {
  const emails: string[] = [];
  const unread: string[] = [];
  for (const piece of text.split(/[\n,;]+/)) {
    const words = piece.trim();
    if (words === "") continue;
    const bracketed = /<([^<>]*)>\s*$/.exec(words)?.[1]?.trim();
    const found = bracketed !== undefined ? [bracketed] : words.split(/\s+/);
    if (found.every((each) => address.test(each))) emails.push(...found.map((each) => each.toLowerCase()));
    else unread.push(words);
  }
  return { emails: [...new Set(emails)], unread };
}

/** What is wrong with what was typed; null if nothing. */
export function checkAddresses(text: string): string | null {
  const { emails, unread } = readAddresses(text);
  if (unread.length > 0) return `This is not an e-mail address: ${unread[0]!.slice(0, 80)}`;
  if (emails.length === 0) return "Write at least one address.";
  return emails.length > mostAtOnce ? `Invite at most ${mostAtOnce} at a time; these are ${emails.length}.` : null;
}
