import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { newId } from "@/features/api/newId";
import { Button } from "@/features/ui/Button";
import { Form } from "@/features/ui/Form";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { useLayout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import { useSaveSong } from "../songQueries";
import { EditTools } from "./EditTools";
import { draftStore } from "./keep/draftStore";
import { PlaceBar } from "./place/PlaceBar";
import { emptyDraft, newOrigin, songFromDraft } from "./songDraft";
import { SongForm } from "./SongForm";
import { keyOfDraft } from "./useChartReading";
import { focusFirstWrong, useEditor } from "./useEditor";
import { forgetSteps } from "./useSongEdits";
import { WrongNotice } from "./WrongNotice";

/** Writing a new song. What was typed and not kept is found again. */
export function NewSong({ onSaved }: { onSaved: (song: Song) => void }) {
  const [start, setStart] = useState(() => {
    const kept = draftStore.load(null)?.draft ?? null;
    // A second try to save a new song must keep its address, so that none is put twice.
    return { draft: kept ?? emptyDraft, restored: kept !== null, version: 0, id: newId() };
  });
  const discard = () => {
    draftStore.clear(null, start.draft);
    forgetSteps(null);
    setStart({ ...start, draft: emptyDraft, restored: false, version: start.version + 1 });
  };
  return <Writing key={start.version} start={start} onDiscard={discard} onSaved={onSaved} />;
}

interface WritingProps {
  start: { draft: typeof emptyDraft; restored: boolean; id: string };
  onDiscard: () => void;
  onSaved: (song: Song) => void;
}

function Writing({ start, onDiscard, onSaved }: WritingProps) {
  const phone = useLayout() === "phone";
  const save = useSaveSong();
  const editor = useEditor(start.draft, null);
  const { edits, wrong, placing, mode, form } = editor;
  const { draft } = edits;
  const [asked, setAsked] = useState(false);
  const touched = useRef(false);
  useEffect(() => {
    if (draft !== start.draft) touched.current = true;
    if (touched.current) draftStore.save(null, draft, null);
  }, [draft, start.draft]);
  const submit = () => {
    const found = draft.key === null ? keyOfDraft(draft) : null;
    setAsked(true);
    if (Object.keys(wrong).length > 0) {
      form.onMode("type");
      focusFirstWrong();
      return;
    }
    save.mutate(songFromDraft(draft, found, newOrigin(start.id, new Date().toISOString())), {
      onSuccess: (song) => {
        draftStore.clear(null, draft);
        forgetSteps(null);
        onSaved(song);
      },
    });
  };
  const errors = asked ? wrong : {};
  const button = (
    <Button small={!phone} label="Save the song" busy={save.isPending} onPress={submit} testID="save-song" />
  );
  const placingNow = phone && mode === "place";
  return (
    <Screen
      title="Add a song"
      crumb={{ label: "Songs", href: "/songs" }}
      wide
      footer={placingNow ? <PlaceBar placing={placing} /> : button}
    >
      <Form label="Song" onSubmit={submit} gap={16}>
        {start.restored && (
          <Notice
            kind="good"
            testID="draft-restored"
            title="Your draft is back"
            action={<Button kind="text" small label="Start afresh" onPress={onDiscard} />}
          >
            What you typed and did not save stands here again.
          </Notice>
        )}
        {save.error && (
          <Notice
            kind="error"
            title="The song is not saved yet"
          >{`${save.error.message} Everything you typed is still here.`}</Notice>
        )}
        <WrongNotice errors={errors} />
        <EditTools edits={edits} />
        <SongForm {...form} errors={errors} />
        {placingNow && <View>{button}</View>}
      </Form>
    </Screen>
  );
}
