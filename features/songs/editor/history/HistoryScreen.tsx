import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { songVersions } from "@/features/api/songVersions";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import type { Song } from "@/shared/contract/song";
import { refreshShelf, songQueries } from "../../songQueries";
import { VersionDetail } from "./VersionDetail";
import { VersionRow } from "./VersionRow";
import { versionQueries } from "./versionQueries";

const besides = webStyle({
  display: "grid",
  gridTemplateColumns: "minmax(0, 1fr) minmax(0, 1fr)",
  columnGap: 40,
  alignItems: "start",
});

/** The earlier states of a song: who, when, what was changed; to look at and to bring back. */
export function HistoryScreen({ song }: { song: Song }) {
  const wide = useLayout() === "wide";
  const client = useQueryClient();
  const versions = useQuery(versionQueries.list(song.id));
  const [replaced, setReplaced] = useState<Song | null>(null);
  const [open, setOpen] = useState<string | null>(null);
  const restore = useMutation({
    mutationFn: async (earlier: Song) => {
      // What stands on the shelf now is what gives way, not what this page saw first.
      const present = await client.fetchQuery({ ...songQueries.detail(song.id), staleTime: 0 });
      return { present, kept: await songVersions.restore(present, { song: earlier }) };
    },
    onSuccess: async ({ present, kept }) => {
      client.setQueryData(songQueries.detail(song.id).queryKey, kept);
      setReplaced(present);
      setOpen(null);
      await Promise.all([
        refreshShelf(client),
        client.invalidateQueries({ queryKey: versionQueries.list(song.id).queryKey }),
      ]);
    },
  });
  const undo = () => {
    if (replaced) restore.mutate(replaced, { onSuccess: () => setReplaced(null) });
  };
  // The button that was pressed is gone with what it stood in.
  const before = useRef(replaced);
  useEffect(() => {
    if (before.current === replaced) return;
    before.current = replaced;
    const next = document.querySelector<HTMLElement>('[data-testid="undo-restore"]') ?? document.querySelector("h1");
    next?.focus({ preventScroll: true });
    window.scrollTo(0, 0);
  }, [replaced]);
  const params = { id: song.id };
  // On wide pages one of them always stands beside the list, first the newest.
  const shownOf = (list: readonly { id: string }[]) =>
    list.some(({ id }) => id === open) ? open : wide ? (list[0]?.id ?? null) : null;
  const detail = (versionId: string) => (
    <VersionDetail
      key={versionId}
      song={song}
      versionId={versionId}
      busy={restore.isPending}
      onRestore={(earlier) => restore.mutate(earlier)}
    />
  );
  return (
    <Screen
      title="Earlier versions"
      crumb={{ label: song.title, href: { pathname: "/songs/[id]", params } }}
      back={{ pathname: "/songs/[id]/edit", params }}
      wide
    >
      <View style={{ gap: 16, maxWidth: wide ? undefined : 860 }}>
        {replaced && (
          <Notice
            kind="good"
            testID="restored"
            title="The earlier version is back"
            action={
              <Button kind="text" small label="Undo" busy={restore.isPending} onPress={undo} testID="undo-restore" />
            }
          >
            What stood there before is in this list too.
          </Notice>
        )}
        {restore.error && (
          <Notice kind="error" title="It is not restored">
            {`${restore.error.message} The song is as it was.`}
          </Notice>
        )}
        <QueryState
          query={versions}
          title="The earlier versions could not be opened"
          skeleton={
            <Skeleton bars={[{ height: 64 }, { height: 64 }, { height: 64 }]} words="Opening earlier versions" />
          }
        >
          {(list) =>
            list.length === 0 ? (
              <EmptyState
                title="No earlier versions yet"
                text="Each time you change the song, the state before is kept here, so that you can come back to it."
                action={<LinkButton small label="Edit the song" href={{ pathname: "/songs/[id]/edit", params }} />}
              />
            ) : (
              <View style={wide ? besides : null}>
                <View role="list" testID="versions">
                  {list.map((entry, index) => (
                    <VersionRow
                      key={entry.id}
                      song={song}
                      entry={entry}
                      told={index < 12 || open === entry.id}
                      open={shownOf(list) === entry.id}
                      beside={wide}
                      onOpen={() => setOpen(open === entry.id && !wide ? null : entry.id)}
                    >
                      {!wide && open === entry.id && detail(entry.id)}
                    </VersionRow>
                  ))}
                </View>
                {wide && detail(shownOf(list) ?? "")}
              </View>
            )
          }
        </QueryState>
      </View>
    </Screen>
  );
}
