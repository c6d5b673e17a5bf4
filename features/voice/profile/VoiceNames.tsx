import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Choice } from "@/features/ui/Choice";
import { Field } from "@/features/ui/Field";
import { Form } from "@/features/ui/Form";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import type { Voice } from "@/shared/contract/voice";
import { newVoice } from "../voiceQueries";

export interface VoiceNamesProps {
  voices: readonly Voice[];
  chosen: Voice;
  takeCount: (voice: Voice) => number;
  busy: boolean;
  onChoose: (id: string) => void;
  onSave: (voice: Voice) => void;
  onRemove: (voice: Voice) => void;
}

type Doing = "renaming" | "adding" | "deleting" | null;

/** All voices of this person: switch, rename, add, delete. */
export function VoiceNames({ voices, chosen, takeCount, busy, onChoose, onSave, onRemove }: VoiceNamesProps) {
  const [doing, setDoing] = useState<Doing>(null);
  const end = () => setDoing(null);
  const toggle = (next: Doing) => () => setDoing(doing === next ? null : next);
  return (
    <View role="region" aria-label="Your voices" style={{ gap: 10 }}>
      <Heading level={2}>Your voices</Heading>
      {voices.length > 1 && (
        <Choice
          label="The voice that keys are found for"
          value={chosen.id}
          onChange={onChoose}
          options={voices.map((voice) => ({
            value: voice.id,
            label: voice.name,
            hint: hintOf(voice, takeCount(voice)),
          }))}
          testID="voice-choice"
        />
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 12, marginLeft: -8 }}>
        <Button
          kind="text"
          icon="plus"
          label="New voice"
          expanded={doing === "adding"}
          onPress={toggle("adding")}
          testID="voice-new"
        />
        <Button
          kind="text"
          icon="edit"
          label="Rename"
          accessibleName={`Rename ${chosen.name}`}
          expanded={doing === "renaming"}
          onPress={toggle("renaming")}
          testID="voice-rename"
        />
        <Button
          kind="text"
          icon="trash"
          label="Delete"
          accessibleName={`Delete ${chosen.name}`}
          expanded={doing === "deleting"}
          onPress={toggle("deleting")}
          testID="voice-delete"
        />
      </View>
      {(doing === "renaming" || doing === "adding") && (
        <VoiceName
          key={doing}
          label={doing === "adding" ? "Name of the new voice" : "New name"}
          start={doing === "adding" ? "" : chosen.name}
          busy={busy}
          onCancel={end}
          onName={(name) => {
            onSave(doing === "adding" ? newVoice(name) : { ...chosen, name });
            end();
          }}
        />
      )}
      {doing === "deleting" && (
        <View role="group" aria-label={`Delete ${chosen.name}?`} style={{ gap: 8 }}>
          <Text variant="small">
            {`Delete ${chosen.name} with its ${takeWords(takeCount(chosen))}? This cannot be undone. Your songs stay.`}
          </Text>
          <View style={{ flexDirection: "row", gap: 10 }}>
            <Button small kind="secondary" label="Keep it" onPress={end} />
            <Button
              small
              label="Delete"
              busy={busy}
              onPress={() => {
                onRemove(chosen);
                end();
              }}
              testID="voice-delete-confirm"
            />
          </View>
        </View>
      )}
    </View>
  );
}

interface VoiceNameProps {
  label: string;
  start: string;
  busy: boolean;
  onName: (name: string) => void;
  onCancel: () => void;
}

function VoiceName({ label, start, busy, onName, onCancel }: VoiceNameProps) {
  const [name, setName] = useState(start);
  const [error, setError] = useState<string>();
  const send = () => (name.trim() === "" ? setError("Give the voice a name.") : onName(name.trim().slice(0, 80)));
  return (
    <Form label={label} onSubmit={send} gap={10}>
      <Field label={label} value={name} onChangeText={setName} error={error} autoFocus testID="voice-name" />
      <View style={{ flexDirection: "row", gap: 10 }}>
        <Button small kind="secondary" label="Cancel" onPress={onCancel} />
        <Button small submit label="Save" busy={busy} onPress={() => undefined} testID="voice-name-save" />
      </View>
    </Form>
  );
}

function hintOf(voice: Voice, takes: number): string {
  return voice.byHand ? "Notes set by hand" : takes === 0 ? "Nothing sung yet" : takeWords(takes);
}

function takeWords(count: number): string {
  return `${count} ${count === 1 ? "take" : "takes"}`;
}
