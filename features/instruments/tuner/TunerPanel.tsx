import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { Instrument } from "@/shared/instruments/instrument";
import type { TuningPlan } from "@/shared/instruments/stringTuning";
import { TiltPicture } from "./TiltPicture";
import { targetOf, type TunerEvent, type TunerState } from "./tunerState";
import { cautionWords, heardWords, pitchWords, stepWords, stringName } from "./tunerWords";
import type { TunerMicrophone } from "./useTuner";

export interface TunerPanelProps {
  instrument: Instrument;
  plan: TuningPlan;
  state: TunerState;
  microphone: TunerMicrophone;
  a4: number;
  send: (event: TunerEvent) => void;
}

/** The string asked for now: what to do, how far it is, in words and as a picture. */
export function TunerPanel({ instrument, plan, state, microphone, a4, send }: TunerPanelProps) {
  const wide = useLayout() === "wide";
  const [width, setWidth] = useState(340);
  const { heard, asked } = state;
  const words = heard && heardWords(instrument, plan, state, heard);
  const caution = cautionWords(instrument, plan, state);
  const target = pitchWords(instrument, asked, targetOf(plan, state, asked));
  const waiting = waitingWords(microphone, stringName(instrument, asked));
  const off = words ? words.off : waiting.off;
  const turn = words ? words.turn : waiting.turn;
  return (
    <Card style={{ gap: 10 }} testID="tuner-panel">
      <Heading level={2}>{stepWords(instrument, plan, state)}</Heading>
      {caution !== null && <Notice kind="caution">{caution}</Notice>}
      <View onLayout={({ nativeEvent }) => setWidth(Math.round(nativeEvent.layout.width))}>
        <TiltPicture
          trail={heard && heard.index === asked && heard.octaves === 0 ? state.trail : []}
          target={target}
          width={width}
          height={wide ? 336 : 208}
          label={words ? `${off}, measured against ${target}` : `Nothing heard yet. The line is ${target}`}
        />
      </View>
      <View testID="tuner-reading">
        <Text
          variant="strong"
          style={wide ? { fontSize: 36, lineHeight: 42 } : { fontSize: 26, lineHeight: 32 }}
          tone={words?.stop ? "brick" : "ink"}
        >
          {off}
        </Text>
        <Text>{turn}</Text>
      </View>
      <Spoken key={asked} words={`${off}. ${turn}`} pluck={heard?.pluck ?? 0} settled={state.trail.length > 18} />
      {heard && heard.index !== asked && heard.octaves === 0 && (
        <Button
          kind="secondary"
          label={`Tune the ${stringName(instrument, heard.index)} now`}
          onPress={() => send({ kind: "choose", index: heard.index })}
          testID="tune-that"
        />
      )}
      {state.question && (
        <View role="alert" style={{ gap: 8 }} testID="which-string">
          <Text variant="strong">Which string did you pluck?</Text>
          <Text variant="small" tone="soft">
            By its pitch alone it may be more than one of them.
          </Text>
          <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
            {state.question.indices.map((index) => (
              <Button
                key={index}
                kind="secondary"
                small
                label={stringName(instrument, index)}
                onPress={() => send({ kind: "answer", index, a4 })}
              />
            ))}
          </View>
        </View>
      )}
    </Card>
  );
}

function waitingWords(microphone: TunerMicrophone, name: string): { off: string; turn: string } {
  if (microphone.step === "asking")
    return { off: "Waiting for the microphone", turn: "Your browser asks whether this page may listen." };
  if (microphone.step !== "on") return { off: "Not listening", turn: "Press Listen, or tune by ear with the tone." };
  if (microphone.room === "noisy")
    return { off: "It is loud here", turn: "Go closer to the microphone, or pluck again when it is quieter." };
  return { off: "Listening", turn: `Pluck the ${name} alone and let it ring.` };
}

/** One sentence a pluck, once it has settled: a reader of screens would not keep up with every reading. */
function Spoken({ words, pluck, settled }: { words: string; pluck: number; settled: boolean }) {
  const [said, setSaid] = useState({ pluck: 0, words: "" });
  if (settled && pluck !== said.pluck) setSaid({ pluck, words });
  return <LiveText hidden>{said.words}</LiveText>;
}
