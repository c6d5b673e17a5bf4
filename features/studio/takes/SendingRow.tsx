import type { ReactNode } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import { webProps } from "@/features/ui/webStyle";
import { takeSender, type Sending } from "./takeSender";

const megabytes = (bytes: number) => (bytes / 1_000_000).toFixed(1);

export interface SendingRowProps {
  sending: Sending;
  /** "Ida Fenn gets a mail." */
  sentWords: string;
  /** where to go once it has arrived */
  sentAction?: ReactNode;
}

/** A recording on its way: how far it is, what it waits for, or why it was not taken. */
export function SendingRow({ sending, sentWords, sentAction }: SendingRowProps) {
  const { id, state, bytes, sentBytes, message } = sending;
  if (state === "sent")
    return (
      <Notice kind="good" title="Handed in" action={sentAction} testID="handed-in">
        {sentWords}
      </Notice>
    );
  if (state === "refused")
    return (
      <Notice
        kind="error"
        title="Not handed in"
        testID="hand-in-refused"
        action={
          <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
            <Button kind="secondary" small icon="again" label="Try again" onPress={() => takeSender.again(id)} />
            <Button kind="text" small label="Give it up" onPress={() => void takeSender.giveUp(id)} />
          </View>
        }
      >
        {`${message ?? ""} The take is still on this device.`}
      </Notice>
    );
  const share = bytes === 0 ? 0 : Math.min(1, sentBytes / bytes);
  return (
    <View style={{ gap: 6 }} testID="hand-in-sending">
      <Text variant="small">
        {state === "waiting"
          ? "Waiting for the connection. The take is safe on this device and goes on by itself."
          : `Handing in: ${megabytes(sentBytes)} of ${megabytes(bytes)} MB`}
      </Text>
      <View
        {...webProps({
          role: "progressbar",
          "aria-label": "Handed in so far",
          "aria-valuemin": 0,
          "aria-valuemax": 100,
          "aria-valuenow": Math.round(100 * share),
        })}
        style={{ height: 8, borderRadius: 4, backgroundColor: mixtures.tint, overflow: "hidden" }}
      >
        <View style={{ height: 8, width: `${100 * share}%`, borderRadius: 4, backgroundColor: colors.lagoon }} />
      </View>
      {state === "waiting" && (
        <Button
          kind="text"
          small
          icon="again"
          label="Try now"
          onPress={() => takeSender.again(id)}
          style={{ alignSelf: "flex-start" }}
        />
      )}
    </View>
  );
}
