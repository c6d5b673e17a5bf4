import type { ReactNode } from "react";
import { View } from "react-native";
import { Choice } from "@/features/ui/Choice";
import { Segmented } from "@/features/ui/Segmented";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import type { SheetOptions } from "@/shared/sheets/sheet";

/** One of several keys or ways to choose from. */
interface Offer {
  value: string;
  label: string;
}

export interface SheetChoicesProps {
  options: SheetOptions;
  onChange: (change: Partial<SheetOptions>) => void;
  /** sounding keys; none for a song without a key */
  keys: readonly Offer[];
  keyNow: string;
  onKey: (value: string) => void;
  ways: readonly Offer[];
  wayNow: string;
  onWay: (value: string) => void;
  /** kept arrangements of this way, the way's own shapes first; none where there are none */
  arrangements: readonly Offer[];
  arrangementNow: string;
  onArrangement: (value: string) => void;
  /** which instrument */
  chooser: ReactNode;
}

const letters = [
  { value: "small", label: "Small" },
  { value: "usual", label: "Usual" },
  { value: "large", label: "Large" },
  { value: "largest", label: "Largest" },
] as const;

/** What is played on what, and how it stands on the paper. */
export function SheetChoices(props: SheetChoicesProps) {
  const { options, onChange, keys, keyNow, onKey, ways, wayNow, onWay, chooser } = props;
  const { arrangements, arrangementNow, onArrangement } = props;
  return (
    <View style={{ gap: 16 }} testID="sheet-choices">
      {keys.length > 0 && (
        <>
          <Select label="Sounding key" options={keys} value={keyNow} onChange={onKey} testID="sheet-key" />
          {chooser}
        </>
      )}
      {ways.length > 0 && (
        <>
          <Select label="Way to play it" options={ways} value={wayNow} onChange={onWay} testID="sheet-way" />
          {arrangements.length > 0 && (
            <Select
              label="Arrangement"
              options={arrangements}
              value={arrangementNow}
              onChange={onArrangement}
              testID="sheet-arrangement"
            />
          )}
          <Labelled words="Chord names">
            <Segmented
              label="Chord names"
              value={options.shows}
              options={[
                { value: "played", label: "As played" },
                { value: "sounding", label: "As heard" },
              ]}
              onChange={(shows) => onChange({ shows })}
              testID="sheet-shows"
            />
          </Labelled>
          <Labelled words="Chord grids">
            <Segmented
              label="Chord grids"
              value={options.grids}
              options={[
                { value: "side", label: "Side" },
                { value: "top", label: "Top" },
                { value: "none", label: "None" },
              ]}
              onChange={(grids) => onChange({ grids })}
              testID="sheet-grids-at"
            />
          </Labelled>
          <Labelled words="Grids for">
            <Segmented
              label="Grids for"
              value={options.leftHanded ? "left" : "right"}
              options={[
                { value: "right", label: "Right hand" },
                { value: "left", label: "Left hand" },
              ]}
              onChange={(hand) => onChange({ leftHanded: hand === "left" })}
            />
          </Labelled>
        </>
      )}
      {keys.length > 0 && (
        <Labelled words="Chord numbers">
          <Segmented
            label="Chord numbers"
            value={options.numbers ? "yes" : "no"}
            options={[
              { value: "no", label: "Off" },
              { value: "yes", label: "Over the chords" },
            ]}
            onChange={(shown) => onChange({ numbers: shown === "yes" })}
            testID="sheet-numbers"
          />
        </Labelled>
      )}
      <Select
        label="Letters"
        options={letters}
        value={options.letters}
        onChange={(size) => onChange({ letters: size })}
        testID="sheet-letters"
      />
      <Choice
        label="Paper"
        value={options.paper}
        options={[
          { value: "A4", label: "A4", hint: "210 × 297 mm" },
          { value: "Letter", label: "Letter", hint: "8½ × 11 inches" },
        ]}
        onChange={(paper) => onChange({ paper })}
        testID="sheet-paper"
      />
    </View>
  );
}

function Labelled({ words, children }: { words: string; children: ReactNode }) {
  return (
    <View style={{ gap: 6 }}>
      <Text variant="label" aria-hidden style={{ fontWeight: "600", lineHeight: 18 }}>
        {words}
      </Text>
      {children}
    </View>
  );
}
