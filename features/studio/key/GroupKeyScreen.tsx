import { useQuery } from "@tanstack/react-query";
import type { Href } from "expo-router";
import { useMemo, useState } from "react";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import type { GroupKey, StudioGroup } from "@/shared/contract/studio/group";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { Studio } from "@/shared/contract/studio/studio";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { AssignTable } from "../assign/AssignTable";
import {
  partRequest,
  partWay,
  pupilParts,
  untouched,
  wayMark,
  type PartsOf,
  type PupilPart,
} from "../assign/pupilParts";
import { useDrafts } from "../assign/useDrafts";
import { searchWords, useWaysOfParts, type UseWays, type WaysOfParts } from "../assign/useWaysOfParts";
import { pupilKeys } from "../judge/askPupilKeys";
import type { ClassKey, PupilsJudged } from "../judge/judgePupils";
import { questionOf, type Piece } from "../judge/piece";
import { pupilsOf } from "../roster/rosterView";
import { studioQueries, useStudioChange } from "../studioQueries";
import { ClassKeyStrip } from "./ClassKeyStrip";
import { SongAndGroup, type SongAndGroupProps } from "./SongAndGroup";

export interface GroupKeyScreenProps extends Omit<SongAndGroupProps, "groups"> {
  studio: Studio;
  /** the chosen song; null while there is none, or it has no key */
  piece: Piece | null;
  useWays: UseWays;
  instrumentOf: PartsOf["instrumentOf"];
}

/** One key for a group: the fairest, what it is for each, and each one's way into it; kept as the group's key. */
export function GroupKeyScreen(props: GroupKeyScreenProps) {
  const { studio, piece, groupId } = props;
  const roster = useQuery(studioQueries.roster(studio.id));
  const groups = useQuery(studioQueries.groups(studio.id));
  return (
    <QueryState query={roster} title="The pupils could not be listed">
      {(rows) => (
        <QueryState query={groups} title="The groups could not be listed">
          {(all) => {
            const group = all.find(({ id }) => id === groupId) ?? null;
            const pupils = pupilsOf(rows).filter(({ memberId }) => !group || group.memberIds.includes(memberId));
            return (
              <View style={{ gap: 20 }}>
                <SongAndGroup {...props} groups={all} />
                {piece && <Judged {...props} key={piece.song.id} piece={piece} pupils={pupils} group={group} />}
              </View>
            );
          }}
        </QueryState>
      )}
    </QueryState>
  );
}

interface JudgedProps extends GroupKeyScreenProps {
  piece: Piece;
  pupils: readonly RosterRow[];
  group: StudioGroup | null;
}

function Judged(props: JudgedProps) {
  const { piece, pupils } = props;
  const singers = useMemo(() => pupils.filter(({ voice }) => voice !== null), [pupils]);
  const question = useMemo(() => questionOf(piece, singers), [piece, singers]);
  const answer = useQuery(pupilKeys(question));
  if (question === null)
    return (
      <Notice kind="caution" title="Nothing is known of the tune">
        Add its notes, or its lowest and highest note, to the song; then keys can be judged.
      </Notice>
    );
  if (singers.length === 0)
    return (
      <EmptyState
        testID="no-voices"
        title="No voice is known yet"
        text="Once your pupils have measured their voices and agreed to show them, the fairest key stands here."
      />
    );
  return (
    <QueryState query={answer} title="The keys could not be worked out">
      {(found) => <Keys {...props} singers={singers} judged={found} silent={pupils.length - singers.length} />}
    </QueryState>
  );
}

interface KeysProps extends JudgedProps {
  singers: readonly RosterRow[];
  judged: PupilsJudged;
  /** how many are left out for want of a voice */
  silent: number;
}

