import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { useLayout } from "@/features/ui/useLayout";
import { StopSigns } from "./StopSigns";

export interface BeforeGuidedProps {
  /** the note the way starts from, by name; null where the singer hums first */
  from: string | null;
  /** what was said of this voice before */
  under16: boolean;
  onStart: (under16: boolean) => void;
}

/** What will happen, when to stop, and the button that starts it. Nothing sounds before. */
export function BeforeGuided({ from, under16, onStart }: BeforeGuidedProps) {
  const wide = useLayout() === "wide";
  const [age, setAge] = useState<"adult" | "young">(under16 ? "young" : "adult");
  const young = age === "young";
  return (
    <Screen
      title="Lowest and highest note"
      crumb={{ label: "Voice", href: "/voice" }}
      wide
      footer={<Button icon="mic" label="Start gently" onPress={() => onStart(young)} testID="guided-start" />}
    >
      <View style={{ flexDirection: wide ? "row" : "column", gap: wide ? 48 : 20, paddingTop: 12 }}>
        <View style={[{ gap: 18 }, wide ? { flexBasis: 0, flexGrow: 1, maxWidth: 560 } : { maxWidth: 560 }]}>
          <Text variant="body" style={{ fontSize: 20, lineHeight: 28 }}>
            {from === null
              ? "Hum one comfortable note. Then you hear a tone, sing it, and go down step by step; after a rest, up."
              : `You hear a tone, sing it, and go down step by step from ${from}; after a rest, up.`}
          </Text>
          {!wide && <StopSigns />}
          <Text>
            Hold each note for about two seconds. At each end you have two or three tries, and the best held note
            counts. You can stop at any time, and what you held is kept.
          </Text>
          <Text tone="soft">
            This shows what you can hold. Which of those notes you would use in a song, you say afterwards. The sound
            stays on this device.
          </Text>
          <View style={{ gap: 6 }}>
            <Text variant="label">How old is the singer?</Text>
            <Segmented
              label="How old is the singer?"
              options={[
                { value: "adult", label: "16 or older" },
                { value: "young", label: "Under 16" },
              ]}
              value={age}
              onChange={setAge}
              testID="guided-age"
            />
            {young && (
              <Text variant="small" tone="soft" testID="guided-young">
                Then this is the range of this week only: it will move. The first note that does not come ends the way;
                nothing is tried again, and nobody has to reach anything.
              </Text>
            )}
          </View>
          {!wide && <Hearing />}
          <TextLink href="/voice/sing">Sing a phrase instead</TextLink>
        </View>
        {wide && (
          <View style={{ gap: 14, flexBasis: 0, flexGrow: 1, maxWidth: 560 }}>
            <StopSigns />
            <Hearing />
          </View>
        )}
      </View>
    </Screen>
  );
}

function Hearing() {
  return (
    <Notice kind="caution" title="Headphones at a moderate level">
      Headphones keep the tone out of the microphone. If you would have to raise your voice over them, they are too
      loud.
    </Notice>
  );
}
