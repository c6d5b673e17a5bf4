import { View } from "react-native";
import { Chip } from "@/features/ui/Chip";
import { Field } from "@/features/ui/Field";
import { Heading } from "@/features/ui/Heading";
import { Select } from "@/features/ui/Select";
import { UnitChoice } from "@/features/ui/UnitChoice";
import type { InstrumentDraft } from "./instrumentDraft";
import type { DraftErrors } from "./readDraft";

const kinds = [
  { value: "chromatic", label: "A semitone each" },
  { value: "diatonic-half", label: "Diatonic, with 6½" },
  { value: "diatonic", label: "Diatonic, without 6½" },
  { value: "custom", label: "A map of your own" },
] as const;

export interface NeckFieldsProps {
  draft: InstrumentDraft;
  errors: DraftErrors;
  onChange: (change: Partial<InstrumentDraft>) => void;
}

/** Scale, frets, capo and the playing hand. */
export function NeckFields({ draft, errors, onChange }: NeckFieldsProps) {
  const custom = draft.fretKind === "custom";
  const half = { flexGrow: 1, flexShrink: 1, flexBasis: 140, minWidth: 0 } as const;
  return (
    <View style={{ gap: 12 }}>
      <Heading level={2}>Neck</Heading>
      <UnitChoice />
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
        <View style={half}>
          <Field
            label={draft.units === "metric" ? "Scale, mm" : "Scale, in"}
            value={draft.scale}
            inputMode="decimal"
            hint="From nut to bridge."
            onChangeText={(scale) => onChange({ scale })}
            error={errors.scale}
            testID="scale"
          />
        </View>
        <View style={half}>
          <Select
            label="Frets lie"
            options={kinds}
            value={draft.fretKind}
            onChange={(fretKind) => onChange({ fretKind })}
            testID="fret-kind"
          />
        </View>
        {!custom && (
          <View style={half}>
            <Field
              label="How many frets"
              value={draft.frets}
              inputMode="numeric"
              onChangeText={(frets) => onChange({ frets })}
              error={errors.frets}
              testID="frets"
            />
          </View>
        )}
        <View style={half}>
          <Field
            label="Capo up to fret"
            value={draft.capoTo}
            inputMode="numeric"
            hint="0 where none may be used."
            onChangeText={(capoTo) => onChange({ capoTo })}
            error={errors.capoTo}
            testID="capo-to"
          />
        </View>
      </View>
      {custom && (
        <Field
          label="Semitones of each fret above the open string"
          value={draft.fretMap}
          placeholder="2 4 5 7 9 10 12"
          mono
          onChangeText={(fretMap) => onChange({ fretMap })}
          error={errors.fretMap}
          testID="fret-map"
        />
      )}
      <View style={{ flexDirection: "row" }}>
        <Chip
          label="Left-handed"
          selected={draft.leftHanded}
          onPress={() => onChange({ leftHanded: !draft.leftHanded })}
          testID="left-handed"
        />
      </View>
    </View>
  );
}