function Keys({ studio, piece, group, singers, judged, silent, useWays, instrumentOf }: KeysProps) {
  const [tonic, setTonic] = useState<string | null>(null);
  const { drafts, setDrafts, change } = useDrafts(() => new Map());
  const picked = judged.together.find((key) => key.tonic === tonic) ?? judged.together[0]!;
  const { written } = piece;
  const parts = useMemo(
    () =>
      pupilParts({
        ...{ written, pupils: singers, judged, asked: picked.tonic, instrumentOf },
        drafts: new Map(
          singers.map(({ memberId }) => [
            memberId,
            { ...(drafts.get(memberId) ?? untouched), chosen: true, shift: null },
          ]),
        ),
      }),
    [written, singers, judged, picked.tonic, instrumentOf, drafts],
  );
  const { ways, searching } = useWaysOfParts(useWays, piece, parts);
  const sign = glyphs(keySign({ tonic: picked.tonic, mode: written.mode }));
  const keep = useStudioChange((key: GroupKey) => http.put(`/studios/${studio.id}/groups/${group?.id}/key`, key));
  const body = (): GroupKey => ({
    songId: piece.song.id,
    title: piece.song.title,
    tonic: picked.tonic,
    reason: picked.reason,
    pupils: parts.map((part) => {
      const { memberId, shift, score, instrument, way } = partRequest(part, ways.get(part.row.memberId));
      return { memberId, shift, score, instrument, way };
    }),
    decidedAt: new Date().toISOString(),
  });
  const kept = isKept(group, piece, picked, parts, ways);
  const everyone = new URLSearchParams({
    song: piece.song.id,
    key: picked.tonic,
    ...(group ? { group: group.id } : null),
  });
  return (
    <View style={{ gap: 20 }}>
      <ClassKeyStrip
        title={`One key for all: ${piece.song.title}`}
        keys={judged.together}
        picked={picked}
        onPick={(key) => {
          setTonic(key.tonic);
          setDrafts(new Map());
        }}
        mode={written.mode}
        pupils={singers}
      >
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10, marginTop: 4 }}>
          {group && (
            <Button
              small
              label={kept ? `${sign} is kept` : `Keep ${sign} for ${group.name}`}
              icon={kept ? "check" : "bookmark"}
              disabled={kept || searching > 0}
              busy={keep.isPending}
              onPress={() => keep.mutate(body())}
              testID="keep-key"
            />
          )}
          <LinkButton
            small
            kind="secondary"
            label={`Give everyone ${sign}`}
            href={`/studio/${studio.id}/assign?${everyone.toString()}` as Href}
            testID="give-everyone"
          />
        </View>
      </ClassKeyStrip>
      {keep.error && (
        <Notice kind="error" title="The key was not kept">
          {keep.error.message}
        </Notice>
      )}
      <LiveText variant="small" tone="soft">
        {[
          judged.coarse && "Coarse: only the lowest and highest note of the tune are known.",
          silent > 0 &&
            `${silent === 1 ? "One pupil is" : `${silent} pupils are`} left out: no voice is known of them.`,
          searchWords(searching, parts.length),
        ]
          .filter(Boolean)
          .join(" ")}
      </LiveText>
      <AssignTable oneKey parts={parts} ways={ways} onDraft={change} />
      {!group && (
        <Text variant="small" tone="soft">
          Choose a group to keep the key for it, with each pupil’s way.
        </Text>
      )}
    </View>
  );
}

function isKept(
  group: StudioGroup | null,
  piece: Piece,
  picked: ClassKey,
  parts: readonly PupilPart[],
  ways: WaysOfParts["ways"],
): boolean {
  const before = group?.keys.find(({ songId }) => songId === piece.song.id);
  if (!before || before.tonic !== picked.tonic || before.pupils.length !== parts.length) return false;
  return parts.every((part) => {
    const was = before.pupils.find(({ memberId }) => memberId === part.row.memberId);
    const way = partWay(part, ways.get(part.row.memberId));
    return was?.shift === part.key.shift && (was.way && wayMark(was.way)) === (way && wayMark(way));
  });
}
