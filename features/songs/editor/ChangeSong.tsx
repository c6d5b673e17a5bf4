import { useEffect, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Form } from "@/features/ui/Form";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { useLayout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import { EditTools } from "./EditTools";
import { ClashPanel } from "./keep/ClashPanel";
import { draftStore } from "./keep/draftStore";
import { KeptWords } from "./keep/KeptWords";
import { useKeeping } from "./keep/useKeeping";
import { PlaceBar } from "./place/PlaceBar";
import { draftOf } from "./songDraft";
import { SongForm } from "./SongForm";
import { keyOfDraft } from "./useChartReading";
import { focusFirstWrong, useEditor } from "./useEditor";
import { WrongNotice } from "./WrongNotice";

/** Changing a song that is on the shelf. It is kept by itself; what could not be kept is found again. */
export function ChangeSong({ song, onDone }: { song: Song; onDone: () => void }) {
  const phone = useLayout() === "phone";
  const [start] = useState(() => {
    const kept = draftStore.load(song.id);
    return { draft: kept?.draft ?? draftOf(song), base: kept?.base ?? null, restored: kept !== null };
  });
  const { edits, wrong, placing, mode, form } = useEditor(start.draft, song.id);
  const { draft, change } = edits;
  const { state, keep, settle } = useKeeping({
    song,
    draft,
    base: start.base,
    restored: start.restored,
    findKey: keyOfDraft,
    onNewer: (newer) => change(draftOf(newer)),
  });
  const [settled, setSettled] = useState(0);
  useEffect(() => {
    if (settled > 0) void keep();
  }, [settled, keep]);

  const done = async () => {
    if (await keep()) onDone();
    else if (Object.keys(wrong).length > 0) {
      form.onMode("type");
      focusFirstWrong();
    }
  };
  const errors = state.kind === "unfinished" ? wrong : {};
  const button = <Button small={!phone} label="Done" onPress={() => void done()} testID="save-song" />;
  const placingNow = phone && mode === "place";
  return (
    <Screen
      title="Edit the song"
      crumb={{ label: song.title, href: { pathname: "/songs/[id]", params: { id: song.id } } }}
      wide
      footer={placingNow ? <PlaceBar placing={placing} /> : button}
    >
      <Form label="Song" onSubmit={() => void keep()} gap={16}>
        {state.kind === "clash" && (
          <ClashPanel
            key={state.theirs.revision}
            base={state.base}
            theirs={state.theirs}
            draft={draft}
            onSettled={(resolved, givenUp) => {
              settle(state.theirs, givenUp);
              if (resolved) change(draftOf(resolved));
              setSettled(settled + 1);
            }}
          />
        )}
        {state.kind === "failed" && (
          <Notice
            kind="error"
            title="The song is not kept yet"
            action={<Button kind="text" small label="Try again" onPress={() => void keep()} testID="keep-again" />}
          >{`${state.error.message} Everything you typed is still here.`}</Notice>
        )}
        <WrongNotice errors={errors} />
        <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", justifyContent: "space-between" }}>
          <EditTools edits={edits}>
            <KeptWords state={state} />
          </EditTools>
          <LinkButton
            kind="text"
            small
            label="Earlier versions"
            href={{ pathname: "/songs/[id]/history", params: { id: song.id } }}
            testID="to-history"
          />
        </View>
        <SongForm {...form} errors={errors} />
        {placingNow && button}
      </Form>
    </Screen>
  );
}
