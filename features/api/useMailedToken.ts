import { useRouter } from "expo-router";
import { useEffect, useState } from "react";

const tokenShape = /^[\w-]{1,200}$/;

function tokenInAddress(): string {
  const token = window.location.hash.slice(1);
  return tokenShape.test(token) ? token : "";
}

/**
 * The token of a mailed link, behind the # of the page's address so that it reaches no server's log; "" where there is
 * none. It is taken out of the address, so that it is not left in the history or sent on by mistake. A second link opened
 * on the page of the first changes the # only, so the page begins anew with it.
 */
export function useMailedToken(): string {
  const router = useRouter();
  const [token] = useState(tokenInAddress);
  const [begun, setBegun] = useState(false);
  // The router's own first effect, which runs after those of its pages, writes the address with all that it found there.
  useEffect(() => setBegun(true), []);
  useEffect(() => {
    // An absent "#" it would write as a word, an empty one not at all.
    if (begun) router.setParams({ "#": "" });
  }, [begun, router]);
  useEffect(() => {
    const begin = () => {
      if (tokenInAddress() !== "") window.location.reload();
    };
    window.addEventListener("hashchange", begin);
    return () => window.removeEventListener("hashchange", begin);
  }, []);
  return token;
}
