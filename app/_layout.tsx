import { QueryClientProvider } from "@tanstack/react-query";
import { Navigator, usePathname } from "expo-router";
import { useEffect } from "react";
import { queryClient } from "@/features/api/queryClient";
import { SessionProvider, useSession } from "@/features/api/SessionProvider";
import { resumeUnsent } from "@/features/studio/takes/resumeUnsent";
import { fetchWhenIdle, type LazyPart } from "@/features/ui/fetchWhenIdle";
import { MissingChunkBoundary } from "@/features/ui/MissingChunkBoundary";
import { Shell } from "@/features/ui/Shell";
import { ThemeProvider } from "@/features/ui/ThemeProvider";

/** What is fetched on demand, so that the product works without a connection; pages that only speak with the server are left out. */
const parts: LazyPart[] = [
  () => import("./songs/index"),
  () => import("./songs/[id]/index"),
  () => import("@/shared/songs/demoSongs"),
  () => import("./songs/[id]/keys"),
  () => Promise.all([import("./songs/[id]/compare"), import("./songs/[id]/together")]),
  () => import("./songs/[id]/try"),
  () => Promise.all([import("./songs/[id]/ways"), import("./songs/[id]/why"), import("./songs/[id]/everyone")]),
  () => import("./songs/[id]/arrangements/index"),
  () => import("./songs/[id]/arrangements/[arrangementId]"),
  () => import("@/features/ways/search/waySearch").then(({ openWaySearch }) => openWaySearch()),
  () => import("./songs/[id]/sheet"),
  () => import("./songs/[id]/stage"),
  () => import("./shared/[token]/index"),
  () => import("./shared/[token]/stage"),
  () => import("./songs/[id]/edit"),
  () => import("./songs/[id]/history"),
  () => import("./songs/[id]/melody"),
  () => import("./songs/[id]/recording"),
  () => import("./songs/new"),
  () => import("./songs/import"),
  () => import("./voice/index"),
  () => Promise.all([import("./voice/sing"), import("./voice/guided")]),
  () => Promise.all([import("./voice/by-hand"), import("./voice/upload")]),
  () => import("./index"),
  () => import("./instruments/tune"),
  () => Promise.all([import("./instruments/index"), import("./instruments/retune")]),
  () => Promise.all([import("./instruments/new"), import("./instruments/[id]")]),
  () => import("./known-shapes"),
  () => import("./account/index"),
  () => import("./account/sign-in"),
  () => import("./account/sign-up"),
  () => import("./+not-found"),
  () => import("@/shared/songs/melodyFile"),
];

function Surroundings() {
  const { account } = useSession();
  const path = usePathname();
  useEffect(() => fetchWhenIdle(parts), []);
  const accountId = account?.id;
  useEffect(() => {
    if (accountId !== undefined) resumeUnsent(accountId);
  }, [accountId]);
  return (
    <Shell initial={account ? account.email.charAt(0).toUpperCase() : null}>
      <Navigator>
        <MissingChunkBoundary path={path}>
          <Navigator.Slot />
        </MissingChunkBoundary>
      </Navigator>
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
