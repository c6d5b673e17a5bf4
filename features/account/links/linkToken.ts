const key = "larkspan.confirm-link";
let spare: string | null = null;

/** The token behind the # of a link from a mail; "" where there is none. */
export function tokenInAddress(): string {
  const token = window.location.hash.slice(1);
  return /^[\w-]{1,200}$/.test(token) ? token : "";
}

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
