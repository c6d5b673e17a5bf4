import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Text } from "@/features/ui/Text";
import { mixtures, sizes } from "@/features/ui/theme";
import type { Take } from "@/shared/contract/take";
import type { VoiceProfile } from "@/shared/voice/voiceProfile";
import { noteWord } from "../noteWords";
import { whyComfort, whyEnd } from "./whyEnd";

export interface WhyNotesProps {
  profile: VoiceProfile;
  /** of this voice only */
  takes: readonly Take[];
}

type Question = "high" | "low" | "comfort";

/** The questions a singer asks of the picture, each with its answer. */
export function WhyNotes({ profile, takes }: WhyNotesProps) {
  const [open, setOpen] = useState<Question | null>(null);
  const questions: [Question, string, () => string[]][] = [
    ["high", `Why is my top note ${noteWord(profile.range.highMidi)}?`, () => whyEnd(profile, takes, "high")],
    ["low", `Why is my lowest note ${noteWord(profile.range.lowMidi)}?`, () => whyEnd(profile, takes, "low")],
    ["comfort", "Why these comfortable notes?", () => whyComfort(takes)],
  ];
  return (
    <View>
      {questions.map(([name, words, answer]) => (
        <View key={name}>
          <Button
            kind="text"
            icon={open === name ? "minus" : "plus"}
            label={words}
            expanded={open === name}
            onPress={() => setOpen(open === name ? null : name)}
            flush
            testID={`why-${name}`}
          />
          {open === name && (
            <View
              style={{ gap: 4, padding: 12, borderRadius: sizes.radius, backgroundColor: mixtures.tint, maxWidth: 560 }}
              testID={`why-${name}-answer`}
            >
              {answer().map((sentence) => (
                <Text key={sentence}>{sentence}</Text>
              ))}
            </View>
          )}
        </View>
      ))}
    </View>
  );
}
