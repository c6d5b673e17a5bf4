import { useEffect, useRef, type KeyboardEvent } from "react";
import { View } from "react-native";
import { Button } from "./Button";
import { Notice } from "./Notice";
import { Text } from "./Text";

export interface QuestionProps {
  /** what is asked: "Delete “Slack Water”?" */
  question: string;
  /** what would happen */
  text: string;
  /** before the reason why it did not work: "It is not deleted." */
  failed: string;
  confirmLabel: string;
  keepLabel: string;
  onConfirm: () => void;
  onKeep: () => void;
  busy: boolean;
  error: Error | null;
}

/** Asks whether something is meant that cannot be undone with one press; takes the focus. */
export function Question(props: QuestionProps) {
  const { question, text, failed, confirmLabel, keepLabel, onConfirm, onKeep, busy, error } = props;
  const group = useRef<HTMLDivElement>(null);
  useEffect(() => {
    group.current?.focus({ preventScroll: true });
    // The foot of the phone stands over the end of the page: in the middle the whole question is seen.
    group.current?.scrollIntoView({ block: "center" });
  }, []);
  const keepOnEscape = (event: KeyboardEvent) => {
    if (event.key !== "Escape" || busy) return;
    // Only the question goes, not the dialog that it stands in.
    event.preventDefault();
    event.stopPropagation();
    onKeep();
  };
  return (
    <div ref={group} role="group" aria-label={question} tabIndex={-1} onKeyDown={keepOnEscape}>
      <Notice kind="caution" title={question} testID="remove-asked">
        <Text variant="small">{text}</Text>
        {error && (
          <Text variant="small" tone="brick">
            {`${failed} ${error.message}`}
          </Text>
        )}
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8, marginTop: 8 }}>
          <Button small label={confirmLabel} busy={busy} onPress={onConfirm} testID="remove-confirmed" />
          <Button kind="secondary" small label={keepLabel} onPress={onKeep} />
        </View>
      </Notice>
    </div>
  );
}
