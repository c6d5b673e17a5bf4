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

/** What is wrong with an address, as far as can be said here; the server looks closer. */
export function checkAddress(email: string): string | null {
  return email.trim() === "" ? "Type your e-mail address." : null;
}

/** What is wrong with a code of the app or a recovery code; null if nothing. */
export function checkCode(code: string): string | null {
  return code.trim().length < 6 ? "Type the six digits, or a recovery code." : null;
}
