import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { glyphs } from "@/shared/music/pitch";
import { effortWords } from "@/shared/voice/effortWords";
import { type KnownTry, useRemoveTry } from "../tryQueries";

export interface TryListProps {
  songId: string;
  /** every try that counts for the voice, newest first */
  tries: readonly KnownTry[];
}

/** All that counts for the voice; each can be taken out again. */
export function TryList({ songId, tries }: TryListProps) {
  const remove = useRemoveTry();
  if (tries.length === 0) return null;
  return (
    <View role="region" aria-label="Tries that count" style={{ gap: 8 }} testID="try-list">
      <Heading level={2}>Tries that count for this voice</Heading>
      {remove.error && <Notice kind="error" title="It is still counted">{`${remove.error.message} Try again.`}</Notice>}
      <View role="list">
        {tries.map((each) => {
          const name = `${glyphs(each.tonic)}, ${whenWords(each.sungAt)}`;
          return (
            <View
              key={each.id}
              role="listitem"
              style={{
                flexDirection: "row",
                flexWrap: "wrap",
                alignItems: "center",
                justifyContent: "space-between",
                columnGap: 16,
                borderTopWidth: 1,
                borderColor: colors.line,
                minHeight: 52,
              }}
            >
              <Text variant="small" style={{ flexShrink: 1 }}>
                <Text style={{ fontWeight: "600" }}>{name}</Text>
                {each.songId === songId ? "" : ", another song"}
                {each.effort === null ? "" : `, felt ${effortWords[each.effort - 1]}`}
                {each.waiting ? ", still on this device only" : ""}
              </Text>
              <Button
                kind="text"
                small
                label="Take out"
                accessibleName={`Take out: ${name}`}
                busy={remove.isPending && remove.variables.id === each.id}
                onPress={() => remove.mutate(each)}
                testID="try-remove"
              />
            </View>
          );
        })}
      </View>
      <Text variant="small" tone="soft">
        Taking one out restores keys and comfort band as they are without it.
      </Text>
    </View>
  );
}

function whenWords(iso: string): string {
  const at = new Date(iso);
  const day = new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "long" }).format(at);
  return `${day}, ${new Intl.DateTimeFormat("en-GB", { hour: "2-digit", minute: "2-digit" }).format(at)}`;
}
