import { View } from "react-native";
import { Choice } from "@/features/ui/Choice";
import { Field } from "@/features/ui/Field";
import { Heading } from "@/features/ui/Heading";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { tonicPitchClass, type KeyName } from "@/shared/music/keyName";
import { glyphs } from "@/shared/music/pitch";
import { tonics } from "../editor/keyChoice";
import { MelodyFileField } from "../files/MelodyFileField";
import type { DraftErrors, SongDraft } from "../editor/songDraft";

export interface TuneFieldsProps {
  draft: SongDraft;
  errors: DraftErrors;
  /** the chart's key, chosen or found */
  writtenKey: KeyName | null;
  onChange: (change: Partial<SongDraft>) => void;
}

const kinds = [
  { value: "none", label: "Not yet", hint: "You can give it later; keys are found once it is there." },
  {
    value: "span",
    label: "By hand",
    hint: "Lowest note, highest note and home note. Coarser, but enough for a first answer.",
  },
  { value: "melody", label: "From a file", hint: "ABC, MIDI or MusicXML." },
] as const;

/** What is known of the tune: nothing yet, its ends, or all its notes. */
export function TuneFields({ draft, errors, writtenKey, onChange }: TuneFieldsProps) {
  // A home note is asked for when there is a tune that it is the home of.
  const hasTune = draft.tune === "span" || (draft.tune === "melody" && draft.melody !== null);
  return (
    <View style={{ gap: 14 }} testID="tune">
      <Heading level={2} size={16}>
        Melody
      </Heading>
      <Choice
        label="Where the melody comes from"
        hideLabel
        options={kinds}
        value={draft.tune}
        onChange={(tune) => onChange({ tune })}
      />
      {draft.tune === "span" && (
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
          <View style={{ flexGrow: 1, flexBasis: 120 }}>
            <Field
              label="Lowest note"
              value={draft.low}
              onChangeText={(low) => onChange({ low })}
              error={errors.low}
              hint="Such as D4"
              testID="tune-low"
            />
          </View>
          <View style={{ flexGrow: 1, flexBasis: 120 }}>
            <Field
              label="Highest note"
              value={draft.high}
              onChangeText={(high) => onChange({ high })}
              error={errors.high}
              hint="Such as E5"
              testID="tune-high"
            />
          </View>
        </View>
      )}
      {draft.tune === "melody" && <MelodyFileField draft={draft} error={errors.melody} onChange={onChange} />}
      {hasTune && (
        <Select
          label="Home note of the melody"
          testID="tune-home"
          value={draft.home}
          error={errors.home}
          options={[
            { value: "", label: writtenKey ? `As the chart, ${glyphs(writtenKey.tonic)}` : "Choose" },
            ...tonics.map((tonic) => ({ value: tonic, label: glyphs(tonic) })),
          ]}
          onChange={(home) => onChange({ home })}
        />
      )}
      {hasTune && writtenKey && differs(draft.home, writtenKey) && (
        <Text variant="small" tone="soft" testID="tune-moved">
          {`The melody's home note is ${glyphs(draft.home)}, the chart's is ${glyphs(writtenKey.tonic)}. When you save, the melody is moved to ${glyphs(writtenKey.tonic)} so that both sound together.`}
        </Text>
      )}
    </View>
  );
}

function differs(home: string, writtenKey: KeyName): boolean {
  return home !== "" && tonicPitchClass(home) !== tonicPitchClass(writtenKey.tonic);
}
