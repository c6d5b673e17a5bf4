import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Chip } from "@/features/ui/Chip";
import { Field } from "@/features/ui/Field";
import { Heading } from "@/features/ui/Heading";
import { IconButton } from "@/features/ui/IconButton";
import { Select } from "@/features/ui/Select";
import type { StringMaterial } from "@/shared/instruments/instrument";
import type { StringDraft } from "./instrumentDraft";
import type { DraftErrors } from "./readDraft";
import type { Units } from "@/shared/instruments/units";

const materials: readonly { value: StringMaterial; label: string }[] = [
  { value: "unknown", label: "Not known" },
  { value: "plain-steel", label: "Plain steel" },
  { value: "nickel-wound", label: "Nickel, wound" },
  { value: "phosphor-bronze", label: "Phosphor bronze, wound" },
  { value: "brass-wound", label: "Brass 80/20, wound" },
  { value: "nylon", label: "Nylon" },
  { value: "fluorocarbon", label: "Fluorocarbon" },
];

const courses = [
  { value: "1", label: "Alone" },
  { value: "2", label: "In a pair" },
  { value: "3", label: "Three together" },
] as const;

export interface StringFieldsProps {
  string: StringDraft;
  /** from 0, on the bass side */
  index: number;
  count: number;
  units: Units;
  errors: DraftErrors;
  onChange: (change: Partial<StringDraft>) => void;
  onMove: (by: -1 | 1) => void;
  onRemove: () => void;
}

/** What is known of one string: its note at once, the rest when it is asked for. */
export function StringFields({ string, index, count, units, errors, onChange, onMove, onRemove }: StringFieldsProps) {
  const at = `string ${index + 1}`;
  const wrongInside = ["gauge", "madeFor", "length", "startsAt"].some((field) => errors[`${at} ${field}`]);
  const [open, setOpen] = useState(string.short);
  const shown = open || wrongInside;
  const side = index === 0 ? ", bass side" : index === count - 1 ? ", treble side" : "";
  const row = { flexDirection: "row", flexWrap: "wrap", gap: 12 } as const;
  const half = { flexGrow: 1, flexShrink: 1, flexBasis: 130, minWidth: 0 } as const;
  return (
    <View role="group" aria-label={`String ${index + 1}${side}`} testID={`string-${index}`}>
      <Card style={{ gap: 10, paddingVertical: 12 }}>
        <View style={{ flexDirection: "row", alignItems: "center", justifyContent: "space-between" }}>
          <Heading level={3} size={16} style={{ flexShrink: 1 }}>{`String ${index + 1}${side}`}</Heading>
          <View style={{ flexDirection: "row" }}>
            <IconButton
              icon="up"
              label={`Move string ${index + 1} towards the bass`}
              disabled={index === 0}
              onPress={() => onMove(-1)}
            />
            <IconButton
              icon="down"
              label={`Move string ${index + 1} towards the treble`}
              disabled={index === count - 1}
              onPress={() => onMove(1)}
            />
            <IconButton icon="trash" label={`Remove string ${index + 1}`} onPress={onRemove} />
          </View>
        </View>
        <View style={row}>
          <View style={half}>
            <Field
              label="Note"
              value={string.note}
              placeholder="G3"
              onChangeText={(note) => onChange({ note })}
              error={errors[`${at} note`]}
              testID={`note-${index}`}
            />
          </View>
          <View style={half}>
            <Select
              label="Material"
              options={materials}
              value={string.material}
              onChange={(material) => onChange({ material })}
              testID={`material-${index}`}
            />
          </View>
        </View>
        {!shown && (
          <Button
            kind="text"
            small
            label="Gauge and more"
            accessibleName={`Gauge and more, string ${index + 1}`}
            expanded={false}
            onPress={() => setOpen(true)}
            testID={`more-${index}`}
            flush
          />
        )}
        {shown && (
          <>
            <View style={row}>
              <View style={half}>
                <Field
                  label={units === "metric" ? "Gauge, mm" : "Gauge, in"}
                  value={string.gauge}
                  inputMode="decimal"
                  hint="From the packet; empty if unknown."
                  onChangeText={(gauge) => onChange({ gauge })}
                  error={errors[`${at} gauge`]}
                  testID={`gauge-${index}`}
                />
              </View>
              <View style={half}>
                <Field
                  label="Made for"
                  value={string.madeFor}
                  hint="The packet's note, if you keep it at another."
                  onChangeText={(madeFor) => onChange({ madeFor })}
                  error={errors[`${at} madeFor`]}
                  testID={`made-for-${index}`}
                />
              </View>
              <View style={half}>
                <Select
                  label="Stands"
                  options={courses}
                  value={string.inCourse}
                  onChange={(inCourse) => onChange({ inCourse })}
                  testID={`course-${index}`}
                />
              </View>
            </View>
            <View style={{ flexDirection: "row" }}>
              <Chip
                label="A short drone string"
                selected={string.short}
                onPress={() => onChange({ short: !string.short })}
                testID={`short-${index}`}
              />
            </View>
            {string.short && (
              <View style={row}>
                <View style={half}>
                  <Field
                    label={units === "metric" ? "Its length, mm" : "Its length, in"}
                    value={string.length}
                    inputMode="decimal"
                    onChangeText={(length) => onChange({ length })}
                    error={errors[`${at} length`]}
                    testID={`length-${index}`}
                  />
                </View>
                <View style={half}>
                  <Field
                    label="Starts at fret"
                    value={string.startsAt}
                    inputMode="numeric"
                    onChangeText={(startsAt) => onChange({ startsAt })}
                    error={errors[`${at} startsAt`]}
                    testID={`starts-${index}`}
                  />
                </View>
              </View>
            )}
          </>
        )}
      </Card>
    </View>
  );
}
