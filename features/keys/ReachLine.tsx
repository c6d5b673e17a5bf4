import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { glyphs, noteName } from "@/shared/music/pitch";

export interface ReachLineProps {
  /** on whole semitones; null while no voice is known */
  voice: SingingVoice | null;
  voiceId: string | null;
}

/** Says that a voice is known from phrases only, and how to make sure of it. */
export function ReachLine({ voice, voiceId }: ReachLineProps) {
  if (!voice?.heard) return null;
  const ends = ({ lowMidi, highMidi }: SingingVoice["range"]) =>
    glyphs(`${noteName(lowMidi)} to ${noteName(highMidi)}`);
  return (
    <Text variant="small" tone="soft" testID="probable-reach" style={{ marginBottom: 8 }}>
      {`You have sung ${ends(voice.heard)} so far. Keys are judged by what you probably reach, ${ends(voice.range)} (estimate). `}
      <TextLink href={voiceId === null ? "/voice/guided" : `/voice/guided?voice=${voiceId}`}>
        Sing lower and higher to be sure
      </TextLink>
    </Text>
  );
}
