// The same sentences as in the contract; its schema would bring the whole validator into the page.

/** What is wrong with a password to be; null if nothing. */
export function checkNewPassword(password: string): string | null {
  if (password.length < 12) return "Use at least 12 characters.";
  return password.length > 128 ? "Use at most 128 characters." : null;
}

/** What is wrong with a password that exists already; null if nothing. */
export function checkKnownPassword(password: string): string | null {
  return password === "" ? "Type your password." : null;
}
