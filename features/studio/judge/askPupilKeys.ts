import { queryOptions, skipToken } from "@tanstack/react-query";
import type { PupilsJudged, PupilsQuestion } from "./judgePupils";

/** What the worker says to a question. */
export type PupilsAnswer = { judged: PupilsJudged } | { fault: string };

const unopened = "The keys could not be worked out here. Check your connection and try again.";

/** Judges beside the page, so that a class of two hundred does not stop it; ends with the page's interest in it. */
function askPupilKeys(question: PupilsQuestion, signal: AbortSignal): Promise<PupilsJudged> {
  if (typeof Worker === "undefined") return Promise.reject(new Error(unopened));
  return new Promise((done, fail) => {
    const worker = new Worker("/worklets/pupilsWorker.js");
    const end = (say: () => void) => {
      worker.terminate();
      say();
    };
    signal.addEventListener("abort", () => end(() => fail(signal.reason as Error)));
    worker.onerror = () => end(() => fail(new Error(unopened)));
    worker.onmessage = ({ data }: MessageEvent<PupilsAnswer>) =>
      end(() => ("judged" in data ? done(data.judged) : fail(new Error(data.fault))));
    worker.postMessage(question);
  });
}

/** The keys of a song for the voices of a class; idle where there is no tune or no voice. */
export const pupilKeys = (question: PupilsQuestion | null) =>
  queryOptions({
    queryKey: ["pupil-keys", question],
    queryFn: question && question.voices.length > 0 ? ({ signal }) => askPupilKeys(question, signal) : skipToken,
    staleTime: Infinity,
    retry: false,
  });
