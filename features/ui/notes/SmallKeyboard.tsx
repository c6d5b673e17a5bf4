import { useState } from "react";
import { Pressable, View } from "react-native";
import { IconButton } from "../IconButton";
import { Text } from "../Text";
import { colors, mixtures, sizes } from "../theme";
import { webProps, webStyle } from "../webStyle";
import { glyphs, noteName } from "@/shared/music/pitch";

export interface SmallKeyboardProps {
  /** what the keys are called, such as "Keys of the tune" */
  label: string;
  /** the C it begins on at first */
  from: number;
  onNote: (midi: number) => void;
  /** one octave is enough where only a note's name is wanted */
  octaves?: 1 | 2;
  testID?: string;
}

const whites = [0, 2, 4, 5, 7, 9, 11];
const blacks = [1, 3, 6, 8, 10];
/** Places of keys on a computer's keyboard, not letters: the same two rows on every layout. */
const places = ["KeyA", "KeyW", "KeyS", "KeyE", "KeyD", "KeyF", "KeyT", "KeyG", "KeyY", "KeyH", "KeyU", "KeyJ", "KeyK"];
const lowestC = 24;
const highestC = 84;
const keyHeight = 104;

/** Two octaves of keys; they move by octaves. Two rows where one would make the keys too narrow for a thumb. */
export function SmallKeyboard({ label, from, onNote, octaves = 2, testID }: SmallKeyboardProps) {
  const [base, setBase] = useState(from);
  const [width, setWidth] = useState(0);
  const move = (by: number) => setBase(Math.max(lowestC, Math.min(highestC, base + by)));
  const rows = octaves === 1 ? [[base]] : width >= 14 * sizes.target ? [[base, base + 12]] : [[base + 12], [base]];
  const onKeyDown = (event: {
    code?: string;
    nativeEvent?: { code?: string };
    repeat?: boolean;
    ctrlKey?: boolean;
    metaKey?: boolean;
    altKey?: boolean;
    preventDefault: () => void;
  }) => {
    if (event.repeat || event.ctrlKey || event.metaKey || event.altKey) return;
    const code = event.code ?? event.nativeEvent?.code ?? "";
    const key = places.indexOf(code);
    if (key >= 0) onNote(base + key);
    else if (code === "KeyZ") move(-12);
    else if (code === "KeyX") move(12);
    else return;
    event.preventDefault();
  };
  return (
    <View role="group" aria-label={label} testID={testID} style={{ gap: 8 }} {...webProps({ onKeyDown })}>
      <View style={{ flexDirection: "row", alignItems: "center", gap: 4 }}>
        <IconButton icon="minus" label="An octave lower" disabled={base <= lowestC} onPress={() => move(-12)} />
        <Text variant="label" style={{ minWidth: 84, textAlign: "center" }}>
          {`${glyphs(noteName(base))} to ${glyphs(noteName(base + 12 * octaves - 1))}`}
        </Text>
        <IconButton icon="plus" label="An octave higher" disabled={base >= highestC} onPress={() => move(12)} />
      </View>
      <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ gap: 8 }}>
        {rows.map((row) => (
          <View key={row[0]} style={{ flexDirection: "row" }}>
            {row.map((c) => (
              <Octave key={c} c={c} onNote={onNote} />
            ))}
          </View>
        ))}
      </View>
    </View>
  );
}

function Octave({ c, onNote }: { c: number; onNote: (midi: number) => void }) {
  return (
    <View style={{ flexGrow: 1, flexBasis: 0, height: keyHeight }}>
      <View style={{ flexDirection: "row", height: keyHeight }}>
        {whites.map((step) => (
          <Key key={step} midi={c + step} onNote={onNote} />
        ))}
      </View>
      {blacks.map((step) => (
        <View
          key={step}
          style={webStyle({
            position: "absolute",
            top: 0,
            height: "58%",
            width: `${(100 / 7) * 0.66}%`,
            left: `${(whites.filter((white) => white < step).length * 100) / 7 - (100 / 7) * 0.33}%`,
          })}
        >
          <Key midi={c + step} onNote={onNote} dark />
        </View>
      ))}
    </View>
  );
}

function Key({ midi, onNote, dark = false }: { midi: number; onNote: (midi: number) => void; dark?: boolean }) {
  const name = glyphs(noteName(midi));
  return (
    <Pressable
      role="button"
      aria-label={name}
      onPress={() => onNote(midi)}
      testID={`key-${midi}`}
      style={{
        flexGrow: 1,
        flexBasis: 0,
        height: "100%",
        minWidth: 24,
        justifyContent: "flex-end",
        alignItems: "center",
        paddingBottom: 6,
        borderWidth: 1,
        borderColor: colors.inkSoft,
        borderBottomLeftRadius: 6,
        borderBottomRightRadius: 6,
        backgroundColor: dark ? mixtures.blackKey : mixtures.whiteKey,
      }}
    >
      {!dark && (
        <Text variant="tiny" tone={midi % 12 === 0 ? "ink" : "soft"} style={{ fontWeight: "600" }}>
          {midi % 12 === 0 ? name : name.charAt(0)}
        </Text>
      )}
    </Pressable>
  );
}
