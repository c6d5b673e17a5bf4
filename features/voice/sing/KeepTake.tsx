import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Choice } from "@/features/ui/Choice";
import { Field } from "@/features/ui/Field";
import { Form } from "@/features/ui/Form";
import { Heading } from "@/features/ui/Heading";
import type { Voice } from "@/shared/contract/voice";
import { pickVoice } from "../useSingingVoice";
import { newVoice } from "../voiceQueries";

export interface KeepTakeProps {
  voices: readonly Voice[];
  chosenId: string | null;
  busy: boolean;
  onKeep: (voice: Voice) => void;
  onCancel: () => void;
}

/** Into which voice the take goes: one that is there, or a new one with a name. */
export function KeepTake({ voices, chosenId, busy, onKeep, onCancel }: KeepTakeProps) {
  const [fresh] = useState(() => newVoice(""));
  const [place, setPlace] = useState(pickVoice(voices, undefined, chosenId)?.id ?? fresh.id);
  const [name, setName] = useState("");
  const [error, setError] = useState<string>();
  const panel = useRef<View>(null);
  useEffect(() => {
    const shown = panel.current as unknown as HTMLElement | null;
    shown?.scrollIntoView?.({ block: "center" });
    shown?.querySelector<HTMLElement>("[role=radio][aria-checked=true]")?.focus({ preventScroll: true });
  }, []);
  const keep = () => {
    const known = voices.find(({ id }) => id === place);
    if (known) onKeep(known);
    else if (name.trim() === "") setError("Give the voice a name, such as “Head voice”.");
    else onKeep({ ...fresh, name: name.trim() });
  };
  return (
    <View ref={panel} style={{ maxWidth: 560 }}>
      <Card testID="keep-panel">
        <Form label="Keep this voice" onSubmit={keep}>
          <Heading level={2}>Where does it belong?</Heading>
          <Choice
            label="Voice"
            hideLabel
            value={place}
            onChange={setPlace}
            options={[
              ...voices.map(({ id, name: label, byHand }) => ({
                value: id,
                label,
                hint: byHand ? "Takes the place of the notes set by hand" : "Joins the takes that are there",
              })),
              { value: fresh.id, label: "A new voice" },
            ]}
          />
          {place === fresh.id && (
            <Field
              label="Name of the new voice"
              value={name}
              onChangeText={(text) => {
                setName(text.slice(0, 80));
                setError(undefined);
              }}
              error={error}
              testID="keep-name"
            />
          )}
          <View style={{ flexDirection: "row", gap: 10 }}>
            <Button kind="secondary" small label="Not yet" onPress={onCancel} />
            <Button
              small
              submit
              label="Keep"
              busy={busy}
              onPress={() => undefined}
              style={{ flexGrow: 1 }}
              testID="keep-confirm"
            />
          </View>
        </Form>
      </Card>
    </View>
  );
}
