import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Text } from "@/features/ui/Text";
import type { Take } from "@/shared/contract/take";
import type { Voice } from "@/shared/contract/voice";
import type { PitchBand } from "@/shared/voice/takeReport";
import { BandHeading } from "../BandHeading";
import { bandWords, certaintyWords, noteWord } from "../noteWords";
import { singingVoiceOf } from "@/shared/keys/singingVoiceOf";
import { profileOf } from "@/shared/voice/shownTake";
import { timeOnNotes } from "../timeOnNotes";
import { VoiceLadder } from "../VoiceLadder";
import { WhyNotes } from "./WhyNotes";

export interface VoicePictureProps {
  voice: Voice;
  /** of this voice only */
  takes: readonly Take[];
  onUseTakes: () => void;
}

/** One voice: comfortable notes, ladder, and what they rest on. */
export function VoicePicture({ voice, takes, onUseTakes }: VoicePictureProps) {
  const singing = singingVoiceOf(voice, takes);
  const profile = profileOf(voice, takes);
  if (!singing) {
    return (
      <EmptyState
        title="Nothing sung yet"
        text={`Sing a few seconds with the voice you call ${voice.name}, and its notes appear here.`}
        action={<LinkButton icon="mic" label="Sing a few seconds" href="/voice/sing" />}
      />
    );
  }
  const times = voice.byHand ? [] : timesOf(takes);
  return (
    <View style={{ gap: 14 }}>
      <BandHeading label="Your comfortable notes" band={singing.comfort} />
      <VoiceLadder voice={singing} times={times} ends={voice.byHand ? "range" : "held"} />
      <View style={{ gap: 6 }}>
        <Text testID="voice-range">{`${voice.byHand ? "Your range" : "You can hold"}: ${bandWords(singing.range)}.`}</Text>
        {voice.byHand ? (
          <Text tone="soft">You set these notes by hand.</Text>
        ) : (
          profile && (
            <>
              {reachesFarther(profile.estimate, singing.range) && (
                <Text tone="soft">{`Your voice probably reaches about ${bandWords(profile.estimate)} (estimate).`}</Text>
              )}
              <Text tone="soft">{`${certaintyWords(profile.certainty)}. ${profile.reasons.join(" ")}`}</Text>
              <WhyNotes profile={profile} takes={takes} />
            </>
          )
        )}
        {voice.byHand && profile && (
          <Button
            kind="text"
            label={`Use what was sung instead: ${bandWords(profile.range)}`}
            onPress={onUseTakes}
            style={{ alignSelf: "flex-start" }}
            testID="voice-use-takes"
          />
        )}
        <LinkButton
          kind="secondary"
          icon="mic"
          label="Find your lowest and highest note"
          href={`/voice/guided?voice=${voice.id}`}
          style={{ alignSelf: "flex-start", marginTop: 8 }}
          testID="voice-guided"
        />
      </View>
    </View>
  );
}

function timesOf(takes: readonly Take[]) {
  const all = new Map<number, number>();
  for (const { notes, tuningCents } of takes) {
    for (const { midi, seconds } of timeOnNotes(notes, tuningCents)) all.set(midi, (all.get(midi) ?? 0) + seconds);
  }
  return [...all].map(([midi, seconds]) => ({ midi, seconds })).sort((a, b) => a.midi - b.midi);
}

/** An estimate that names the same notes says nothing new. */
export function reachesFarther(estimate: PitchBand, range: PitchBand): boolean {
  return (
    noteWord(estimate.lowMidi) !== noteWord(range.lowMidi) || noteWord(estimate.highMidi) !== noteWord(range.highMidi)
  );
}
