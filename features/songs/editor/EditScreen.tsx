import { useState } from "react";
import { newId } from "@/features/api/newId";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { useLayout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import { draftStore } from "./draftStore";
import { draftOf, emptyDraft, newOrigin } from "./songDraft";
import { SongForm } from "./SongForm";
import { useSaveSong } from "../songQueries";

export interface EditScreenProps {
  /** the song being changed; null for a new one */
  song: Song | null;
  onSaved: (song: Song) => void;
}

/** Writing a new song or changing one. What was typed and not saved is found again. */
export function EditScreen({ song, onSaved }: EditScreenProps) {
  const phone = useLayout() === "phone";
  const save = useSaveSong();
  const id = song?.id ?? null;
  const [form, setForm] = useState(() => {
    const kept = draftStore.load(id);
    // A second try to save a new song must keep its address, so that none is put twice.
    return { draft: kept ?? (song ? draftOf(song) : emptyDraft), restored: kept !== null, version: 0, newId: newId() };
  });
  const discard = () => {
    draftStore.clear(id);
    setForm({ ...form, draft: song ? draftOf(song) : emptyDraft, restored: false, version: form.version + 1 });
  };
  const keep = (changed: Song) =>
    save.mutate(changed, {
      onSuccess: () => {
        draftStore.clear(id);
        onSaved(changed);
      },
    });
  return (
    <SongForm
      key={form.version}
      draft={form.draft}
      songId={id}
      origin={() => song ?? newOrigin(form.newId, new Date().toISOString())}
      problem={save.error}
      onSave={keep}
      frame={(fields, submit) => (
        <Screen
          title={song ? "Edit the song" : "Add a song"}
          crumb={
            song
              ? { label: song.title, href: { pathname: "/songs/[id]", params: { id: song.id } } }
              : { label: "Songs", href: "/songs" }
          }
          wide
          footer={
            <Button small={!phone} label="Save the song" busy={save.isPending} onPress={submit} testID="save-song" />
          }
        >
          {form.restored && (
            <Notice
              kind="good"
              testID="draft-restored"
              title="Your draft is back"
              action={
                <Button
                  kind="text"
                  small
                  label={song ? "Go back to what is saved" : "Start afresh"}
                  onPress={discard}
                />
              }
            >
              What you typed and did not save stands here again.
            </Notice>
          )}
          {fields}
        </Screen>
      )}
    />
  );
}
