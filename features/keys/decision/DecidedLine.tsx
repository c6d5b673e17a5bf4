import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Text } from "@/features/ui/Text";
import type { SongKeys } from "../useSongKeys";
import { decidedOn } from "./decide";

export interface DecidedLineProps {
  keys: Pick<SongKeys, "decision" | "decided" | "saving" | "undo" | "history" | "remove" | "removed" | "restore">;
}

/** When, why and with which voice the key was chosen, what was chosen before, and the ways back. */
export function DecidedLine({ keys }: DecidedLineProps) {
  const { decision, decided, saving, undo, history, remove } = keys;
  const [open, setOpen] = useState(false);
  if (!decision && keys.removed !== null)
    return (
      <View testID="key-removed" style={row}>
        <Text variant="small" tone="soft">{`${keys.removed} is not your key any more.`}</Text>
        <Button kind="text" small label="Bring it back" disabled={saving} onPress={keys.restore} style={pull} />
      </View>
    );
  if (!decision || !decided || !history) return null;
  const since = `since ${decidedOn(decision)}`;
  const whose = history.voice === null ? "Your key" : `Your key for ${history.voice}`;
  const played = history.way === null ? "" : ` Played with ${history.way}.`;
  return (
    <View testID="decided" style={{ gap: 2 }}>
      <View style={row}>
        <Text variant="small" tone="soft" style={{ flexShrink: 1 }}>
          {decided.otherVoice === null
            ? `${whose} ${since}. ${decision.reason}${played}`
            : `${decided.sign} is decided for ${decided.otherVoice} ${since}. It was not judged for the voice you have chosen now.`}
        </Text>
        <Button
          kind="text"
          small
          label="Undo"
          accessibleName="Undo my key"
          disabled={saving}
          onPress={undo}
          testID="undo-key"
          style={pull}
        />
        <Button
          kind="text"
          small
          label={open ? "Less" : "History"}
          accessibleName={open ? "Hide the history of my key" : "History of my key"}
          onPress={() => setOpen(!open)}
          testID="key-history"
          style={pull}
        />
      </View>
      {open && (
        <View testID="key-history-list" style={{ gap: 4 }}>
          {history.earlier.length === 0 && (
            <Text variant="small" tone="soft">
              Nothing was decided before.
            </Text>
          )}
          {history.earlier.map((line, k) => (
            <Text key={k} variant="small" tone="soft">
              {`${k === 0 ? "Before that: " : ""}${line}`}
            </Text>
          ))}
          {history.others.map((line) => (
            <Text key={line} variant="small" tone="soft">
              {line}
            </Text>
          ))}
          <View style={row}>
            <Button
              kind="text"
              small
              label="Remove my key"
              disabled={saving}
              onPress={remove}
              testID="remove-key"
              style={pull}
            />
          </View>
        </View>
      )}
    </View>
  );
}

const row = { flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 4 } as const;
const pull = { marginVertical: -6 };
