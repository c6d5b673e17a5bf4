import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { glyphs, noteName } from "@/shared/music/pitch";
import type { PitchBand } from "@/shared/voice/takeReport";

/** The comfort band that keys are judged by, where a try has changed it. */
export function ComfortChange({ before, now }: { before: PitchBand; now: PitchBand }) {
  const words = ({ lowMidi, highMidi }: PitchBand) =>
    `${glyphs(noteName(Math.round(lowMidi)))} to ${glyphs(noteName(Math.round(highMidi)))}`;
  const same = words(before) === words(now);
  return (
    <View style={{ gap: 6 }} testID="comfort-change">
      <Heading level={2}>Your comfortable notes</Heading>
      <Text variant="title">{words(now)}</Text>
      <Text variant="small" tone="soft">
        {same
          ? "As before: what you sang and said gives no reason to change them."
          : `Before this try they were ${words(before)}. Keys are judged by the new ones; take the try out, and the old ones are back.`}
      </Text>
    </View>
  );
}
