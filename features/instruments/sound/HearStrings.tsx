import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import type { InstrumentString } from "@/shared/instruments/instrument";
import { stringMidi } from "@/shared/instruments/tension";
import { glyphs, midiToHz } from "@/shared/music/pitch";
import { createStringPlayer, type StringKind, type StringPlayer } from "./stringPlayer";

export interface HearStringsProps {
  strings: readonly InstrumentString[];
  /** the string that sounds, for the picture beside it */
  onSounding?: (index: number | null) => void;
}

/** From string to string when all are heard. */
const apartS = 0.9;

/** Each string at its pitch, plucked, and all of them one after the other. */
export function HearStrings({ strings, onSounding }: HearStringsProps) {
  const player = useRef<StringPlayer | null>(null);
  const [said, setSaid] = useState("");
  const timers = useRef<ReturnType<typeof setTimeout>[]>([]);
  const quiet = () => {
    for (const timer of timers.current) clearTimeout(timer);
    timers.current = [];
    player.current?.stop();
  };
  useEffect(
    () => () => {
      for (const timer of timers.current) clearTimeout(timer);
      player.current?.close();
    },
    [],
  );
  const tell = (index: number) => {
    const { note } = strings[index]!;
    setSaid(`${glyphs(note)}, ${midiToHz(stringMidi({ note })).toFixed(1)} Hz`);
    onSounding?.(index);
  };
  const hear = (indices: readonly number[]) => {
    quiet();
    player.current ??= createStringPlayer();
    indices.forEach((index, k) => {
      player.current?.pluck(stringMidi(strings[index]!), kindOf(strings[index]!), k * apartS);
      if (k === 0) tell(index);
      else timers.current.push(setTimeout(() => tell(index), k * apartS * 1000));
    });
    timers.current.push(
      setTimeout(
        () => {
          onSounding?.(null);
          setSaid("");
        },
        indices.length * apartS * 1000 + 800,
      ),
    );
  };
  return (
    <View role="group" aria-label="Hear the strings" style={{ gap: 4 }}>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
        {strings.map(({ note }, index) => (
          <Button
            key={index}
            kind="secondary"
            small
            label={glyphs(note)}
            accessibleName={`${glyphs(note)}, hear string ${index + 1}`}
            onPress={() => hear([index])}
            testID={`hear-${index}`}
            style={{ paddingHorizontal: 12 }}
          />
        ))}
        <Button
          kind="text"
          small
          icon="play"
          label="Hear all"
          onPress={() => hear(strings.map((_, index) => index))}
          testID="hear-all"
        />
      </View>
      <LiveText variant="small" tone="soft" testID="sounding" style={{ minHeight: 20 }}>
        {said === "" ? "" : `Sounding: ${said}`}
      </LiveText>
    </View>
  );
}

function kindOf({ material }: InstrumentString): StringKind {
  return material === "nylon" || material === "fluorocarbon" ? "nylon" : "steel";
}
