import { View } from "react-native";
import { Field } from "@/features/ui/Field";
import { Text } from "@/features/ui/Text";
import { glyphs, noteName, parseNoteName } from "@/shared/music/pitch";
import { noteAndStep, readNoteOrStep } from "./scaleStep";

/** What stands in the three fields, as typed. */
export interface SpanTexts {
  home: string;
  low: string;
  high: string;
}

/** The ends of a tune, read from what was typed; where that fails, what to mend. */
export type SpanReading =
  | { ok: true; home: string; homeMidi: number; lowMidi: number; highMidi: number }
  | { ok: false; errors: Partial<Record<keyof SpanTexts, string>> };

export function readSpan({ home, low, high }: SpanTexts): SpanReading {
  const homeMidi = parseNoteName(home);
  const lowMidi = readNoteOrStep(low, homeMidi);
  const highMidi = readNoteOrStep(high, homeMidi);
  const errors: Partial<Record<keyof SpanTexts, string>> = {};
  if (homeMidi === null) errors.home = "Write the home note with its octave, like D4.";
  if (lowMidi === null) errors.low = "Write a note like A3, or a step like 5, below home.";
  if (highMidi === null) errors.high = "Write a note like A4, or a step like 1' above home.";
  if (lowMidi !== null && highMidi !== null && lowMidi > highMidi)
    errors.low = "The lowest note must not be above the highest.";
  if (homeMidi === null || lowMidi === null || highMidi === null || errors.low !== undefined)
    return { ok: false, errors };
  return { ok: true, home: noteName(homeMidi).replace(/-?\d+$/, ""), homeMidi, lowMidi, highMidi };
}

export interface SpanByHandProps {
  texts: SpanTexts;
  onChange: (texts: SpanTexts) => void;
  /** errors are shown only after somebody tried to keep */
  tried: boolean;
}

const explained =
  "Write a note with its octave (C4 is the C in the middle of a piano), or a step of the scale counted from the home " +
  "note: 1 is home, 5 the fifth step over it. A comma puts a step an octave lower, so 5, is the fifth step below home; " +
  "a stroke puts it higher, so 1' is home an octave up. You can also write 5 below home.";

/** Home note, lowest and highest note, by name or as steps of the scale. */
export function SpanByHand({ texts, onChange, tried }: SpanByHandProps) {
  const reading = readSpan(texts);
  const errors = tried && !reading.ok ? reading.errors : {};
  const homeMidi = parseNoteName(texts.home);
  const hint = (text: string, otherwise: string) => {
    const midi = readNoteOrStep(text, homeMidi);
    if (midi === null) return otherwise;
    return homeMidi === null ? glyphs(noteName(midi)) : noteAndStep(midi, homeMidi);
  };
  const field = (name: keyof SpanTexts, label: string, otherwise: string) => (
    <View style={{ flexGrow: 1, flexBasis: 140 }}>
      <Field
        label={label}
        value={texts[name]}
        onChangeText={(text) => onChange({ ...texts, [name]: text })}
        error={errors[name]}
        hint={name === "home" ? otherwise : hint(texts[name], otherwise)}
        autoComplete="off"
        testID={`span-${name}`}
      />
    </View>
  );
  return (
    <View style={{ gap: 12 }}>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
        {field("home", "Home note", "Where the tune comes to rest, such as D4")}
        {field("low", "Lowest note", "Such as A3 or 5,")}
        {field("high", "Highest note", "Such as D5 or 1'")}
      </View>
      <Text variant="small" tone="soft">
        {explained}
      </Text>
    </View>
  );
}
