import { Link } from "expo-router";
import { View, type TextStyle } from "react-native";
import { Card } from "@/features/ui/Card";
import { Icon } from "@/features/ui/Icon";
import { KeySign } from "@/features/ui/KeySign";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import type { PartListing } from "@/shared/contract/studio/assignment";
import { inOrderOfWork, partDue, partPath, stateTone, stateWords } from "../partWords";

/** What a pupil was given: the key, the song, when it is due, and how far it is. */
export function PartRows({ parts, now }: { parts: readonly PartListing[]; now: Date }) {
  if (parts.length === 0)
    return (
      <Text tone="soft" testID="no-parts">
        Nothing yet. Songs that your teacher gives you stand here, in your own key.
      </Text>
    );
  return (
    <Card style={{ padding: 0, paddingVertical: 4 }}>
      <View role="list" testID="parts">
        {inOrderOfWork(parts).map((part, k) => (
          <View
            key={part.id}
            role="listitem"
            style={{ borderTopWidth: k === 0 ? 0 : 1, borderColor: colors.line, marginHorizontal: 16 }}
          >
            <PartRow part={part} now={now} />
          </View>
        ))}
      </View>
    </Card>
  );
}

function PartRow({ part, now }: { part: PartListing; now: Date }) {
  const { id, title, tonic, state, dueOn, studio, assignedBy } = part;
  const due = partDue(state, dueOn, now);
  return (
    <Link
      href={partPath(id)}
      testID={`part-${id}`}
      style={[
        { flexDirection: "row", alignItems: "center", gap: 12, minHeight: 72, paddingVertical: 10 } as TextStyle,
        webStyle({ display: "flex" }),
      ]}
    >
      <View style={{ width: 44, flexShrink: 0 }} aria-hidden>
        <KeySign of={{ tonic, mode: "major" }} size={26} stacked />
      </View>
      <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
        <Text variant="strong" style={{ overflowWrap: "anywhere" } as object}>
          {title}
        </Text>
        <Text variant="small" tone={stateTone[state]}>
          {[stateWords.pupil[state], due].filter(Boolean).join(" · ")}
        </Text>
        <Text variant="small" tone="soft">
          {[assignedBy, studio.name].filter(Boolean).join(", ")}
        </Text>
      </View>
      <Icon name="forward" size={20} color={colors.inkSoft} />
    </Link>
  );
}
