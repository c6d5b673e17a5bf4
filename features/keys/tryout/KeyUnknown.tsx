import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Screen } from "@/features/ui/Screen";
import type { Song } from "@/shared/contract/song";

/** In place of trying a key, where nothing tells which key the song is in. */
export function KeyUnknown({ song }: { song: Song }) {
  const crumb = { label: "Song", href: { pathname: "/songs/[id]", params: { id: song.id } } } as const;
  return (
    <Screen title="Try it" subtitle={song.title} crumb={crumb}>
      <EmptyState
        testID="try-needs-key"
        title="The key is not known yet"
        text="Here you sing the song to a backing and hear how a key sits. Chords, or the melody with its home note, tell what key the song is in."
        action={
          <LinkButton
            href={{ pathname: "/songs/[id]/edit", params: { id: song.id } }}
            label="Add chords or the melody"
            icon="edit"
            small
          />
        }
      />
    </Screen>
  );
}
