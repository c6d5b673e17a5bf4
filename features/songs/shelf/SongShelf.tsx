import { useQuery } from "@tanstack/react-query";
import { useMemo, useState, type Dispatch, type SetStateAction } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { ErrorState } from "@/features/ui/ErrorState";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { SongListing } from "@/shared/contract/songListing";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { songQueries } from "../songQueries";
import { DoneBar } from "./actions/DoneBar";
import { SongMenu } from "./actions/SongMenu";
import { useSongActions } from "./actions/useSongActions";
import { ShelfControls } from "./ShelfControls";
import { ShelfTools } from "./ShelfTools";
import { fitOf } from "./shelfFits";
import type { ShelfKey } from "./shelfRow";
import { foundWords, type ShelfView } from "./shelfView";
import { SongRows } from "./SongRows";
import { SongTable } from "./SongTable";
import { usePlaceInList } from "./usePlaceInList";
import { useShelf } from "./useShelf";

export interface SongShelfProps {
  view: ShelfView;
  onView: (change: Partial<ShelfView>) => void;
  /** the voice that spans and fit are judged by, on whole semitones; null while there is none */
  voice: SingingVoice | null;
  /** the same object for the same decisions, as lists sort by it */
  mineOf: (song: SongListing) => ShelfKey | null;
}

/** All songs: searched, sorted, gathered by tags; each with its key, its span over the voice and what can be done with it. */
export function SongShelf({ view, onView, voice, mineOf }: SongShelfProps) {
  const wide = useLayout() === "wide";
  const shelf = useShelf(view, voice, mineOf);
  const tags = useQuery(songQueries.tags()).data ?? [];
  const actions = useSongActions();
  const [menu, setMenu] = useState<SongListing | null>(null);
  const [chosen, setChosen] = useState<ReadonlySet<string> | null>(null);
  const { songs, total } = shelf;
  // The same objects from one scroll to the next, so that rows are drawn once; new ones when the fit is known better.
  const fits = useMemo(() => voice && judgedBy(voice, shelf.judged), [voice, shelf.judged]);
  const rowActions = useMemo(() => ({ onMenu: setMenu, chosen, onChoose: choosing(setChosen) }), [chosen]);
  usePlaceInList(songs !== undefined && !shelf.stale);
  const bare = view.q.trim() === "" && view.tag === null && !view.archived;
  if (songs === undefined) {
    return shelf.error ? (
      <ErrorState
        title="Your songs could not be opened"
        text={`${shelf.error.message} Nothing of yours was lost.`}
        onRetry={shelf.retry}
      />
    ) : (
      <Skeleton
        bars={[{ height: 52 }, { height: 32, width: 240 }, ...Array(6).fill({ height: wide ? 56 : 96 })]}
        words="Opening your songs"
      />
    );
  }
  if (total === 0 && bare && !shelf.stale)
    return (
      <View style={{ gap: 16 }}>
        <EmptyState
          testID="no-songs"
          title="No songs yet"
          text="Here stand the songs you sing, each with its chords, your key and how you play it. Paste a chart, type one in, or bring many files at once."
          action={
            <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
              <LinkButton href="/songs/new" label="Add a song" icon="plus" small />
              <LinkButton href="/songs/import" label="Import files" kind="secondary" small />
            </View>
          }
        />
        <Button
          kind="text"
          small
          label="Songs put aside"
          onPress={() => onView({ archived: true })}
          style={{ alignSelf: "flex-start" }}
        />
        <DoneBar actions={actions} />
      </View>
    );
  const list = {
    songs,
    total,
    more: shelf.more,
    voice,
    mineOf,
    fitOf: fits,
    actions: rowActions,
  };
  const sortsByNobody = view.sort === "fit" && voice === null;
  const shown = menu && (songs.find(({ id }) => id === menu.id) ?? menu);
  return (
    <View style={{ gap: 16 }}>
      <ShelfControls view={view} onView={onView} tags={tags} />
      {sortsByNobody && (
        <Notice
          kind="caution"
          title="Fit needs a voice"
          action={<LinkButton href="/voice/sing" label="Sing a few seconds" kind="secondary" small />}
        >
          Until yours is known the songs stand by title.
        </Notice>
      )}
      <View
        style={{
          flexDirection: "row",
          flexWrap: "wrap",
          alignItems: "center",
          justifyContent: "space-between",
          gap: 8,
        }}
      >
        <LiveText variant="small" tone="soft" testID="shelf-found">
          {shelf.stale ? "Searching" : foundWords(view, total)}
        </LiveText>
        <ShelfTools view={view} songs={songs} total={total} chosen={chosen} onChosen={setChosen} />
      </View>
      {shelf.judging && (
        <Text variant="tiny" tone="soft" testID="judging">
          Judged by their spans; the notes are being read.
        </Text>
      )}
      {total === 0 && !shelf.stale ? (
        <Text tone="soft" testID="none-found">
          {noneWords(view)}
        </Text>
      ) : (
        <View aria-busy={shelf.stale}>
          {wide ? <SongTable {...list} sort={view.sort} onSort={(sort) => onView({ sort })} /> : <SongRows {...list} />}
        </View>
      )}
      {shelf.coming && <Skeleton bars={[{ height: 56 }]} words={`${songs.length} of ${total} songs are here`} />}
      {shelf.error && !shelf.coming && (
        <Notice
          kind="error"
          title="Not all songs are here"
          action={<Button kind="secondary" small icon="again" label="Try again" onPress={shelf.retry} />}
        >
          {shelf.error.message}
        </Notice>
      )}
      {shown && <SongMenu song={shown} actions={actions} onClose={() => setMenu(null)} />}
      <DoneBar actions={actions} />
    </View>
  );
}

function noneWords({ q, tag, archived }: ShelfView): string {
  const search = q.trim();
  if (search !== "") return `No title, no tag and no line holds “${search}”. Try a word from the chorus.`;
  if (tag !== null) return `No song has the tag “${tag}” any more.`;
  return archived
    ? "Nothing is put aside. What you do not sing just now can rest here; it is kept whole."
    : "No songs.";
}

/** The fit of songs for a voice; made anew whenever more notes were read. */
function judgedBy(voice: SingingVoice, _times: number): (song: SongListing) => number | null {
  return (song) => fitOf(song, voice);
}

function choosing(set: Dispatch<SetStateAction<ReadonlySet<string> | null>>) {
  return (song: SongListing, on: boolean) =>
    set((before) => {
      const next = new Set(before);
      if (on) next.add(song.id);
      else next.delete(song.id);
      return next;
    });
}
