import { useQuery } from "@tanstack/react-query";
import { type Href, useRouter } from "expo-router";
import { useState } from "react";
import { View } from "react-native";
import { Field } from "@/features/ui/Field";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { Studio } from "@/shared/contract/studio/studio";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { DayField } from "../DayField";
import type { Piece } from "../judge/piece";
import { pupilsOf } from "../roster/rosterView";
import { EmptyShelf, SongSelect, type SongSelectProps } from "../SongSelect";
import { studioQueries } from "../studioQueries";
import { AssignFoot } from "./AssignFoot";
import { AssignTable } from "./AssignTable";
import type { PartsOf } from "./pupilParts";
import { WhoControls } from "./WhoControls";
import { useAssignment } from "./useAssignment";
import { useWaysOfParts, type UseWays } from "./useWaysOfParts";

export interface AssignScreenProps extends Omit<SongSelectProps, "testID"> {
  studio: Studio;
  /** the chosen song, ready to be judged; null while it is not here or has no key */
  piece: Piece | null;
  /** tonic of one key for everybody, where the teacher came with one */
  asked: string | null;
  /** members chosen from the start; null: everybody */
  group: string | null;
  useWays: UseWays;
  instrumentOf: PartsOf["instrumentOf"];
}

/** Gives one song to many: for each pupil a key and a way from their own voice and instrument, changed in the same table. */
export function AssignScreen(props: AssignScreenProps) {
  const { studio, songs, songId, onSong, piece } = props;
  const roster = useQuery(studioQueries.roster(studio.id));
  if (songs.length === 0) return <EmptyShelf text="Songs are given from your own shelf. Add one first." />;
  return (
    <View style={{ gap: 20 }}>
      <View style={{ maxWidth: 560 }}>
        <SongSelect songs={songs} songId={songId} onSong={onSong} testID="assign-song" />
      </View>
      {songId === null && (
        <Text tone="soft" style={{ maxWidth: 560 }}>
          Each pupil is offered a key and a way from their own voice and instrument. You change what you like before
          anything is sent.
        </Text>
      )}
      {songId !== null && piece === null && (
        <Notice kind="caution">
          This song has no key yet. Open it and say in which key it is written; then it can be given.
        </Notice>
      )}
      {piece && (
        <QueryState query={roster} title="The pupils could not be listed">
          {(rows) => <Assigning key={piece.song.id} {...props} piece={piece} pupils={pupilsOf(rows)} />}
        </QueryState>
      )}
    </View>
  );
}

interface AssigningProps extends AssignScreenProps {
  piece: Piece;
  pupils: readonly RosterRow[];
}

function Assigning({ studio, piece, pupils, asked, group, useWays, instrumentOf }: AssigningProps) {
  const router = useRouter();
  const phone = useLayout() === "phone";
  const work = useAssignment({ studioId: studio.id, piece, pupils, asked, group, instrumentOf });
  const [dueOn, setDueOn] = useState("");
  const [note, setNote] = useState("");
  const { ways, searching } = useWaysOfParts(useWays, piece, work.parts);
  const send = () =>
    work.give({ dueOn: dueOn === "" ? null : dueOn, note: note.trim(), waysOf: (id) => ways.get(id) }, (id) =>
      router.replace(`/studio/${studio.id}/assignments/${id}` as Href),
    );
  return (
    <View style={{ gap: 20 }}>
      {asked !== null && (
        <Notice kind="good">{`One key for all: ${glyphs(keySign({ tonic: asked, mode: piece.written.mode }))}. Each keeps the octave that suits them.`}</Notice>
      )}
      {work.problem !== null && (
        <Notice kind="caution" title="No keys are proposed">
          {work.problem}
        </Notice>
      )}
      <WhoControls studioId={studio.id} parts={work.parts} onChoose={work.choose} />
      <AssignTable parts={work.parts} ways={ways} onDraft={work.change} />
      <View style={{ flexDirection: phone ? "column" : "row", gap: 16, maxWidth: 760 }}>
        <View style={phone ? null : { width: 220 }}>
          <DayField label="Due on" value={dueOn} onChange={setDueOn} testID="due-on" />
        </View>
        <View style={{ flexGrow: 1 }}>
          <Field
            label="Note to all of them"
            value={note}
            onChangeText={setNote}
            multiline
            rows={2}
            hint="It stands in their mail and beside the song."
            testID="assign-note"
          />
        </View>
      </View>
      <Text variant="small" tone="soft" style={{ maxWidth: 640 }}>
        Each pupil gets a copy of the song on their own shelf, with the key and the way you set here, and a mail.
        Nothing else of your shelf is seen.
      </Text>
      <AssignFoot chosen={work.chosen} searching={searching} sending={work.sending} error={work.error} onSend={send} />
    </View>
  );
}
