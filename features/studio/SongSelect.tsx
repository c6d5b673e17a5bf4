import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Select } from "@/features/ui/Select";

export interface SongSelectProps {
  /** the teacher's own songs */
  songs: readonly { id: string; title: string }[];
  /** the chosen one; null while there is none */
  songId: string | null;
  onSong: (id: string) => void;
  testID?: string;
}

/** One song of the teacher's shelf. */
export function SongSelect({ songs, songId, onSong, testID }: SongSelectProps) {
  return (
    <Select
      label="Song, from your shelf"
      options={[
        ...(songId === null ? [{ value: "", label: "Choose a song" }] : []),
        ...songs.map(({ id, title }) => ({ value: id, label: title })),
      ]}
      value={songId ?? ""}
      onChange={(id) => id !== "" && onSong(id)}
      {...(testID === undefined ? null : { testID })}
    />
  );
}

/** In the place of a choice of songs where there is none to choose. */
export function EmptyShelf({ text }: { text: string }) {
  return (
    <EmptyState title="Your shelf is empty" text={text} action={<LinkButton label="Add a song" href="/songs/new" />} />
  );
}
