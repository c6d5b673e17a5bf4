import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { AskedTwice } from "@/features/ui/AskedTwice";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import type { StudioGroup } from "@/shared/contract/studio/group";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { Studio } from "@/shared/contract/studio/studio";
import { listWords } from "@/shared/music/listWords";
import { glyphs } from "@/shared/music/pitch";
import { plural } from "@/shared/music/countWords";
import { pupilsOf } from "../roster/rosterView";
import { studioQueries, useStudioChange } from "../studioQueries";
import { GroupForm } from "./GroupForm";

/** Some of the pupils under a name, such as those who sing together; a pupil may be in several. */
export function GroupsScreen({ studio }: { studio: Studio }) {
  const groups = useQuery(studioQueries.groups(studio.id));
  const roster = useQuery(studioQueries.roster(studio.id));
  const [making, setMaking] = useState(false);
  return (
    <QueryState query={groups} title="The groups could not be listed">
      {(found) => (
        <QueryState query={roster} title="The pupils could not be listed">
          {(rows) => (
            <View style={{ gap: 16, maxWidth: 760 }}>
              {found.length === 0 && !making && (
                <Text>
                  No group yet. A group is some of your pupils under a name, such as those who sing together. Songs are
                  given to a whole group at once, and one key can be found for all of it.
                </Text>
              )}
              {found.map((group) => (
                <GroupCard key={group.id} studioId={studio.id} group={group} pupils={pupilsOf(rows)} />
              ))}
              {making ? (
                <Card style={{ gap: 12 }}>
                  <Heading level={2}>A new group</Heading>
                  <GroupForm studioId={studio.id} pupils={pupilsOf(rows)} onDone={() => setMaking(false)} />
                </Card>
              ) : (
                <View style={{ alignSelf: "flex-start" }}>
                  <Button label="Make a group" icon="plus" onPress={() => setMaking(true)} testID="make-group" />
                </View>
              )}
            </View>
          )}
        </QueryState>
      )}
    </QueryState>
  );
}

interface GroupCardProps {
  studioId: string;
  group: StudioGroup;
  pupils: readonly RosterRow[];
}

const namedUpTo = 12;

function GroupCard({ studioId, group, pupils }: GroupCardProps) {
  const [changing, setChanging] = useState(false);
  const remove = useStudioChange(() => http.delete(`/studios/${studioId}/groups/${group.id}`));
  const names = pupils.filter(({ memberId }) => group.memberIds.includes(memberId)).map(({ name }) => name);
  return (
    <Card style={{ gap: 10 }} testID="group">
      <Heading level={2}>{group.name}</Heading>
      {changing ? (
        <GroupForm studioId={studioId} pupils={pupils} group={group} onDone={() => setChanging(false)} />
      ) : (
        <>
          <Text>
            {names.length === 0
              ? "Nobody is in it yet."
              : names.length <= namedUpTo
                ? listWords(names)
                : plural(names.length, "pupil")}
          </Text>
          {group.keys.map((key) => (
            <Text key={key.songId} variant="small" tone="soft">
              {`One key for all in ${key.title}: ${glyphs(key.tonic)}. ${key.reason}`.trim()}
            </Text>
          ))}
          <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 4, marginLeft: -8 }}>
            <Button
              kind="text"
              small
              icon="edit"
              label="Change"
              onPress={() => setChanging(true)}
              testID="change-group"
            />
            <AskedTwice
              label="Delete the group"
              question={`Delete “${group.name}”?`}
              text="Its pupils stay in the studio, with all they were given."
              failed="It is not deleted."
              onRemove={() => remove.mutate()}
              busy={remove.isPending}
              error={remove.error}
              testID="delete-group"
            />
          </View>
        </>
      )}
    </Card>
  );
}
