import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { Pressable, View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Chip } from "@/features/ui/Chip";
import { Field } from "@/features/ui/Field";
import { Form } from "@/features/ui/Form";
import { Icon } from "@/features/ui/Icon";
import { LiveText } from "@/features/ui/LiveText";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { songQueries, useChangeSong } from "../../songQueries";
import { suggestedTags, tagProblem, withTag } from "./songTags";

/** The tags of a song: take one off, add one, with the tags of other songs at hand. Each change is kept at once. */
export function TagEditor({ id, tags }: { id: string; tags: readonly string[] }) {
  const known = useQuery(songQueries.tags()).data ?? [];
  const change = useChangeSong();
  // What was just changed stands here before the shelf has answered.
  const [pending, setPending] = useState<readonly string[] | null>(null);
  const [typed, setTyped] = useState("");
  const [problem, setProblem] = useState<string | null>(null);
  const [said, setSaid] = useState("");
  const now = pending ?? tags;

  const keep = (next: readonly string[], words: string) => {
    setPending(next);
    change.mutate(
      { id, change: { tags: [...next] } },
      {
        onSuccess: () => setSaid(words),
        onSettled: () => setPending(null),
      },
    );
  };
  const add = (text: string) => {
    const wrong = tagProblem(now, text);
    setProblem(wrong);
    if (wrong !== null) return;
    setTyped("");
    const next = withTag(
      now,
      text,
      known.map(({ tag }) => tag),
    );
    keep(next, `${next.at(-1) ?? ""} added.`);
  };
  const suggestions = suggestedTags(known, now, typed);
  return (
    <View style={{ gap: 10 }}>
      {now.length > 0 ? (
        <View
          role="list"
          aria-label="Tags of this song"
          style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8 }}
        >
          {now.map((tag) => (
            <View role="listitem" key={tag}>
              <TagWithCross
                tag={tag}
                onRemove={() =>
                  keep(
                    now.filter((each) => each !== tag),
                    `${tag} taken off.`,
                  )
                }
              />
            </View>
          ))}
        </View>
      ) : (
        <Text variant="small" tone="soft">
          No tags yet. A tag gathers songs: a set, a mood, who sings it.
        </Text>
      )}
      <Form label="Add a tag" gap={4} onSubmit={() => add(typed)}>
        <View style={{ flexDirection: "row", gap: 8, alignItems: "flex-end" }}>
          <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
            <Field
              label="Add a tag"
              value={typed}
              autoComplete="off"
              onChangeText={(text) => {
                setTyped(text);
                setProblem(null);
              }}
              error={problem ?? undefined}
              testID="tag-field"
            />
          </View>
          <Button kind="secondary" small submit label="Add" onPress={() => undefined} testID="tag-add" />
        </View>
      </Form>
      {suggestions.length > 0 && (
        <View role="group" aria-label="Tags you use" style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8 }}>
          {suggestions.map((tag) => (
            <Chip key={tag} label={tag} onPress={() => add(tag)} testID={`suggest-${tag}`} />
          ))}
        </View>
      )}
      {change.error ? (
        <Text variant="small" tone="brick">
          {`The tags are not kept. ${change.error.message}`}
        </Text>
      ) : (
        <LiveText hidden testID="tags-said">
          {said}
        </LiveText>
      )}
    </View>
  );
}

function TagWithCross({ tag, onRemove }: { tag: string; onRemove: () => void }) {
  return (
    <Pressable
      role="button"
      aria-label={`Take the tag ${tag} off`}
      onPress={onRemove}
      testID={`untag-${tag}`}
      style={{ minHeight: 48, justifyContent: "center" }}
    >
      <View
        style={{
          flexDirection: "row",
          alignItems: "center",
          gap: 6,
          height: 32,
          paddingHorizontal: 12,
          borderRadius: 999,
          borderWidth: 1,
          borderColor: colors.inkSoft,
          backgroundColor: colors.card,
        }}
      >
        <Text variant="label" style={{ fontSize: 14, lineHeight: 18 }}>
          {tag}
        </Text>
        <Icon name="close" size={16} color={colors.inkSoft} />
      </View>
    </Pressable>
  );
}
