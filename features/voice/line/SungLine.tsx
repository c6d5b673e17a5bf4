import { useEffect, useRef } from "react";
import { View } from "react-native";
import type { TakeReport } from "@/shared/voice/takeReport";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Skeleton } from "@/features/ui/Skeleton";
import { longestTakeS } from "../recorder/takeProtocol";
import { LineFailure } from "./LineFailure";
import { LineListening } from "./LineListening";
import { useFocusBack } from "./useFocusBack";
import { useLine } from "./useLine";

export interface SungLineProps {
  /** on the button that begins it */
  label: string;
  kind?: "primary" | "secondary";
  /** it ends by itself after so many seconds */
  mostS?: number;
  /** what was heard in the line; its sound is gone by then */
  onSung: (report: TakeReport) => void;
}

/** Sings a line into the page it stands on. */
export function SungLine({ label, kind = "primary", mostS = longestTakeS, onSung }: SungLineProps) {
  const { state, live, sing, stop, leave } = useLine(mostS);
  const heard = state.step === "result" ? state.take.report : null;
  const told = useRef(onSung);
  useEffect(() => {
    told.current = onSung;
  });
  useEffect(() => {
    if (!heard) return;
    told.current(heard);
    leave();
  }, [heard, leave]);
  const place = useRef<View>(null);
  useFocusBack(place, state.step === "idle" || state.step === "failure");
  const words =
    state.step === "listening" ? "Listening. Sing now." : state.step === "judging" ? "Stopped. Reading the notes." : "";
  return (
    <View ref={place} style={{ gap: 12 }}>
      {state.step === "listening" || state.step === "stopping" ? (
        <LineListening
          live={live}
          seconds={state.seconds}
          mostS={mostS}
          stopping={state.step === "stopping"}
          onStop={stop}
        />
      ) : state.step === "judging" ? (
        <Skeleton words="Reading the notes" bars={[{ height: 120 }]} />
      ) : state.step === "failure" ? (
        <LineFailure failure={state.failure} onAgain={sing} />
      ) : (
        <Button
          kind={kind}
          icon="mic"
          label={state.step === "asking" ? "Waiting for the microphone" : label}
          busy={state.step === "asking"}
          onPress={sing}
          testID="sing-start"
        />
      )}
      <LiveText hidden>{words}</LiveText>
    </View>
  );
}
