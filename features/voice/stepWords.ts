import { failureWords } from "./sing/failureWords";
import { bandWords } from "./noteWords";
import type { RecorderState } from "./recorder/recorder";
import { inTune } from "@/shared/voice/shownTake";

/** What is said to those who do not see the page when a step begins. */
export function stepWords(state: RecorderState): string {
  if (state.step === "asking") return "Waiting for the microphone.";
  if (state.step === "listening") return "Listening. Sing now.";
  if (state.step === "reading") return `Reading ${state.name}.`;
  if (state.step === "stopping" || state.step === "judging") {
    return state.stoppedBy === "file" ? "Listening to the recording." : "Stopped. Reading your take.";
  }
  if (state.step === "failure") return failureWords(state.failure).title;
  if (state.step !== "result" || !state.take.report.comfort) return "";
  return `Your comfortable notes: ${bandWords(inTune(state.take.report.comfort, state.take.report.tuningCents))}.`;
}
