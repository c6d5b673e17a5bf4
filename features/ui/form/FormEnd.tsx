import type { RefObject } from "react";
import { View } from "react-native";
import { Button } from "../Button";
import { LiveText } from "../LiveText";
import { Notice } from "../Notice";

interface FormEndProps {
  /** what was refused and belongs to no field */
  refusal: { code: string; message: string } | null;
  sending: boolean;
  /** where the refusal stands, so that it can take the focus */
  problem: RefObject<HTMLDivElement | null>;
  sendLabel: string;
  busyLabel: string;
  /** a button among other cards, instead of the one of the page */
  small?: boolean;
  testID?: string;
}

const noticeKind = (code: string) => (code === "offline" ? "offline" : code === "too-many-tries" ? "caution" : "error");

/** The foot of a form: what was refused, and the button that sends. */
export function FormEnd({ refusal, problem, sending, sendLabel, busyLabel, small = false, testID }: FormEndProps) {
  const button = (
    <Button
      submit
      small={small}
      label={sending ? busyLabel : sendLabel}
      busy={sending}
      onPress={() => undefined}
      testID={testID ?? "send"}
    />
  );
  return (
    <>
      {refusal && (
        <div ref={problem} tabIndex={-1}>
          <Notice kind={noticeKind(refusal.code)} testID="form-problem">
            {refusal.code === "offline" ? `${refusal.message} What you typed is still here.` : refusal.message}
          </Notice>
        </div>
      )}
      {small ? <View style={{ alignSelf: "flex-start" }}>{button}</View> : button}
      <LiveText hidden>{sending ? busyLabel : ""}</LiveText>
    </>
  );
}
