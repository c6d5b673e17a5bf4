import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { Form } from "@/features/ui/Form";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { noteName } from "@/shared/music/pitch";
import { longestName } from "./singers";

/** The four notes of a voice, as typed. */
export interface TypedNotes {
  lowest: string;
  highest: string;
  comfortLow: string;
  comfortTop: string;
}

/** Reads typed notes, or tells each fault in words. */
export type ReadNotes = (
  notes: TypedNotes,
) => { ok: true; voice: SingingVoice } | { ok: false; errors: Partial<Record<keyof TypedNotes, string>> };

export interface SingerFormProps {
  /** what is asked, for screen readers */
  label: string;
  /** to start from; `notes` null where the notes of this singer are not typed here */
  start: { name: string; notes: SingingVoice | null };
  withNotes: boolean;
  readNotes: ReadNotes;
  button: string;
  onKeep: (name: string, notes: SingingVoice | null) => void;
  /** where the form was opened to change somebody; without it, it is empty again after each */
  onCancel?: () => void;
}

const fields: readonly { name: keyof TypedNotes; label: string; hint: string }[] = [
  { name: "lowest", label: "Lowest note", hint: "Such as G3" },
  { name: "highest", label: "Highest note", hint: "Such as D5" },
  { name: "comfortLow", label: "Comfort low (optional)", hint: "Sung gladly" },
  { name: "comfortTop", label: "Comfort top (optional)", hint: "Sung gladly" },
];

type Faults = Partial<Record<keyof TypedNotes | "name", string>>;

/** Name and, for a singer typed by hand, the notes. What was typed stays, also where it is wrong. */
export function SingerForm({ label, start, withNotes, readNotes, button, onKeep, onCancel }: SingerFormProps) {
  const [name, setName] = useState(start.name);
  const [notes, setNotes] = useState<TypedNotes>(() => typed(start.notes));
  const [faults, setFaults] = useState<Faults>({});
  const keep = () => {
    const reading = withNotes ? readNotes(notes) : null;
    const found: Faults = {
      ...(name.trim() === "" ? { name: "Give the singer a name." } : null),
      ...(reading && !reading.ok ? reading.errors : null),
      ...(withNotes && notes.lowest.trim() === "" ? { lowest: "Give the lowest note, such as G3." } : null),
      ...(withNotes && notes.highest.trim() === "" ? { highest: "Give the highest note, such as D5." } : null),
    };
    setFaults(found);
    if (Object.keys(found).length > 0) return;
    onKeep(name.trim().slice(0, longestName), reading?.ok ? reading.voice : null);
    setName(start.name);
    setNotes(typed(start.notes));
  };
  return (
    <Form label={label} onSubmit={keep} gap={12}>
      <Field
        label="Name"
        value={name}
        onChangeText={setName}
        error={faults.name}
        autoFocus={onCancel !== undefined}
        testID="singer-name"
      />
      {withNotes && (
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
          {fields.map((field) => (
            <View key={field.name} style={{ flexGrow: 1, flexBasis: 130 }}>
              <Field
                label={field.label}
                hint={field.hint}
                value={notes[field.name]}
                onChangeText={(text) => setNotes({ ...notes, [field.name]: text })}
                error={faults[field.name]}
                testID={`singer-${field.name}`}
              />
            </View>
          ))}
        </View>
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
        <Button submit small kind="secondary" label={button} onPress={() => undefined} testID="singer-keep" />
        {onCancel && <Button small kind="text" label="Leave it" onPress={onCancel} />}
      </View>
    </Form>
  );
}

/** In a field, accidentals stand as they are typed. */
function typed(notes: SingingVoice | null): TypedNotes {
  if (!notes) return { lowest: "", highest: "", comfortLow: "", comfortTop: "" };
  const { range, comfort } = notes;
  return {
    lowest: noteName(range.lowMidi),
    highest: noteName(range.highMidi),
    comfortLow: noteName(comfort.lowMidi),
    comfortTop: noteName(comfort.highMidi),
  };
}
