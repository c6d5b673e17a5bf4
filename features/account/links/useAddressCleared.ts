import { useRouter } from "expo-router";
import { useEffect } from "react";

/**
 * Takes the token out of the address, so that it is not left in the history or sent on by mistake. The router is told:
 * it writes the address by what it knows of the page, and would write the token there again.
 */
export function useAddressCleared(): void {
  const router = useRouter();
  useEffect(() => router.setParams({ "#": undefined }), [router]);
}
