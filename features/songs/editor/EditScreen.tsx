import type { Song } from "@/shared/contract/song";
import { ChangeSong } from "./ChangeSong";
import { NewSong } from "./NewSong";

export interface EditScreenProps {
  /** the song being changed; null for a new one */
  song: Song | null;
  /** the new song is on the shelf; or the old one is kept as it now stands */
  onSaved: (id: string) => void;
}

/** Writing a new song or changing one. */
export function EditScreen({ song, onSaved }: EditScreenProps) {
  return song ? (
    <ChangeSong song={song} onDone={() => onSaved(song.id)} />
  ) : (
    <NewSong onSaved={({ id }) => onSaved(id)} />
  );
}
