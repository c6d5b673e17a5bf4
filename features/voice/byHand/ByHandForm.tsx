import { useState } from "react";
import { Controller, useForm, type Resolver } from "react-hook-form";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { Form } from "@/features/ui/Form";
import { IconButton } from "@/features/ui/IconButton";
import { Notice } from "@/features/ui/Notice";
import { PhoneFoot } from "@/features/ui/PhoneFoot";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import { noteName, parseNoteName } from "@/shared/music/pitch";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { readByHand, usualComfort, type ByHandFields } from "./byHand";
import { NoteLadder } from "./NoteLadder";
import { noteWord } from "../noteWords";
import { useByHandDraft, useNoted } from "./useByHandDraft";

export interface ByHandFormProps {
  /** under which what was typed is found again after a reload */
  place: string;
  /** what the voice has now, to start from */
  voice: SingingVoice | null;
  busy: boolean;
  /** why keeping failed, in words */
  refusal: string | null;
  onKeep: (voice: SingingVoice) => void;
}

const rows: readonly { name: keyof ByHandFields; label: string; hint: string }[] = [
  { name: "lowest", label: "Lowest note", hint: "The lowest you can hold" },
  { name: "highest", label: "Highest note", hint: "The highest you can hold" },
  { name: "comfortLow", label: "Comfort low (optional)", hint: "The lowest you sing gladly" },
  { name: "comfortTop", label: "Comfort top (optional)", hint: "The highest you sing gladly" },
];

const resolver: Resolver<ByHandFields> = (values) => {
  const reading = readByHand(values);
  if (reading.ok) return { values, errors: {} };
  return {
    values: {},
    errors: Object.fromEntries(
      Object.entries(reading.errors).map(([name, message]) => [name, { type: "note", message }]),
    ),
  };
};

/** The four notes of a voice, typed or tapped. What was typed stays, also where it is wrong. */
export function ByHandForm({ place, voice, busy, refusal, onKeep }: ByHandFormProps) {
  const draft = useByHandDraft(place, fieldsOf(voice));
  const { control, handleSubmit, setValue, getValues, watch, trigger, reset, formState } = useForm<ByHandFields>({
    defaultValues: draft.start,
    resolver,
    mode: "onTouched",
  });
  const phone = useLayout() === "phone";
  const [active, setActive] = useState<keyof ByHandFields>("lowest");
  const values = watch();
  useNoted(values, draft.note);
  const set = (name: keyof ByHandFields, midi: number) => {
    setValue(name, noteName(midi), { shouldDirty: true });
    if (formState.isSubmitted || formState.errors[name]) void trigger();
  };
  const step = (name: keyof ByHandFields, by: number) =>
    set(name, (parseNoteName(getValues(name)) ?? startOf(name, values)) + by);
  const keep = handleSubmit((typed) => {
    const reading = readByHand(typed);
    if (reading.ok) onKeep(reading.voice);
  });
  const tap = (midi: number) => {
    set(active, midi);
    // Two taps are a voice: the second one is the highest note.
    if (active === "lowest" && getValues("highest") === "") setActive("highest");
  };
  const found = draft.found && (
    <Notice
      kind="good"
      testID="by-hand-restored"
      title="Your notes are back"
      action={
        <Button
          kind="text"
          small
          label="Start afresh"
          onPress={() => {
            reset(draft.base);
            draft.giveUp();
            // The button that was pressed is gone with its notice.
            document.querySelector("h1")?.focus({ preventScroll: true });
          }}
          testID="by-hand-afresh"
        />
      }
    >
      What you entered and did not keep stands here again.
    </Notice>
  );
  const refused = refusal !== null && (
    <Notice kind="error" title="Not kept">
      {refusal}
    </Notice>
  );
  const how = (
    <Text variant="small" tone="soft">
      Type a letter and an octave: C4 is the C in the middle of a piano. Singing a few seconds finds the same notes for
      you.
    </Text>
  );
  const button = (
    <Button
      submit
      label="Keep these notes"
      busy={busy}
      onPress={() => undefined}
      style={phone ? { flexGrow: 1 } : null}
      testID="by-hand-keep"
    />
  );
  const fieldOf = ({ name, label, hint }: (typeof rows)[number]) => (
    <Controller
      key={name}
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <View style={[{ flexDirection: "row", alignItems: "flex-start", gap: 4 }, phone ? pair : null]}>
          <View style={{ flexGrow: 1, flexShrink: 1 }}>
            <Field
              label={label}
              hint={hintFor(name, hint, values)}
              value={field.value}
              onChangeText={field.onChange}
              onBlur={field.onBlur}
              error={fieldState.error?.message}
              testID={`by-hand-${name}`}
            />
          </View>
          {!phone && (
            <View style={{ flexDirection: "row", marginTop: 26 }}>
              <SemitoneSteps label={label} onStep={(by) => step(name, by)} />
            </View>
          )}
        </View>
      )}
    />
  );
  const ladder = (
    <NoteLadder
      values={values}
      active={active}
      onActive={setActive}
      onNote={tap}
      steps={phone ? <SemitoneSteps label={labelOf(active)} onStep={(by) => step(active, by)} /> : null}
    />
  );
  if (phone) {
    const [low, high, ...comfort] = rows;
    return (
      <Form label="Notes of your voice" onSubmit={() => void keep()} gap={16}>
        {found}
        <View style={pairs}>{[low, high].map((row) => row && fieldOf(row))}</View>
        {ladder}
        <View style={pairs}>{comfort.map(fieldOf)}</View>
        {how}
        <PhoneFoot>
          {refused}
          {button}
        </PhoneFoot>
      </Form>
    );
  }
  return (
    <Form label="Notes of your voice" onSubmit={() => void keep()} gap={20}>
      {found}
      <View style={{ flexDirection: "row", gap: 64, alignItems: "flex-start" }}>
        <View style={{ gap: 20, flexGrow: 1, flexBasis: 0 }}>
          {rows.map(fieldOf)}
          {refused}
          {button}
          {how}
        </View>
        <View style={{ flexGrow: 1, flexBasis: 0 }}>{ladder}</View>
      </View>
    </Form>
  );
}

