import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import type { PitchBand } from "@/shared/voice/takeReport";
import { noteWord } from "./noteWords";

export interface BandHeadingProps {
  label: string;
  band: PitchBand;
}

/** The comfortable notes, big. */
export function BandHeading({ label, band }: BandHeadingProps) {
  return (
    <View role="heading" aria-level={2} testID="comfort-notes">
      <Text variant="small" tone="soft" style={{ marginTop: 2 }}>
        {label}
      </Text>
      <Text variant="number" style={{ lineHeight: 52, letterSpacing: -0.8, marginTop: 2 }}>
        {noteWord(band.lowMidi)}
        <Text tone="soft" style={{ fontWeight: "600", fontSize: 26, letterSpacing: 0 }}>
          {" to "}
        </Text>
        {noteWord(band.highMidi)}
      </Text>
    </View>
  );
}
