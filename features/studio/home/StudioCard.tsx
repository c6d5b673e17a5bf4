import { Link, type Href } from "expo-router";
import { View, type TextStyle } from "react-native";
import { Card } from "@/features/ui/Card";
import { Icon } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import type { Studio } from "@/shared/contract/studio/studio";
import { listWords } from "@/shared/music/listWords";
import { plural } from "@/shared/music/countWords";
import { studioFacts } from "../roster/rosterWords";
import { teaches } from "../StudioPage";

/** One studio in the list: what it is called, who is in it, and what waits. */
export function StudioCard({ studio, now }: { studio: Studio; now: Date }) {
  const { counts, me, teachers } = studio;
  const taught = teaches(studio);
  const people = taught
    ? `${plural(counts?.pupils ?? 0, "pupil")} · ${studioFacts(studio, now)}`
    : `with ${listWords(teachers.map(({ name }) => name))}`;
  return (
    <Card style={{ padding: 0 }}>
      <Link
        href={`/studio/${studio.id}` as Href}
        testID={`studio-${studio.id}`}
        style={[
          { flexDirection: "row", alignItems: "center", gap: 12, minHeight: 76, padding: 16 } as TextStyle,
          webStyle({ display: "flex" }),
        ]}
      >
        <View style={{ flexGrow: 1, flexShrink: 1, gap: 2, minWidth: 0 }}>
          <Text variant="strong" style={{ overflowWrap: "anywhere" } as object}>
            {studio.name}
          </Text>
          <Text variant="small" tone="soft">
            {people}
          </Text>
          {!taught && !me.consent.shares && (
            <Text variant="small" tone="honey">
              {me.consent.waitsForGuardian
                ? "Waits for your guardian’s word: your teachers see only your name."
                : "You have not agreed to show anything: your teachers see only your name."}
            </Text>
          )}
        </View>
        <Icon name="forward" size={20} color={colors.inkSoft} />
      </Link>
    </Card>
  );
}
