import { useRouter } from "expo-router";
import { useEffect } from "react";

/**
 * Takes the token out of the address, so that it is not left in the history or sent on by mistake: out of the browser's
 * first, because the router carries on whatever it finds there, then out of what the router knows of the page, because it
 * writes the address by that. An absent "#" it would write as a word, an empty one not at all.
 */
export function useAddressCleared(): void {
  const router = useRouter();
  useEffect(() => {
    window.history.replaceState(window.history.state, "", window.location.pathname + window.location.search);
    router.setParams({ "#": "" });
  }, [router]);
}
