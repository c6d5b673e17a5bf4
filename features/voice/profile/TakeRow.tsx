import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { IconButton } from "@/features/ui/IconButton";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { Take } from "@/shared/contract/take";
import { AfterSinging } from "../sing/AfterSinging";
import { bandWords, effortWords, warmedWords, whenWords } from "../noteWords";
import { inTune } from "@/shared/voice/shownTake";

export interface TakeRowProps {
  take: Take;
  /** the notes of the voice without this take, in words */
  without: string;
  busy: boolean;
  onErase: () => void;
  onChange: (take: Take) => void;
}

/** One take: what and when, how it felt (which can be said and taken back later), and erasing it. */
export function TakeRow({ take, without, busy, onErase, onChange }: TakeRowProps) {
  const [open, setOpen] = useState<"felt" | "erase" | null>(null);
  const when = whenWords(take.sungAt);
  return (
    <View role="listitem" testID="take-row" style={{ borderTopWidth: 1, borderColor: colors.line, paddingVertical: 8 }}>
      <View style={{ flexDirection: "row", alignItems: "center", gap: 4 }}>
        <View style={{ flexGrow: 1, flexShrink: 1 }}>
          <Text variant="strong">{bandWords(inTune(take.range, take.tuningCents))}</Text>
          <Text variant="small" tone="soft">
            {factsOf(take)}
          </Text>
        </View>
        <IconButton
          icon="edit"
          label={`How the take of ${when} felt`}
          onPress={() => setOpen(open === "felt" ? null : "felt")}
          testID="take-felt"
        />
        <IconButton
          icon="trash"
          label={`Erase the take of ${when}`}
          onPress={() => setOpen(open === "erase" ? null : "erase")}
          testID="take-erase"
        />
      </View>
      {open === "felt" && (
        <View role="group" aria-label="How it felt" style={{ gap: 8, paddingVertical: 8, maxWidth: 420 }}>
          <AfterSinging
            warmedUp={take.warmedUp}
            effort={take.effort}
            onChange={(warmedUp, effort) => onChange({ ...take, warmedUp, effort })}
          />
          <Text variant="small" tone="soft">
            What felt easy brings the comfortable notes closer to the ends; what felt hard draws them in.
          </Text>
          <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
            {take.effort !== null && (
              <Button
                small
                kind="secondary"
                label="Take the rating back"
                onPress={() => onChange({ ...take, effort: null })}
                testID="take-unrate"
              />
            )}
            <Button small kind="secondary" label="Done" onPress={() => setOpen(null)} testID="take-felt-done" />
          </View>
        </View>
      )}
      {open === "erase" && (
        <View role="group" aria-label="Erase this take?" style={{ gap: 8, paddingVertical: 8 }}>
          <Text variant="small">{`Erase this take? ${without} This cannot be undone.`}</Text>
          <View style={{ flexDirection: "row", gap: 10 }}>
            <Button small kind="secondary" label="Keep it" onPress={() => setOpen(null)} />
            <Button small label="Erase" busy={busy} onPress={onErase} testID="take-erase-confirm" />
          </View>
        </View>
      )}
    </View>
  );
}

function factsOf({ sungAt, effort, warmedUp, kind, shows }: Take): string {
  const what =
    kind === "hold" ? { both: "guided hold", low: "guided hold, low end", high: "guided hold, high end" }[shows] : null;
  const felt = effort === null ? null : `felt ${effort} of 5, ${effortWords[effort - 1]}`;
  return [what, whenWords(sungAt), warmedWords(warmedUp), felt].filter((fact) => fact !== null).join(" · ");
}
