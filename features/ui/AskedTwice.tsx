import { useRef, useState, type ReactNode } from "react";
import { Button } from "./Button";
import type { IconName } from "./Icon";
import { Question } from "./Question";

export interface AskedTwiceProps {
  /** on the button that asks: "Delete the song" */
  label: string;
  /** what is asked: "Delete “Slack Water”?" */
  question: string;
  /** what goes */
  text: string;
  /** before the reason why it did not work: "It is not deleted." */
  failed: string;
  /** what a screen reader says where the label alone is not enough; must contain the label */
  accessibleName?: string;
  /** a bin, where something is deleted */
  icon?: IconName | null;
  /** "Delete it" and "Keep it" unless something else is asked */
  confirmLabel?: string;
  keepLabel?: string;
  /** of the button, as `ButtonLook.flush` */
  flush?: boolean;
  /** what asks, where it is no plain button */
  opener?: (ask: () => void) => ReactNode;
  onRemove: () => void;
  busy: boolean;
  error: Error | null;
  /** of the button; the others follow: "remove-song" */
  testID: string;
}

/** Deletes only after it was asked twice. */
export function AskedTwice({
  label,
  question,
  text,
  failed,
  accessibleName,
  icon = "trash",
  confirmLabel = "Delete it",
  keepLabel = "Keep it",
  flush = false,
  opener: shownOpener,
  onRemove,
  busy,
  error,
  testID,
}: AskedTwiceProps) {
  const [asked, setAsked] = useState(false);
  const opener = useRef<HTMLDivElement>(null);
  const keep = () => {
    setAsked(false);
    requestAnimationFrame(() => opener.current?.querySelector<HTMLElement>("button, [role=switch]")?.focus());
  };
  if (!asked)
    return (
      <div ref={opener}>
        {shownOpener ? (
          shownOpener(() => setAsked(true))
        ) : (
          <Button
            kind="text"
            small
            flush={flush}
            {...(icon === null ? null : { icon })}
            {...(accessibleName === undefined ? null : { accessibleName })}
            label={label}
            onPress={() => setAsked(true)}
            testID={testID}
          />
        )}
      </div>
    );
  return (
    <Question
      {...{ question, text, failed, confirmLabel, keepLabel, busy, error }}
      onConfirm={onRemove}
      onKeep={keep}
    />
  );
}
