import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import type { Voice } from "@/shared/contract/voice";
import { useChosenVoiceId } from "../chosenVoice";
import { KeepTake } from "./KeepTake";
import { warmedWords, whenWords } from "../noteWords";
import type { RecorderState } from "../recorder/recorder";
import type { Recorder } from "../recorder/useRecorder";
import { TakeTrail } from "../replay/TakeTrail";
import { TakeResult } from "./TakeResult";
import { newVoice, useKeepTake, voiceQueries } from "../voiceQueries";

/** Where the singer goes on to once the take is kept. */
export type KeptNext = "voice" | "songs";

export interface HeardResultProps {
  result: RecorderState & { step: "result" };
  recorder: Recorder;
  /** what takes the place of this take */
  again: { label: string; onPress: () => void };
  onKept: (next: KeptNext) => void;
}

/** What was heard, and into which voice it goes. */
export function HeardResult({ result, recorder, again, onKept }: HeardResultProps) {
  const { take } = result;
  const voices = useQuery(voiceQueries.list());
  const chosenId = useChosenVoiceId();
  const keep = useKeepTake();
  const [first] = useState(() => newVoice("My voice"));
  const [choosing, setChoosing] = useState<KeptNext | null>(null);
  const keepIn = (voice: Voice, next: KeptNext) =>
    keep.mutate({ heard: take, voice }, { onSuccess: () => onKept(next) });
  const startKeeping = (next: KeptNext) => (many ? setChoosing(next) : keepIn(first, next));
  const many = (voices.data ?? []).length > 0;
  const when = [whenWords(take.sungAt), warmedWords(take.warmedUp)].filter((fact) => fact !== null).join(", ");
  return (
    <Screen
      title="What was heard"
      subtitle={when}
      crumb={{ label: "Voice", href: "/voice" }}
      wide
      footer={
        choosing !== null ? null : (
          <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
            <Button
              kind="secondary"
              icon="again"
              label={again.label}
              onPress={again.onPress}
              // Fills its line where both do not stand on one.
              style={{ flexGrow: 1 }}
              testID="sing-again"
            />
            <Button
              label="Keep this voice"
              busy={keep.isPending || voices.isPending || result.judgingPart}
              onPress={() => startKeeping("voice")}
              style={{ flexGrow: 99 }}
              testID="sing-keep"
            />
          </View>
        )
      }
    >
      <View style={{ gap: 16 }}>
        {keep.error && (
          <Notice kind="error" title="Not kept yet">
            {`${keep.error.message} This take is still here.`}
          </Notice>
        )}
        {choosing !== null && (
          <KeepTake
            voices={voices.data ?? []}
            chosenId={chosenId}
            busy={keep.isPending}
            onKeep={(voice) => keepIn(voice, choosing)}
            onCancel={() => setChoosing(null)}
          />
        )}
        <TakeResult
          take={take}
          onAgain={again.onPress}
          onSongs={() => startKeeping("songs")}
          onFelt={recorder.felt}
          trail={
            <TakeTrail take={take} judging={result.judgingPart} refused={result.refusedPart} onTrim={recorder.trim} />
          }
        />
      </View>
    </Screen>
  );
}
