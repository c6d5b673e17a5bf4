import type { Failure, FailureKind, Interruption, StoppedBy } from "./recorder/recorder";

export interface FailureWords {
  title: string;
  happened: string;
  /** what is safe */
  safe: string;
  /** what to do */
  next: string;
}

const nothingKept = "Nothing was kept, and your voices are as they were.";
const nothingRecorded = "Nothing was recorded, and your voices are as they were.";

const causes: Record<Interruption, string> = {
  taken: "A call or another program took the microphone",
  unplugged: "The microphone was unplugged or switched off",
  muted: "The microphone was muted",
  hidden: "This page went into the background",
  stalled: "The microphone stopped sending sound",
  reloaded: "The page was loaded again",
};

/** "A call or another program took the microphone at 4 s." */
export function causeWords(stoppedBy: Interruption, seconds: number): string {
  return `${causes[stoppedBy]} at ${Math.floor(seconds)} s.`;
}

export function isInterruption(stoppedBy: StoppedBy | null): stoppedBy is Interruption {
  return stoppedBy !== null && stoppedBy !== "singer" && stoppedBy !== "full";
}

const titles: Record<FailureKind, string> = {
  refused: "The microphone is not allowed here",
  "no-microphone": "No microphone found",
  insecure: "This address is not secure",
  busy: "The microphone is in use",
  unsupported: "This browser cannot listen",
  interrupted: "The sound broke off",
  broken: "Listening stopped",
  "too-short": "Too short to tell",
  "too-quiet": "Too quiet to hear",
  "too-noisy": "Too noisy around you",
  clipped: "Too loud for the microphone",
  "not-singing": "No singing heard",
  "several-voices": "More than one voice",
};

const withoutSound = {
  refused: {
    happened: "Your browser was told not to let this page use the microphone.",
    next: "Allow the microphone for this page in the browser's settings, then try again.",
  },
  "no-microphone": {
    happened: "This device has no microphone that the browser can use.",
    next: "Plug one in or switch it on, then try again.",
  },
  insecure: {
    happened: "Browsers let a page listen only over a secure connection, and this one is not.",
    next: "Open Larkspan at its address that begins with https, then try again.",
  },
  busy: {
    happened: "Another program or page holds the microphone.",
    next: "Close the other one, then try again.",
  },
  unsupported: {
    happened: "This browser could not pass the sound on to the page.",
    next: "Update the browser or use another one, then try again.",
  },
} as const;

/** What a failed take is called, what happened, what is safe and what to do. */
export function failureWords({ kind, report, seconds, stoppedBy }: Failure): FailureWords {
  const title = titles[kind];
  if (kind in withoutSound) return { title, ...withoutSound[kind as keyof typeof withoutSound], safe: nothingRecorded };
  if (kind === "interrupted" && isInterruption(stoppedBy)) {
    const short = seconds > 0 ? " What you sang until then was not enough to read your notes from." : "";
    return {
      title,
      happened: `${causeWords(stoppedBy, seconds)}${short}`,
      safe: nothingKept,
      next: "Sing again when it is free.",
    };
  }
  if (report) return { title, happened: report.sentence, safe: nothingKept, next: report.nextStep };
  return {
    title,
    happened: "Something went wrong in Larkspan while it listened.",
    safe: nothingKept,
    next: "Try again, or set your notes by hand.",
  };
}
