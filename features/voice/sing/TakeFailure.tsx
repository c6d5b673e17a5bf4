import { failureWords } from "./failureWords";
import { RefusalPage } from "./RefusalPage";
import type { Failure } from "../recorder/recorder";

export interface TakeFailureProps {
  failure: Failure;
  onAgain: () => void;
  /** back to the take before; null where there is none */
  onBack: (() => void) | null;
}

/** No range came out of a take or of a recording. */
export function TakeFailure({ failure, onAgain, onBack }: TakeFailureProps) {
  const file = failure.stoppedBy === "file";
  return (
    <RefusalPage
      words={failureWords(failure)}
      again={{
        ...(file
          ? { icon: "file" as const, label: "Choose another recording" }
          : { icon: "again" as const, label: "Try again" }),
        onPress: onAgain,
        testID: "sing-again",
      }}
      back={onBack && { label: file ? "Back to what was heard" : "Back to the take before", onPress: onBack }}
      except={file ? "recording" : "sing"}
      testID={`take-failure-${failure.kind}`}
    />
  );
}
