import { useState } from "react";
import type { KeptToken } from "./keptTokens";
import { useMailedToken } from "./useMailedToken";

/** The token of the address, or the one that was kept while its owner signed in. */
export function useTokenOverSignIn(kept: KeptToken): string {
  const mailed = useMailedToken();
  const [token] = useState(() => {
    if (mailed !== "") kept.keep(mailed);
    return mailed || kept.read();
  });
  return token;
}
