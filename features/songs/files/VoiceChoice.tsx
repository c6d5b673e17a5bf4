import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Choice } from "@/features/ui/Choice";
import type { MelodyVoice } from "@/shared/songs/melodyVoice";

export interface VoiceChoiceProps {
  voices: readonly MelodyVoice[];
  /** which of them is likely the sung one */
  proposed: number;
  chosen: number;
  onChoose: (index: number) => void;
}

/** So many are shown at first; a book of tunes or an orchestra has more. */
const few = 5;

/** The voices of a file, the likely sung one first, each with what speaks for it and against it. */
export function VoiceChoice({ voices, proposed, chosen, onChoose }: VoiceChoiceProps) {
  const [all, setAll] = useState(false);
  const order = [proposed, ...voices.map((_, index) => index).filter((index) => index !== proposed)];
  const shown = all ? order : order.filter((index, place) => place < few || index === chosen);
  return (
    <View style={{ gap: 10 }}>
      <Choice
        label="Which voice is sung"
        testID="melody-voice"
        value={String(chosen)}
        options={shown.map((index) => {
          const { name, reasons, melody } = voices[index]!;
          const count = `${melody.notes.length} ${melody.notes.length === 1 ? "note" : "notes"}.`;
          return {
            value: String(index),
            label: index === proposed ? `${name} (likely the sung one)` : name,
            hint: [count, ...reasons.slice(0, 4)].join(" "),
          };
        })}
        onChange={(value) => onChoose(Number(value))}
      />
      {shown.length < voices.length && (
        <Button
          kind="text"
          small
          label={`Show all ${voices.length} voices`}
          onPress={() => setAll(true)}
          style={{ alignSelf: "flex-start" }}
        />
      )}
    </View>
  );
}
