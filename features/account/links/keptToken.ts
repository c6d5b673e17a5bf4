const key = "larkspan.confirm-link";
let spare: string | null = null;

/** Keeps the token of a link over a sign-in, in this tab only. */
export const keptToken = {
  read(): string {
    try {
      return sessionStorage.getItem(key) ?? spare ?? "";
    } catch {
      return spare ?? "";
    }
  },
  keep(token: string): void {
    spare = token;
    try {
      sessionStorage.setItem(key, token);
    } catch {
      // Where storage is shut off it lives until the page is loaded anew.
    }
  },
  clear(): void {
    spare = null;
    try {
      sessionStorage.removeItem(key);
    } catch {
      return;
    }
  },
};
