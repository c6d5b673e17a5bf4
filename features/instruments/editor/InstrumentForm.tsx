import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { Heading } from "@/features/ui/Heading";
import { Icon } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { NeckPicture } from "../neck/NeckPicture";
import { HearStrings } from "../sound/HearStrings";
import { mostStrings, newString, type InstrumentDraft, type StringDraft } from "./instrumentDraft";
import { NeckFields } from "./NeckFields";
import { PhotoField } from "./photo/PhotoField";
import { readNote, sketchOf, type DraftErrors } from "./readDraft";
import { StringFields } from "./StringFields";

export interface InstrumentFormProps {
  draft: InstrumentDraft;
  errors: DraftErrors;
  onChange: (change: Partial<InstrumentDraft>) => void;
}

/** Everything about an instrument, with its neck drawn and heard as it is typed. */
export function InstrumentForm({ draft, errors, onChange }: InstrumentFormProps) {
  const wide = useLayout() === "wide";
  const { strings } = draft;
  const setStrings = (next: StringDraft[]) => onChange({ strings: next });
  const move = (index: number, by: -1 | 1) => {
    const next = [...strings];
    const [moved] = next.splice(index, 1);
    next.splice(index + by, 0, moved!);
    setStrings(next);
  };
  const fields = (
    <View style={{ gap: 12 }}>
      <Heading level={2}>Strings</Heading>
      {strings.map((string, index) => (
        <StringFields
          key={string.key}
          string={string}
          index={index}
          count={strings.length}
          units={draft.units}
          errors={errors}
          onChange={(change) => setStrings(strings.map((each) => (each === string ? { ...each, ...change } : each)))}
          onMove={(by) => move(index, by)}
          onRemove={() => setStrings(strings.filter((each) => each !== string))}
        />
      ))}
      {errors.strings !== undefined && <Wrong>{errors.strings}</Wrong>}
      {strings.length < mostStrings && (
        <Button
          kind="secondary"
          small
          icon="plus"
          label="Add a string"
          onPress={() => setStrings([...strings, newString(strings)])}
          testID="add-string"
          style={{ alignSelf: "flex-start" }}
        />
      )}
    </View>
  );
  const name = (
    <Field
      label="Name"
      value={draft.name}
      placeholder="What you call it"
      onChangeText={(text) => onChange({ name: text })}
      error={errors.name}
      testID="instrument-name"
    />
  );
  const neck = <NeckFields draft={draft} errors={errors} onChange={onChange} />;
  const photo = <PhotoField photo={draft.photo} name={draft.name} onChange={(next) => onChange({ photo: next })} />;
  const look = <Sketch draft={draft} />;
  if (!wide)
    return (
      <View style={{ gap: 24 }}>
        {name}
        {look}
        {fields}
        {neck}
        {photo}
      </View>
    );
  const column = { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0, gap: 24 } as const;
  return (
    <View style={{ flexDirection: "row", gap: 32 }}>
      <View style={column}>
        {name}
        {fields}
      </View>
      <View style={column}>
        {look}
        {neck}
        {photo}
      </View>
    </View>
  );
}

/** The instrument as far as it is known. */
function Sketch({ draft }: { draft: InstrumentDraft }) {
  const [sounding, setSounding] = useState<number | null>(null);
  const { strings } = draft;
  const sketch = sketchOf(draft);
  return (
    <View style={{ gap: 12 }}>
      <Heading level={2}>Look and sound</Heading>
      {sketch ? (
        <>
          <NeckPicture instrument={sketch} sounding={sounding} />
          <HearStrings strings={sketch.strings} onSounding={setSounding} />
        </>
      ) : (
        <Text variant="small" tone="soft">
          {strings.some(({ note }) => readNote(note) !== null)
            ? "Scale or frets cannot be read yet. Once they can, the neck is drawn and can be heard here."
            : "Name the note of a string, and the neck is drawn and can be heard here."}
        </Text>
      )}
    </View>
  );
}

function Wrong({ children }: { children: string }) {
  return (
    <View role="alert" style={{ flexDirection: "row", gap: 5 }}>
      <Icon name="warning" size={16} color={colors.brick} />
      <Text variant="tiny" tone="brick">
        {children}
      </Text>
    </View>
  );
}
