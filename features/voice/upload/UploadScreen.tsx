import { useState } from "react";
import { LiveText } from "@/features/ui/LiveText";
import { HeardResult, type KeptNext } from "../sing/HeardResult";
import type { RecorderState } from "../recorder/recorder";
import { useRecorder } from "../recorder/useRecorder";
import { stepWords } from "../stepWords";
import { TakeFailure } from "../sing/TakeFailure";
import { useFocusOnChange } from "../useFocusOnChange";
import { ChooseRecording } from "./ChooseRecording";
import { ReadingRecording } from "./ReadingRecording";

export interface UploadScreenProps {
  /** the take is in its voice, and the singer goes on to it or to the songs */
  onKept: (next: KeptNext) => void;
}

/** A recording in the place of singing: chosen, read on this device, and then the same result as after singing. */
export function UploadScreen({ onKept }: UploadScreenProps) {
  const recorder = useRecorder();
  const { state, restoring, earlier, unread, read, startOver, goBack, leave } = recorder;
  const [name, setName] = useState("");
  useFocusOnChange(state.step);
  const choose = (file: File) => {
    setName(file.name);
    read(file);
  };
  return (
    <>
      {pageFor(state, {
        before: <ChooseRecording waiting={restoring} unread={unread} onBack={earlier && goBack} onChoose={choose} />,
        working: <ReadingRecording name={name} state={state} onCancel={startOver} />,
        failure: (failure) => <TakeFailure failure={failure} onAgain={startOver} onBack={earlier && goBack} />,
        result: (result) => (
          <HeardResult
            result={result}
            recorder={recorder}
            again={{ label: "Another recording", onPress: startOver }}
            onKept={(next) => {
              leave();
              onKept(next);
            }}
          />
        ),
      })}
      <LiveText hidden>{stepWords(state)}</LiveText>
    </>
  );
}

interface Pages {
  before: React.ReactNode;
  working: React.ReactNode;
  failure: (failure: (RecorderState & { step: "failure" })["failure"]) => React.ReactNode;
  result: (result: RecorderState & { step: "result" }) => React.ReactNode;
}

function pageFor(state: RecorderState, pages: Pages): React.ReactNode {
  if (state.step === "idle") return pages.before;
  if (state.step === "failure") return pages.failure(state.failure);
  return state.step === "result" ? pages.result(state) : pages.working;
}
