import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { EnteredNotice } from "@/features/account/EnteredNotice";
import { decidedElsewhere, decidedOn } from "@/features/keys/decide";
import { decisionFor, decisionQueries } from "@/features/keys/decisionQueries";
import { ShelfStrip } from "@/features/keys/ShelfStrip";
import { keyInHand, keyRowsOf } from "@/features/keys/songKeys";
import { SignedOutNotice } from "@/features/songs/SignedOut";
import { SongShelf, type ShelfKey } from "@/features/songs/shelf/SongShelf";
import { songMoveWords } from "@/features/songs/songFacts";
import { songQueries } from "@/features/songs/songQueries";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import type { Song } from "@/shared/contract/song";

export default function SongsRoute() {
  const { entered } = useLocalSearchParams<{ entered?: string }>();
  const songs = useQuery(songQueries.all());
  const decisions = useQuery(decisionQueries.all());
  const { forKeys: singing, voice, voices } = useSingingVoice();
  const myKey = (song: Song): ShelfKey | null => {
    const decision = decisionFor(decisions.data ?? [], song.id);
    if (!decision) return null;
    const inHand = keyInHand(song, keyRowsOf(song, singing), decision);
    if (inHand?.because !== "decided") return null;
    if (decidedElsewhere(decision, voice?.id ?? null)) {
      const other = voices.find(({ id }) => id === decision.voiceId)?.name ?? "another voice";
      return { key: inHand.key, words: `Decided for ${other} since ${decidedOn(decision)}`, strip: null };
    }
    return {
      key: inHand.key,
      words: `My key since ${decidedOn(decision)}, ${songMoveWords(song, inHand.shift)}. ${decision.reason.replace(/\.$/, "")}`,
      strip: singing && inHand.row ? <ShelfStrip row={inHand.row} singing={singing} /> : null,
    };
  };
  return (
    <Screen
      title="Songs"
      footer={
        songs.data?.length === 0 ? undefined : (
          <LinkButton href="/songs/new" label="Add a song" icon="plus" testID="add-song" />
        )
      }
    >
      <EnteredNotice entered={entered} />
      <SignedOutNotice />
      <QueryState
        query={songs}
        title="Your songs could not be opened"
        skeleton={<Skeleton bars={[{ height: 52 }, { height: 72 }, { height: 72 }]} words="Opening your songs" />}
      >
        {(all) => <SongShelf songs={all} myKey={myKey} />}
      </QueryState>
    </Screen>
  );
}
