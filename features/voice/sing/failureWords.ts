import type { Failure, FailureKind, Interruption, StoppedBy } from "../recorder/recorder";
import type { Verdict } from "@/shared/voice/takeReport";
import type { Refusal, SoundKind } from "../recorder/sound/soundFile";

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

/** "A call or another program took the microphone" */
export function interruptionWords(stoppedBy: Interruption): string {
  return causes[stoppedBy];
}

/** "A call or another program took the microphone at 4 s."; in the very first second, without the time. */
export function causeWords(stoppedBy: Interruption, seconds: number): string {
  return seconds < 1 ? `${causes[stoppedBy]}.` : `${causes[stoppedBy]} at ${Math.floor(seconds)} s.`;
}

const mends: Record<Interruption, string> = {
  taken: "Wait until it is free",
  unplugged: "Plug it in or switch it on",
  muted: "Unmute it",
  hidden: "Keep this page in front",
  stalled: "Close what else is at work on this device",
  reloaded: "Leave the page open",
};

/** What to do before the next try, and the try: "Unmute it, then sing again." */
export function mendWords(stoppedBy: Interruption, then: string): string {
  return `${mends[stoppedBy]}, then ${then}.`;
}

export function isInterruption(stoppedBy: StoppedBy | null): stoppedBy is Interruption {
  return stoppedBy !== null && stoppedBy !== "singer" && stoppedBy !== "full" && stoppedBy !== "file";
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
  "not-a-sound": "Not a sound file",
  "unreadable-file": "This recording cannot be read",
  "too-large": "This file is too large",
  "too-long": "This recording is too long",
  "empty-file": "This file is empty",
};

const kinds = "wav, mp3, m4a, ogg, webm or flac";
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

const nothingRead = "Nothing was kept, the file is as it was, and it has not left this device.";
const files: Record<Refusal, (file: SoundKind | null) => { happened: string; next: string }> = {
  "not-a-sound": () => ({
    happened: `What is in this file is not sound of a kind that is read here, whatever its name says: ${kinds}.`,
    next: "Choose a recording of one of these kinds.",
  }),
  "unreadable-file": (file) => ({
    happened: `It begins like ${file === null ? "a recording" : `${article(file)} ${file} file`}, but this browser could not turn it into sound: it is damaged, cut off or coded in a way the browser does not know.`,
    next: "Save it again as wav or mp3, or choose another one.",
  }),
  "too-large": () => ({
    happened: "Recordings up to 20 MB are read here.",
    next: "Save only the singing, or save it as mp3, and choose that.",
  }),
  "too-long": () => ({
    happened: "Recordings up to 10 minutes are read here.",
    next: "Save only the part with the singing and choose that. 20 seconds are enough.",
  }),
  "empty-file": () => ({
    happened: "There is no sound in it.",
    next: "Choose another one.",
  }),
};

/** The engine's refusals for a recording that somebody has: there is no microphone to come closer to. */
const unheard: Record<Exclude<Verdict, "heard">, { title?: string; happened: string; next: string }> = {
  "too-short": {
    happened: "There is too little singing in this recording to tell.",
    next: "Choose one with a whole verse, or with a few notes held for a second each.",
  },
  "too-quiet": {
    happened: "There is hardly any sound in this recording.",
    next: "Choose a louder one, recorded closer to the microphone.",
  },
  "too-noisy": {
    title: "Too noisy to tell",
    happened: "The voice in this recording cannot be heard apart from the noise.",
    next: "Choose one from a quieter place.",
  },
  clipped: {
    title: "Too loud to read",
    happened: "This recording is so loud that its peaks are cut off.",
    next: "Choose one that was recorded less loud.",
  },
  "not-singing": {
    happened: "No singing was found in this recording.",
    next: "Choose one of a voice that sings on its own, without an instrument.",
  },
  "several-voices": {
    happened: "More than one voice or instrument was heard at once.",
    next: "Choose one of a single voice without an instrument, so that the range is yours.",
  },
};

function article(file: SoundKind): string {
  return file === "mp3" || file === "m4a" || file === "ogg" ? "an" : "a";
}

/** What a failed take is called, what happened, what is safe and what to do. */
export function failureWords({ kind, report, seconds, stoppedBy, file = null }: Failure): FailureWords {
  const title = titles[kind];
  if (kind in files) return { title, ...files[kind as Refusal](file), safe: nothingRead };
  if (kind in withoutSound) return { title, ...withoutSound[kind as keyof typeof withoutSound], safe: nothingRecorded };
  if (kind === "interrupted" && isInterruption(stoppedBy)) {
    const short = seconds > 0 ? " What you sang until then was not enough to read your notes from." : "";
    return {
      title,
      happened: `${causeWords(stoppedBy, seconds)}${short}`,
      safe: nothingKept,
      next: mendWords(stoppedBy, "sing again"),
    };
  }
  if (report && stoppedBy === "file" && kind in unheard)
    return { title, ...unheard[kind as keyof typeof unheard], safe: nothingKept };
  if (report) return { title, happened: report.sentence, safe: nothingKept, next: report.nextStep };
  return {
    title,
    happened: "Something went wrong in Larkspan while it listened.",
    safe: nothingKept,
    next: "Try again, or set your notes by hand.",
  };
}
