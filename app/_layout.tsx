import { QueryClientProvider } from "@tanstack/react-query";
import { Slot } from "expo-router";
import { queryClient } from "@/features/api/queryClient";
import { SessionProvider, useSession } from "@/features/api/SessionProvider";
import { Shell } from "@/features/ui/Shell";
import { ThemeProvider } from "@/features/ui/ThemeProvider";

function Surroundings() {
  const { account } = useSession();
  return (
    <Shell initial={account ? account.email.charAt(0).toUpperCase() : null}>
      <Slot />
    </Shell>
  );
}

export default function RootLayout() {
  return (
    <ThemeProvider>
      <QueryClientProvider client={queryClient}>
        <SessionProvider>
          <Surroundings />
        </SessionProvider>
      </QueryClientProvider>
    </ThemeProvider>
  );
}
