import { useQuery } from "@tanstack/react-query";
import { useRef, useState } from "react";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { AskedTwice } from "@/features/ui/AskedTwice";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { QueryState } from "@/features/ui/QueryState";
import { Question, type QuestionProps } from "@/features/ui/Question";
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
            {inOrder(rows).map((row, k) => (
              <View
                key={row.memberId}
                role="listitem"
                style={{ borderTopWidth: k === 0 ? 0 : 1, borderColor: colors.line, paddingVertical: 4 }}
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

const rank: Record<StudioRole, number> = { owner: 0, "co-teacher": 1, pupil: 2 };

/** Those who teach first, the owner before all. */
function inOrder(rows: readonly RosterRow[]): RosterRow[] {
  return [...rows].sort((a, b) => rank[a.role] - rank[b.role] || a.name.localeCompare(b.name, "en"));
}

function changeWords(name: string, role: StudioRole): Pick<QuestionProps, "question" | "text" | "confirmLabel"> {
  if (role === "owner")
    return {
      question: `Pass the studio on to ${name}?`,
      text: "Then only they can delete it, change who teaches and give it back to you. You stay as a teacher.",
      confirmLabel: "Pass it on",
    };
  if (role === "pupil")
    return {
      question: `Make ${name} a pupil?`,
      text: "They see nothing of the other pupils any more, and teach no longer.",
      confirmLabel: "Make them a pupil",
    };
  return {
    question: `Make ${name} a teacher here?`,
    text: "They see and hear everything that the pupils agreed to show.",
    confirmLabel: "Make them a teacher",
  };
}

function Member({ studio, row }: { studio: Studio; row: RosterRow }) {
  const path = `/studios/${studio.id}/members/${row.memberId}`;
  /** chosen, and asked about before it happens */
  const [wanted, setWanted] = useState<StudioRole | null>(null);
  const change = useStudioChange(async (role: StudioRole) => {
    await http.put(path, { role });
    setWanted(null);
  });
  const remove = useStudioChange(() => http.delete(path));
  const box = useRef<HTMLDivElement>(null);
  const owner = studio.me.role === "owner";
  const me = row.memberId === studio.me.memberId;
  const roles = (["co-teacher", "pupil", ...(row.role === "co-teacher" ? (["owner"] as const) : [])] as const).map(
    (value) => ({ value, label: value === "owner" ? "Owner, in your place" : roleWords[value] }),
  );
  return (
    <div ref={box}>
      <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 16 }}>
        <View style={{ flexGrow: 1, flexShrink: 1, minHeight: 48, justifyContent: "center" }}>
          <Text variant="strong">{row.name}</Text>
        </View>
        {owner && !me ? (
          <Select
            inline
            alone
            label={`What ${row.name} is here`}
            options={roles}
            value={wanted ?? (row.role === "owner" ? "co-teacher" : row.role)}
            onChange={(role) => {
              change.reset();
              setWanted(role === row.role ? null : role);
            }}
            testID={`role-${row.memberId}`}
          />
        ) : (
          <Text tone="soft">{me ? `${roleWords[row.role]}, you` : roleWords[row.role]}</Text>
        )}
        {!me && row.role !== "owner" && wanted === null && (
          <AskedTwice
            icon={null}
            label="Take out"
            accessibleName={`Take out: ${row.name}`}
            question={`Take ${row.name} out of the studio?`}
            text={
              row.role === "pupil"
                ? "What they handed in is deleted here. Their own account, voice and songs stay theirs."
                : "They see nothing of the studio any more. What they gave and wrote stays."
            }
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
      {wanted !== null && (
        <Question
          key={wanted}
          {...changeWords(row.name, wanted)}
          failed="Nothing was changed."
          keepLabel="Leave it"
          onConfirm={() => change.mutate(wanted)}
          onKeep={() => {
            setWanted(null);
            box.current?.querySelector("select")?.focus();
          }}
          busy={change.isPending}
          error={change.error}
        />
      )}
    </div>
  );
}
