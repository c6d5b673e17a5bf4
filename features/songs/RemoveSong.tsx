import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";

export interface RemoveSongProps {
  title: string;
  onRemove: () => void;
  busy: boolean;
  error: Error | null;
}

/** Deletes only after it was asked twice. */
export function RemoveSong({ title, onRemove, busy, error }: RemoveSongProps) {
  const [asked, setAsked] = useState(false);
  const question = useRef<HTMLDivElement>(null);
  const opener = useRef<HTMLDivElement>(null);
  const keep = () => {
    setAsked(false);
    requestAnimationFrame(() => opener.current?.querySelector("button")?.focus());
  };
  useEffect(() => {
    if (!asked) return;
    question.current?.focus({ preventScroll: true });
    // The foot of the phone stands over the end of the page: in the middle the whole question is seen.
    question.current?.scrollIntoView({ block: "center" });
  }, [asked]);
  if (!asked)
    return (
      <div ref={opener}>
        <Button
          kind="text"
          small
          icon="trash"
          label="Delete the song"
          onPress={() => setAsked(true)}
          testID="remove-song"
        />
      </div>
    );
  return (
    <div ref={question} role="group" aria-label={`Delete “${title}”?`} tabIndex={-1}>
      <Notice kind="caution" title={`Delete “${title}”?`} testID="remove-asked">
        <Text variant="small">Its chart, its melody and your key for it go too. This cannot be undone.</Text>
        {error && (
          <Text variant="small" tone="brick">
            {`It is not deleted. ${error.message}`}
          </Text>
        )}
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8, marginTop: 8 }}>
          <Button small label="Delete it" busy={busy} onPress={onRemove} testID="remove-confirmed" />
          <Button kind="secondary" small label="Keep it" onPress={keep} />
        </View>
      </Notice>
    </div>
  );
}
