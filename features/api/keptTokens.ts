/** A place for the token of one kind of link. */
export interface KeptToken {
  read(): string;
  keep(token: string): void;
  clear(): void;
}

function keptUnder(key: string): KeptToken {
  let spare: string | null = null;
  return {
    read() {
      try {
        return sessionStorage.getItem(key) ?? spare ?? "";
      } catch {
        return spare ?? "";
      }
    },
    keep(token) {
      spare = token;
      try {
        sessionStorage.setItem(key, token);
      } catch {
        // Where storage is shut off it lives until the page is loaded anew.
      }
    },
    clear() {
      spare = null;
      try {
        sessionStorage.removeItem(key);
      } catch {
        return;
      }
    },
  };
}

/** Tokens of mailed links that are kept over a sign-in, in this tab only. */
export const keptTokens = { confirm: keptUnder("larkspan.confirm-link"), invite: keptUnder("larkspan.invite-link") };
