import { useEffect, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import type { TunerTone } from "./hearing/tunerEar";

export interface ByEarProps {
  /** the note to sound, fractional where A4 is not 440 Hz */
  midi: number;
  name: string;
  createTone: () => TunerTone;
  /** the tone sounds for so many seconds: nothing is to be read meanwhile */
  onTone: (seconds: number) => void;
}

/** How long the tone sounds: beats need time to be heard. */
export const toneS = 6;

/** Tuning without a microphone: the note to reach, and what two notes that are nearly alike sound like together. */
export function ByEar({ midi, name, createTone, onTone }: ByEarProps) {
  const [tone] = useState<{ now: TunerTone | null }>({ now: null });
  const [sounding, setSounding] = useState(false);
  const hush = () => {
    tone.now?.stop();
    setSounding(false);
    onTone(0);
  };
  useEffect(() => () => tone.now?.close(), [tone]);
  // The tone of the string before would mislead.
  useEffect(() => () => tone.now?.stop(), [tone, midi]);
  const sound = async () => {
    tone.now ??= createTone();
    setSounding(true);
    onTone(toneS);
    await tone.now.play(midi);
    setSounding(false);
  };
  return (
    <View style={{ gap: 8 }}>
      <Heading level={2} size={16}>
        Tune by ear
      </Heading>
      <Text variant="small" tone="soft">
        Pluck the string while the tone sounds. Where the two are nearly alike, the sound swells and fades: those are
        beats. Turn the peg so that they get slower, until they stand still. If they get faster, turn the other way.
      </Text>
      <Button
        kind="secondary"
        icon={sounding ? "stop" : "play"}
        label={sounding ? "Stop the tone" : `Hear ${name}`}
        onPress={() => (sounding ? hush() : void sound())}
        testID="hear-tone"
      />
    </View>
  );
}
