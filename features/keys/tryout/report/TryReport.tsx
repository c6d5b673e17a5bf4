import { useCallback, useMemo, useState } from "react";
import { View } from "react-native";
import { PitchTrail } from "@/features/span/PitchTrail";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { MeasureList } from "./MeasureList";
import { wholeMeasures } from "./measureWords";
import { PhraseRow } from "./PhraseRow";
import { sungPicture } from "./sungPicture";
import type { TryRecorder } from "../singing/tryRecorder";
import type { MeasuredTry } from "../useTry";

export interface TryReportProps {
  measured: MeasuredTry;
  spelling: "sharps" | "flats";
  playback: TryRecorder["playback"];
}

const trailHeight = 200;

/** What was sung, whole and phrase by phrase, with the sound of it. */
export function TryReport({ measured, spelling, playback }: TryReportProps) {
  const { take, plan, measures, wishes } = measured;
  const picture = useMemo(() => sungPicture(take.report), [take.report]);
  return (
    <View style={{ gap: 14 }}>
      {take.brokenOff !== null && (
        <Notice kind="caution" testID="try-broken-off">
          {`${take.brokenOff} What you sang until then is here.`}
        </Notice>
      )}
      {take.processed.length > 0 && (
        <Notice kind="caution">{`Your browser kept ${take.processed.join(", ")} on, so loudness is less sure.`}</Notice>
      )}
      {measures ? (
        <View style={{ gap: 8 }} testID="try-summary">
          {measures.summary.map((sentence, k) => (
            <Text key={sentence} variant={k === 0 ? "strong" : "body"}>
              {sentence}
            </Text>
          ))}
          <MeasureList measures={wholeMeasures(measures)} spelling={spelling} />
          {wishes.backing && !wishes.headphones && (
            <Text variant="small" tone="soft">
              Sung without headphones: the backing may stand in the recording, so these figures are coarse.
            </Text>
          )}
        </View>
      ) : (
        <Notice kind="caution" testID="try-no-measures">
          {plan && plan.notes.length > 0
            ? "What you sang could not be laid on the tune: too little of it was heard, or another tune. Sing again, or keep only how it felt."
            : "The tune of this song is not known note by note, so what you sang cannot be held against it. How it felt counts all the same."}
        </Notice>
      )}
      <Sound picture={picture} seconds={take.report.durationS} playback={playback} />
      {measures && plan && (
        <View>
          <Heading level={2} style={{ marginBottom: 8 }}>
            Phrase by phrase
          </Heading>
          <Text variant="small" tone="soft" style={{ marginBottom: 8 }}>
            Outlined: the tune in this key. Filled: what you sang. Your own tuning is taken out of the figures.
          </Text>
          {measures.phrases.map((phrase) => (
            <PhraseRow
              key={phrase.phrase}
              phrase={phrase}
              number={phrase.phrase + 1}
              notes={plan.notes.filter((note) => note.phrase === phrase.phrase)}
              picture={picture}
              spelling={spelling}
              playback={playback}
            />
          ))}
        </View>
      )}
    </View>
  );
}

interface SoundProps {
  picture: ReturnType<typeof sungPicture>;
  seconds: number;
  playback: TryRecorder["playback"];
}

/** Plays the take with its trail moving along. */
function Sound({ picture: { frames }, seconds, playback }: SoundProps) {
  const [width, setWidth] = useState(0);
  const { playing, failed, play, stop, position } = playback;
  const read = useCallback(() => {
    const now = position();
    const to = Math.floor(now * 100) + 1;
    return { frames: frames.slice(Math.max(0, to - 660), to), ahead: [], now };
  }, [frames, position]);
  return (
    <View role="region" aria-label="The take" style={{ gap: 8 }}>
      <View style={{ flexDirection: "row", alignItems: "center", flexWrap: "wrap", gap: 12 }}>
        <Button
          kind="secondary"
          small
          icon={playing ? "stop" : "play"}
          label={playing ? "Stop playing" : "Play back"}
          onPress={playing ? stop : () => void play({ startS: 0, endS: seconds })}
          testID="take-play"
        />
        <Text variant="small" tone="soft" style={{ flexShrink: 1 }}>
          {`${seconds.toFixed(1)} s, on this device. Only what you hand in is sent.`}
        </Text>
      </View>
      {playing && (
        <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ height: trailHeight }}>
          {width > 0 && <PitchTrail read={read} width={width} height={trailHeight} testID="playing-trail" />}
        </View>
      )}
      {failed && <Notice kind="error">This browser could not play the take. Its figures are safe.</Notice>}
    </View>
  );
}
