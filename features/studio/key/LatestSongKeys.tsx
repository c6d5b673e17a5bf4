import { useQuery } from "@tanstack/react-query";
import type { Href } from "expo-router";
import { useMemo, useState } from "react";
import { View } from "react-native";
import { LinkButton } from "@/features/ui/LinkButton";
import type { GivenSong } from "@/shared/contract/studio/assignment";
import type { KeyName } from "@/shared/music/keyName";
import { pupilKeys } from "../judge/askPupilKeys";
import { questionOf } from "../judge/piece";
import { pupilsOf } from "../roster/rosterView";
import { studioQueries } from "../studioQueries";
import { ClassKeyStrip } from "./ClassKeyStrip";

export interface LatestSongKeysProps {
  studioId: string;
  writtenOf: (song: GivenSong) => KeyName | null;
}

/** Over the roster: the song given last, in every key for everybody. Nothing while there is nothing to judge. */
export function LatestSongKeys({ studioId, writtenOf }: LatestSongKeysProps) {
  const roster = useQuery(studioQueries.roster(studioId)).data;
  const listed = useQuery(studioQueries.assignments(studioId)).data;
  const latest = listed?.reduce((a, b) => (a.assignedAt > b.assignedAt ? a : b), listed[0]!);
  const assignment = useQuery({
    ...studioQueries.assignment(studioId, latest?.id ?? ""),
    enabled: latest !== undefined,
  }).data;
  const singers = useMemo(() => (roster ? pupilsOf(roster).filter(({ voice }) => voice !== null) : []), [roster]);
  const written = assignment ? writtenOf(assignment.song) : null;
  const question = useMemo(
    () =>
      assignment && written && singers.length > 1
        ? questionOf({ song: { id: assignment.id, ...assignment.song }, written }, singers)
        : null,
    [assignment, written, singers],
  );
  const judged = useQuery(pupilKeys(question)).data;
  const [tonic, setTonic] = useState<string | null>(null);
  const picked = judged?.together.find((key) => key.tonic === tonic) ?? judged?.together[0];
  if (!judged || !picked || !written || !assignment) return null;
  return (
    <ClassKeyStrip
      title={`One key for all: ${assignment.title}`}
      keys={judged.together}
      picked={picked}
      onPick={(key) => setTonic(key.tonic)}
      mode={written.mode}
      pupils={singers}
    >
      <View style={{ alignSelf: "flex-start", marginTop: 4 }}>
        <LinkButton
          small
          kind="secondary"
          label="Decide one key for all"
          href={`/studio/${studioId}/key` as Href}
          testID="decide-key"
        />
      </View>
    </ClassKeyStrip>
  );
}
