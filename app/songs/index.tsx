import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { useCallback, useMemo } from "react";
import { EnteredNotice } from "@/features/account/entry/EnteredNotice";
import { decidedElsewhere, decidedOn } from "@/features/keys/decision/decide";
import { decisionFor, decisionQueries } from "@/features/keys/decision/decisionQueries";
import { wholeVoice } from "@/features/keys/keyRows";
import { keyInHand } from "@/features/keys/songKeys";
import { ShelfScreen } from "@/features/songs/shelf/ShelfScreen";
import type { ShelfKey } from "@/features/songs/shelf/shelfRow";
import { readView, viewParams, type ShelfView } from "@/features/songs/shelf/shelfView";
import { songMoveWords } from "@/features/songs/songFacts";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import type { SongListing } from "@/shared/contract/songListing";

export default function SongsRoute() {
  const router = useRouter();
  const params = useLocalSearchParams<{ entered?: string }>();
  const view = readView(params);
  const decisions = useQuery(decisionQueries.all()).data;
  const { forKeys, voice, voices } = useSingingVoice();
  const singing = useMemo(() => forKeys && wholeVoice(forKeys), [forKeys]);
  const bySong = useMemo(() => {
    const latest = new Map<string, NonNullable<typeof decisions>>();
    for (const each of decisions ?? []) latest.set(each.songId, [...(latest.get(each.songId) ?? []), each]);
    return latest;
  }, [decisions]);
  const mineOf = useCallback(
    (song: SongListing): ShelfKey | null => {
      const decision = decisionFor(bySong.get(song.id) ?? [], song.id, voice?.id ?? null);
      // A listing has no chart and no notes; key and home note are all that is asked for here.
      const tune = song.span && { kind: "span" as const, ...song.span };
      const inHand = decision && keyInHand({ ...song, chart: "", tune }, null, decision);
      if (!inHand || inHand.because !== "decided") return null;
      const { key, shift } = inHand;
      const elsewhere = decidedElsewhere(decision, voice?.id ?? null);
      const other = voices.find(({ id }) => id === decision.voiceId)?.name ?? "another voice";
      const moved = songMoveWords({ chart: song.writtenKey ? "-" : "" }, shift);
      const words = elsewhere
        ? `Decided for ${other} since ${decidedOn(decision)}`
        : `My key since ${decidedOn(decision)}, ${moved}`;
      return { key, shift, elsewhere, words };
    },
    [bySong, voice, voices],
  );
  const show = (change: Partial<ShelfView>) => router.setParams(viewParams({ ...view, ...change }));
  return (
    <ShelfScreen view={view} onView={show} voice={singing} mineOf={mineOf}>
      <EnteredNotice entered={params.entered} />
    </ShelfScreen>
  );
}
