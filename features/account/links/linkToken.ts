const key = "larkspan.confirm-link";
let spare: string | null = null;

/** The token behind the # of a link from a mail; "" where there is none. */
export function tokenInAddress(): string {
  const token = window.location.hash.slice(1);
  return /^[\w-]{1,200}$/.test(token) ? token : "";
}

/** Takes the token out of the address, so that it is not left in the history or sent on by mistake. For an effect. */
export function clearAddress(): () => void {
  dropHash();
  // The router writes the address it began with once more when it is ready, which may be after this page.
  const timers = [0, 500, 2000].map((ms) => setTimeout(dropHash, ms));
  return () => timers.forEach(clearTimeout);
}

function dropHash(): void {
  if (window.location.hash === "") return;
  window.history.replaceState(window.history.state, "", window.location.pathname + window.location.search);
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
