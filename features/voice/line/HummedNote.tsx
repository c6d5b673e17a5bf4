import { useEffect, useRef } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { enoughHoldS, holdNow } from "../guided/hearing/guidedHold";
import { useHeard } from "../listening/useHeard";
import { LineFailure } from "./LineFailure";
import { LineListening } from "./LineListening";
import { useFocusBack } from "./useFocusBack";
import { useLine } from "./useLine";

export interface HummedNoteProps {
  label: string;
  kind?: "primary" | "secondary";
  /** the note that was held, fractional MIDI number, as hummed */
  onHummed: (midi: number) => void;
}

/** Listens until one note is held; then that note is the answer, and the microphone is let go. */
export function HummedNote({ label, kind = "primary", onHummed }: HummedNoteProps) {
  const { state, live, sing, leave } = useLine();
  const listening = state.step === "listening";
  const held = useHeard(live, ({ frames, ahead }) => {
    const note = holdNow([...frames, ...ahead]);
    return note && note.heldS >= enoughHoldS ? note.midi : -1;
  });
  const told = useRef(onHummed);
  useEffect(() => {
    told.current = onHummed;
  });
  useEffect(() => {
    if (!listening || held < 0) return;
    told.current(held);
    leave();
  }, [listening, held, leave]);
  const place = useRef<View>(null);
  useFocusBack(place, !listening);
  return (
    <View ref={place} style={{ gap: 12 }}>
      {listening ? (
        <LineListening live={live} seconds={state.seconds} stopping={false} onStop={leave} />
      ) : state.step === "failure" ? (
        <LineFailure failure={state.failure} onAgain={sing} />
      ) : (
        <Button
          kind={kind}
          icon="mic"
          label={state.step === "asking" ? "Waiting for the microphone" : label}
          busy={state.step === "asking"}
          onPress={sing}
          testID="hum-start"
        />
      )}
      <LiveText hidden>{listening ? "Listening. Hum one note and hold it." : ""}</LiveText>
    </View>
  );
}
