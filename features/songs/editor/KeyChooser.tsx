import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import type { KeyName, Mode } from "@/shared/music/keyName";
import { keyWords } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import type { KeyFinding } from "@/shared/songs/findKey";
import { foundWords, modes, sameKey, tonics } from "./keyChoice";

export interface KeyChooserProps {
  finding: KeyFinding | null;
  /** chosen by hand; null = as found */
  chosen: KeyName | null;
  onChoose: (key: KeyName | null) => void;
}

/** The key the song is written in: found, with the reasons, and for the singer to confirm or to change. */
export function KeyChooser({ finding, chosen, onChoose }: KeyChooserProps) {
  const [open, setOpen] = useState(false);
  const key = chosen ?? finding?.key ?? null;
  const byHand = chosen !== null && !(finding && sameKey(chosen, finding.key));
  return (
    <Card testID="written-key" style={{ gap: 8 }}>
      <Heading level={2} size={16}>
        Written key
      </Heading>
      <Text variant="title" testID="written-key-name">
        {key === null ? "Not known yet" : glyphs(keyWords(key))}
      </Text>
      <Text variant="small" tone="soft">
        {byHand && finding
          ? `Chosen by you. The chart looks like ${glyphs(keyWords(finding.key))}.`
          : byHand
            ? "Chosen by you."
            : foundWords(finding)}
      </Text>
      {!byHand && finding && finding.reasons.length > 0 && (
        <View role="list" style={{ gap: 2 }}>
          {finding.reasons.map((reason) => (
            <Text role="listitem" key={reason} variant="small">
              {reason}
            </Text>
          ))}
        </View>
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8, marginLeft: -8 }}>
        {byHand && finding && (
          <Button kind="text" small label={`Use ${glyphs(keyWords(finding.key))}`} onPress={() => onChoose(null)} />
        )}
        {!byHand && finding && (
          <Button
            kind="text"
            small
            label={`It is ${glyphs(keyWords(finding.runnerUp))}`}
            onPress={() => onChoose(finding.runnerUp)}
            testID="runner-up"
          />
        )}
        <Button
          kind="text"
          small
          label={open ? "Close the list" : "Another key"}
          expanded={open}
          onPress={() => setOpen(!open)}
          testID="another-key"
        />
      </View>
      {open && <KeySelects value={key ?? { tonic: "C", mode: "major" }} onChoose={onChoose} />}
    </Card>
  );
}

function KeySelects({ value, onChoose }: { value: KeyName; onChoose: (key: KeyName) => void }) {
  const names = tonics.includes(value.tonic) ? tonics : [...tonics, value.tonic];
  return (
    <View style={{ flexDirection: "row", gap: 12 }}>
      <View style={{ flexGrow: 1, flexBasis: 0, minWidth: 0 }}>
        <Select
          label="Home note"
          testID="key-tonic"
          value={value.tonic}
          options={names.map((tonic) => ({ value: tonic, label: glyphs(tonic) }))}
          onChange={(tonic) => onChoose({ ...value, tonic })}
        />
      </View>
      <View style={{ flexGrow: 2, flexBasis: 0, minWidth: 0 }}>
        <Select<Mode>
          label="Kind of scale"
          testID="key-mode"
          value={value.mode}
          options={modes.map((mode) => ({ value: mode, label: mode }))}
          onChange={(mode) => onChoose({ ...value, mode })}
        />
      </View>
    </View>
  );
}