const pairs = { flexDirection: "row", gap: 12 } as const;
const pair = { flexGrow: 1, flexBasis: 0 } as const;

function labelOf(name: keyof ByHandFields): string {
  return rows.find((row) => row.name === name)?.label ?? "";
}

function SemitoneSteps({ label, onStep }: { label: string; onStep: (by: -1 | 1) => void }) {
  return (
    <>
      <IconButton icon="minus" label={`${label}: a semitone lower`} onPress={() => onStep(-1)} />
      <IconButton icon="plus" label={`${label}: a semitone higher`} onPress={() => onStep(1)} />
    </>
  );
}

/** In a field, accidentals stand as they are typed. */
function fieldsOf(voice: SingingVoice | null): ByHandFields {
  if (!voice) return { lowest: "", highest: "", comfortLow: "", comfortTop: "" };
  const { range, comfort } = voice;
  return {
    lowest: noteName(range.lowMidi),
    highest: noteName(range.highMidi),
    comfortLow: noteName(comfort.lowMidi),
    comfortTop: noteName(comfort.highMidi),
  };
}

/** Where + and - begin in an empty field: near the notes that are there, else around the middle C. */
function startOf(name: keyof ByHandFields, values: ByHandFields): number {
  const low = parseNoteName(values.lowest);
  const high = parseNoteName(values.highest);
  if (low !== null && high !== null && low < high) {
    const usual = usualComfort(low, high);
    return name === "comfortLow" || name === "lowest" ? usual.lowMidi : usual.highMidi;
  }
  if (name === "highest" || name === "comfortTop") return low === null ? 72 : low + 19;
  return high === null ? 55 : high - 19;
}

function hintFor(name: keyof ByHandFields, hint: string, values: ByHandFields): string {
  const low = parseNoteName(values.lowest);
  const high = parseNoteName(values.highest);
  if (low === null || high === null || low >= high || values[name] !== "") return hint;
  const usual = usualComfort(low, high);
  if (name === "comfortLow") return `${hint}; ${noteWord(usual.lowMidi)} is assumed`;
  return name === "comfortTop" ? `${hint}; ${noteWord(usual.highMidi)} is assumed` : hint;
}
