import { useQuery } from "@tanstack/react-query";
import { Link, type Href } from "expo-router";
import { View, type TextStyle } from "react-native";
import { EmptyState } from "@/features/ui/EmptyState";
import { Icon } from "@/features/ui/Icon";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import type { AssignmentListing } from "@/shared/contract/studio/assignment";
import type { Studio } from "@/shared/contract/studio/studio";
import { plural } from "@/shared/music/countWords";
import { dayOf, dueWords } from "../dayWords";
import { studioQueries } from "../studioQueries";

/** The songs given in a studio: those with takes to hear first, then the newest. */
export function AssignmentsScreen({ studio, now }: { studio: Studio; now: Date }) {
  const query = useQuery(studioQueries.assignments(studio.id));
  return (
    <QueryState query={query} title="The assignments could not be listed">
      {(all) =>
        all.length === 0 ? (
          <EmptyState
            testID="no-assignments"
            title="No song is given yet"
            text="Choose a song of your shelf: each pupil gets it in a key and a way from their own voice and instrument."
            action={<LinkButton label="Assign a song" href={`/studio/${studio.id}/assign` as Href} />}
          />
        ) : (
          <View role="list" testID="assignments" style={{ maxWidth: 860 }}>
            {toHearFirst(all).map((each) => (
              <View key={each.id} role="listitem" style={{ borderBottomWidth: 1, borderColor: colors.line }}>
                <Row studioId={studio.id} each={each} now={now} />
              </View>
            ))}
          </View>
        )
      }
    </QueryState>
  );
}

function toHearFirst(all: readonly AssignmentListing[]): AssignmentListing[] {
  const waits = ({ counts }: AssignmentListing) => (counts.waiting > 0 ? 0 : 1);
  return [...all].sort((a, b) => waits(a) - waits(b) || b.assignedAt.localeCompare(a.assignedAt));
}

function Row({ studioId, each, now }: { studioId: string; each: AssignmentListing; now: Date }) {
  const { id, title, dueOn, assignedAt, counts } = each;
  return (
    <Link
      href={`/studio/${studioId}/assignments/${id}` as Href}
      testID={`assignment-${id}`}
      style={[
        { flexDirection: "row", alignItems: "center", gap: 12, minHeight: 72, paddingVertical: 10 } as TextStyle,
        webStyle({ display: "flex" }),
      ]}
    >
      <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
        <Text variant="strong" style={{ overflowWrap: "anywhere" } as object}>
          {title}
        </Text>
        <Text variant="small" tone="soft">
          {[
            `given ${dayOf(assignedAt, now)} to ${plural(counts.parts, "pupil")}`,
            dueOn && counts.accepted < counts.parts && dueWords(dueOn, now),
            counts.accepted > 0 && `${counts.accepted} accepted`,
          ]
            .filter(Boolean)
            .join(" · ")}
        </Text>
        {counts.waiting > 0 && (
          <Text variant="small" tone="plum" style={{ fontWeight: "600" }}>
            {`${plural(counts.waiting, "take")} to hear`}
          </Text>
        )}
      </View>
      <Icon name="forward" size={20} color={colors.inkSoft} />
    </Link>
  );
}
