import { LiveText } from "@/features/ui/LiveText";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { BeforeSinging } from "./BeforeSinging";
import { CountInScreen } from "../listening/CountInScreen";
import { wantsCountIn } from "../listening/countInSetting";
import { HeardResult, type KeptNext } from "./HeardResult";
import { ListeningScreen } from "../listening/ListeningScreen";
import { useRecorder, type Recorder } from "../recorder/useRecorder";
import { stepWords } from "../stepWords";
import { TakeFailure } from "./TakeFailure";
import { useFocusOnChange } from "../useFocusOnChange";

export interface SingScreenProps {
  /** the take is in its voice, and the singer goes on to it or to the songs */
  onKept: (next: KeptNext) => void;
}

/** From the first press to the result: one page, one step of the recorder at a time. */
export function SingScreen({ onKept }: SingScreenProps) {
  const recorder = useRecorder();
  const { state, restoring } = recorder;
  useFocusOnChange(state.step);
  return (
    <>
      <Step recorder={recorder} restoring={restoring} onKept={onKept} />
      <LiveText hidden>{stepWords(state)}</LiveText>
    </>
  );
}

function Step({
  recorder,
  restoring,
  onKept,
}: {
  recorder: Recorder;
  restoring: boolean;
  onKept: SingScreenProps["onKept"];
}) {
  const { state, live, sing, stop, leave, earlier, goBack } = recorder;
  const again = () => sing(wantsCountIn());
  switch (state.step) {
    case "idle":
    case "asking":
      return restoring ? (
        <Waiting words="Looking for your last take" />
      ) : (
        <BeforeSinging asking={state.step === "asking"} onSing={sing} />
      );
    case "counting":
      return <CountInScreen left={state.left} onCancel={stop} />;
    case "reading":
      return <Waiting words={`Reading ${state.name}`} />;
    case "listening":
    case "stopping":
      return <ListeningScreen live={live} seconds={state.seconds} stopping={state.step === "stopping"} onStop={stop} />;
    case "judging":
      return <Waiting words={`Reading ${Math.max(1, Math.round(state.seconds))} s of singing`} />;
    case "failure":
      return <TakeFailure failure={state.failure} onAgain={again} onBack={earlier && goBack} />;
    case "result":
      return (
        <HeardResult
          result={state}
          recorder={recorder}
          again={{ label: "Sing again", onPress: again }}
          onKept={(next) => {
            leave();
            onKept(next);
          }}
        />
      );
  }
}

function Waiting({ words }: { words: string }) {
  return (
    <Screen title="What was heard" crumb={{ label: "Voice", href: "/voice" }}>
      <Skeleton words={words} bars={[{ height: 52, width: 230 }, { height: 380 }]} />
    </Screen>
  );
}
