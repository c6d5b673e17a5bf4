import { useState, type ReactNode } from "react";
import { View } from "react-native";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import type { Instrument } from "@/shared/instruments/instrument";
import { noteLengths, type NoteLength } from "../lengthWords";
import { Fretboard } from "@/features/ui/notes/Fretboard";
import { SmallKeyboard } from "@/features/ui/notes/SmallKeyboard";

export interface NoteEntryProps {
  on: "keys" | "neck";
  instrument: Instrument;
  /** chooses another instrument for the neck */
  chooser: ReactNode;
  /** C that the keyboard begins on */
  from: number;
  onNote: (note: { midi: number; duration: number }) => void;
}

/** Notes one by one, on keys or on the own instrument's neck; each is heard and comes behind the chosen note. */
export function NoteEntry({ on, instrument, chooser, from, onNote }: NoteEntryProps) {
  const [length, setLength] = useState<NoteLength>("1");
  const enter = (midi: number) => onNote({ midi, duration: Number(length) });
  return (
    <View style={{ gap: 12 }}>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
        <View style={{ flexGrow: 1, flexBasis: 150 }}>
          <Select label="Length of the next note" value={length} options={noteLengths} onChange={setLength} />
        </View>
        {on === "neck" && <View style={{ flexGrow: 1, flexBasis: 150 }}>{chooser}</View>}
      </View>
      {on === "keys" ? (
        <SmallKeyboard label="Keys for the tune" from={from} onNote={enter} testID="keyboard" />
      ) : (
        <Fretboard instrument={instrument} onPlace={({ midi }) => enter(midi)} testID="fretboard" />
      )}
      <Text variant="small" tone="soft">
        {on === "keys"
          ? "Each note comes behind the chosen one. With a keyboard, while one of these keys has the focus: the row from A to K plays the white keys of the first octave, the row above it the black ones, Z and X move by an octave."
          : "Each note comes behind the chosen one. Strings stand as on the chord grids, the nut at the top."}
      </Text>
    </View>
  );
}
