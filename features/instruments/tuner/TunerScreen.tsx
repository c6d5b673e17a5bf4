import { useMemo } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { tunePath } from "@/features/ui/tunePath";
import { useLayout } from "@/features/ui/useLayout";
import type { Instrument } from "@/shared/instruments/instrument";
import { planTuning } from "@/shared/instruments/stringTuning";
import { hzToMidi } from "@/shared/music/pitch";
import { ByEar } from "./ByEar";
import { CapoStep } from "./CapoStep";
import { StringSteps } from "./StringSteps";
import { TunerPanel } from "./TunerPanel";
import { targetOf } from "./tunerState";
import { failureWords, pitchWords } from "./tunerWords";
import { useTuner } from "./useTuner";
import type { CreateTunerEar, TunerTone } from "./hearing/tunerEar";

export interface TunerScreenProps {
  instrument: Instrument;
  /** semitones of all strings alike */
  retune: number;
  /** fret, 0 for none */
  capo: number;
  a4: number;
  onA4: (hz: number) => void;
  createEar: CreateTunerEar;
  createTone: () => TunerTone;
}

const references = [415, 430, 432, 438, 439, 440, 441, 442, 443, 444, 446];

/** Walks through the strings of a plan, then the capo, then all once more, with the microphone or by ear. */
export function TunerScreen(props: TunerScreenProps) {
  const { instrument, retune, capo } = props;
  const plan = useMemo(() => planTuning(instrument, { retune, capo }), [instrument, retune, capo]);
  if (!plan.strings.some(({ verdict }) => verdict === "unsafe")) return <Tuning plan={plan} {...props} />;
  return (
    <Screen title="Not that high" crumb={{ label: "Instruments", href: "/instruments" }}>
      <View style={{ gap: 16, maxWidth: 560 }}>
        <Notice kind="error" title="Strings would snap" testID="tuner-unsafe">
          {`${retune} semitones up is past what some strings of this instrument bear. Nothing has been changed. Use a capo, or strings made for that pitch.`}
        </Notice>
        <LinkButton label="Tune it as it is" href={tunePath(instrument.id)} />
      </View>
    </Screen>
  );
}

function Tuning({
  instrument,
  retune,
  capo,
  a4,
  onA4,
  createEar,
  createTone,
  plan,
}: TunerScreenProps & { plan: ReturnType<typeof planTuning> }) {
  const wide = useLayout() === "wide";
  const { state, send, microphone, listen, stop, hush } = useTuner(plan, a4, createEar);
  const on = microphone.step === "on" || microphone.step === "asking";
  const failure = microphone.step === "failure" ? failureWords(microphone.why) : null;
  const finished = state.pass === "done";
  const waitsForCapo = state.pass === "capo" && !state.clamped;
  const target = targetOf(plan, state, state.asked);
  const steps = (
    <StringSteps
      instrument={instrument}
      plan={plan}
      state={state}
      onChoose={(index) => send({ kind: "choose", index })}
    />
  );
  const byEar = (
    <ByEar
      midi={hzToMidi(a4) - 69 + target}
      name={pitchWords(instrument, state.asked, target)}
      createTone={createTone}
      onTone={hush}
    />
  );
  const footer = finished ? (
    <Button icon="again" label="Tune again" onPress={() => send({ kind: "restart" })} />
  ) : waitsForCapo ? (
    <Button label="The capo is on" onPress={() => send({ kind: "clamped" })} testID="clamped" />
  ) : (
    <View style={{ flexDirection: "row", gap: 10 }}>
      <Button
        {...(on ? { icon: "stop" as const, kind: "secondary" as const } : { icon: "mic" as const })}
        label={on ? "Stop listening" : failure ? "Try again" : "Listen"}
        onPress={() => (on ? stop() : void listen())}
        style={{ flexGrow: 1 }}
        testID="tuner-listen"
      />
      <Button
        kind="secondary"
        label="Next"
        accessibleName="Next string"
        onPress={() => send({ kind: "next" })}
        testID="tuner-next"
      />
    </View>
  );
  return (
    <Screen
      title={finished ? "In tune" : titles[state.pass]}
      crumb={{ label: "Instruments", href: "/instruments" }}
      subtitle={`${instrument.name}${changeWords(retune, capo)}`}
      footer={footer}
      wide
    >
      <LiveText hidden>{finished ? "All strings have been through the last check." : titles[state.pass]}</LiveText>
      <View style={{ gap: 16, flexDirection: wide ? "row" : "column", alignItems: wide ? "flex-start" : "stretch" }}>
        <View style={{ gap: 16, flexGrow: 1, flexBasis: wide ? 0 : "auto", minWidth: 0 }}>
          {!wide && !waitsForCapo && steps}
          {failure && (
            <Notice kind="error" title={failure.title} testID="tuner-failure">
              {`${failure.happened} Nothing was recorded. ${failure.next}`}
            </Notice>
          )}
          {finished ? (
            <Notice kind="good" title="Every string is through">
              {`Strings slip for a while after a retune: check them again after the first song.${capo > 0 ? " Take the capo off when you put it away." : ""}`}
            </Notice>
          ) : waitsForCapo ? (
            <CapoStep instrument={instrument} plan={plan} />
          ) : (
            <TunerPanel instrument={instrument} plan={plan} state={state} microphone={microphone} a4={a4} send={send} />
          )}
        </View>
        <View style={{ gap: 20, width: wide ? 380 : "auto" }}>
          {wide && steps}
          {!finished && !waitsForCapo && byEar}
          <Select
            label="Reference A4"
            value={String(a4)}
            options={[...new Set([...references, a4])]
              .sort((a, b) => a - b)
              .map((hz) => ({ value: String(hz), label: `${hz} Hz` }))}
            onChange={(hz) => onA4(Number(hz))}
            testID="a4"
          />
          <Text variant="small" tone="soft">
            Nothing is recorded, and the sound stays on this device. The pitch shown is the string&apos;s first partial.
          </Text>
        </View>
      </View>
    </Screen>
  );
}

const titles = { strings: "Tune", capo: "With the capo", check: "Last check", done: "In tune" } as const;

/** ", 2 semitones down, then capo 3" */
function changeWords(retune: number, capo: number): string {
  const size = Math.abs(retune);
  const moved = retune === 0 ? "" : `, ${size} semitone${size === 1 ? "" : "s"} ${retune < 0 ? "down" : "up"}`;
  return `${moved}${capo > 0 ? `${moved ? ", then" : ","} capo ${capo}` : ""}`;
}
