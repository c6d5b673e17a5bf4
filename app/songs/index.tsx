import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { EnteredNotice } from "@/features/account/EnteredNotice";
import { decidedOn } from "@/features/keys/decide";
import { decisionFor, decisionQueries } from "@/features/keys/decisionQueries";
import { ShelfStrip } from "@/features/keys/ShelfStrip";
import { keyInHand, keyRowsOf } from "@/features/keys/songKeys";
import { SignedOutNotice } from "@/features/songs/SignedOut";
import { SongShelf, type ShelfKey } from "@/features/songs/SongShelf";
import { songQueries } from "@/features/songs/songQueries";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import type { Song } from "@/shared/contract/song";
import { keySign } from "@/shared/music/keyWords";
import { moveWords } from "@/shared/music/moveWords";
import { glyphs } from "@/shared/music/pitch";

export default function SongsRoute() {
  const { entered } = useLocalSearchParams<{ entered?: string }>();
  const songs = useQuery(songQueries.all());
  const decisions = useQuery(decisionQueries.all());
  const { singing } = useSingingVoice();
  const myKey = (song: Song): ShelfKey | null => {
    const decision = decisionFor(decisions.data ?? [], song.id);
    if (!decision) return null;
    const inHand = keyInHand(song, keyRowsOf(song, singing), decision);
    if (inHand?.because !== "decided") return null;
    return {
      sign: glyphs(keySign(inHand.key)),
      words: `My key since ${decidedOn(decision)}, ${moveWords(inHand.shift)}. ${decision.reason.replace(/\.$/, "")}`,
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
