import type { Href } from "expo-router";
import { useEffect, useRef, useState } from "react";
import { View, type StyleProp, type ViewStyle } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { KeySign } from "@/features/ui/KeySign";
import { LinkButton } from "@/features/ui/LinkButton";
import { Text } from "@/features/ui/Text";
import { webProps } from "@/features/ui/webStyle";
import type { SongKeys } from "../useSongKeys";
import { PastChoices } from "./PastChoices";

export interface DecisionCardProps {
  keys: Pick<SongKeys, "decided" | "saving" | "undo" | "history" | "remove" | "removed" | "restore" | "again">;
  /** where the decided key stands on paper */
  sheet?: Href;
  style?: StyleProp<ViewStyle>;
}

/** The decided key: which, for whom, since when, why and how it is played; what was decided before, and the ways back. */
export function DecisionCard({ keys, sheet, style }: DecisionCardProps) {
  const { decided, saving, history, removed } = keys;
  const [open, setOpen] = useState(false);
  const wasRemoved = useRef(removed);
  useEffect(() => {
    const [was, is] = [wasRemoved.current !== null, removed !== null];
    wasRemoved.current = removed;
    // The button that was pressed may be gone; the next step takes the focus then.
    if (was === is || document.activeElement !== document.body) return;
    document.querySelector<HTMLElement>(`[data-testid=${is ? "bring-back" : "key-history"}]`)?.focus();
  }, [removed]);
  if (!history && removed === null) return null;
  return (
    <View style={[{ gap: 8 }, style]}>
      <View {...webProps({ role: "status" })}>
        {removed !== null && (
          <View testID="key-removed" style={row}>
            <Text variant="small" tone="soft">{`${removed} is not your key any more.`}</Text>
            <Button
              kind="text"
              small
              label="Bring it back"
              disabled={saving}
              onPress={keys.restore}
              testID="bring-back"
              style={pull}
            />
          </View>
        )}
      </View>
      {history && decided && (
        <Card testID="decided" style={{ gap: 8 }}>
          <View style={{ flexDirection: "row", alignItems: "center", gap: 14 }}>
            <KeySign of={history.now.key} size={40} stacked />
            <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 }}>
              <Text variant="strong">{titleOf(history.now.voice, decided.otherVoice)}</Text>
              <Text variant="small" tone="soft">{`since ${history.now.on}`}</Text>
            </View>
          </View>
          <Text variant="small">
            {decided.otherVoice === null ? history.now.reason : "It was not judged for the voice you have chosen now."}
          </Text>
          {history.now.way !== null && (
            <Text variant="small">
              <Text tone="soft">Played with </Text>
              {history.now.way}
            </Text>
          )}
          <View style={[row, { marginLeft: -8, marginBottom: -8 }]}>
            {decided.otherVoice === null && (
              <Button
                kind="text"
                small
                label="Undo"
                accessibleName="Undo my key"
                disabled={saving}
                onPress={keys.undo}
                testID="undo-key"
              />
            )}
            {sheet && (
              <LinkButton kind="text" small icon="file" label="Make the sheet" href={sheet} testID="decided-sheet" />
            )}
            <Button
              kind="text"
              small
              icon={open ? "up" : "forward"}
              label="History"
              accessibleName="History of my key"
              expanded={open}
              onPress={() => setOpen(!open)}
              testID="key-history"
            />
            {decided.otherVoice === null && open && (
              <Button
                kind="text"
                small
                label="Remove"
                accessibleName="Remove my key"
                disabled={saving}
                onPress={keys.remove}
                testID="remove-key"
              />
            )}
          </View>
          {open && (
            <PastChoices history={history} onAgain={decided.otherVoice === null && !saving ? keys.again : undefined} />
          )}
        </Card>
      )}
    </View>
  );
}

function titleOf(voice: string | null, otherVoice: string | null): string {
  if (otherVoice !== null) return `Decided for ${otherVoice}`;
  if (voice === null) return "Your key, whoever sings";
  return /^(my|your) voice$/i.test(voice.trim()) ? "Your key" : `Your key for ${voice}`;
}

const row = { flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 4 } as const;
const pull = { marginVertical: -6 };
