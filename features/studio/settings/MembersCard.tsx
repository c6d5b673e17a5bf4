import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { AskedTwice } from "@/features/ui/AskedTwice";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { Studio, StudioRole } from "@/shared/contract/studio/studio";
import { studioQueries, useStudioChange } from "../studioQueries";

const roleWords: Record<StudioRole, string> = { owner: "Owner", "co-teacher": "Teacher", pupil: "Pupil" };

/** Everybody in the studio: the owner changes who teaches; teachers take people out. */
export function MembersCard({ studio }: { studio: Studio }) {
  const query = useQuery(studioQueries.roster(studio.id));
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>People</Heading>
      <QueryState query={query} title="The people could not be listed">
        {(rows) => (
          <View role="list">
            {rows.map((row, k) => (
              <View
                key={row.memberId}
                role="listitem"
                style={{ borderTopWidth: k === 0 ? 0 : 1, borderColor: colors.line, paddingVertical: 8 }}
              >
                <Member studio={studio} row={row} />
              </View>
            ))}
          </View>
        )}
      </QueryState>
    </Card>
  );
}

function Member({ studio, row }: { studio: Studio; row: RosterRow }) {
  const path = `/studios/${studio.id}/members/${row.memberId}`;
  const change = useStudioChange((role: StudioRole) => http.put(path, { role }));
  const remove = useStudioChange(() => http.delete(path));
  const owner = studio.me.role === "owner";
  const me = row.memberId === studio.me.memberId;
  const roles = (["co-teacher", "pupil", ...(row.role === "co-teacher" ? (["owner"] as const) : [])] as const).map(
    (value) => ({ value, label: value === "owner" ? "Owner, in your place" : roleWords[value] }),
  );
  return (
    <View style={{ gap: 4 }}>
      <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", gap: 12, minHeight: 48 }}>
        <Text variant="strong" style={{ flexGrow: 1, flexShrink: 1 }}>
          {row.name}
        </Text>
        {owner && !me ? (
          <Select
            inline
            label={`What ${row.name} is here`}
            options={roles}
            value={row.role === "owner" ? "co-teacher" : row.role}
            onChange={(role) => change.mutate(role)}
            testID={`role-${row.memberId}`}
          />
        ) : (
          <Text tone="soft">{me ? `${roleWords[row.role]}, you` : roleWords[row.role]}</Text>
        )}
      </View>
      {change.error && <Notice kind="error">{change.error.message}</Notice>}
      {!me && row.role !== "owner" && (
        <AskedTwice
          label={`Take ${row.name} out`}
          question={`Take ${row.name} out of the studio?`}
          text="What they handed in is deleted here. Their own account, voice and songs stay theirs."
          failed="Nothing was changed."
          confirmLabel="Take out"
          keepLabel="Let stay"
          onRemove={() => remove.mutate()}
          busy={remove.isPending}
          error={remove.error}
          testID={`remove-${row.memberId}`}
        />
      )}
    </View>
  );
}
