import type { Mode } from "@/shared/music/keyName";
import type { SingingVoice, Tune } from "@/shared/keys/keyScore";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import { scoreSharedKeys } from "@/shared/keys/sharedKey";

/** A song as keys are judged by it, and the voices it is to lie in. */
export interface PupilsQuestion {
  tune: Tune;
  written: { tonic: string; mode: Mode };
  voices: readonly { memberId: string; name: string; voice: SingingVoice }[];
}

/** One key for one pupil, as much of it as a table shows. */
export interface PupilKey {
  tonic: string;
  /** semitones from the tune as written, octave included */
  shift: number;
  score: number;
  reason: string;
  lowMidi: number;
  highMidi: number;
  /** "comfort": all of it; "reach": some outside the comfort band; "beyond": some outside the range */
  fit: "comfort" | "reach" | "beyond";
  /** how far it leaves the comfort band, semitones, and what is left of the range there; negative = beyond it */
  over: number;
  above: number;
  under: number;
  below: number;
}

/** One key for all, and what it is for each of those who are judged, in their order. */
export interface ClassKey {
  tonic: string;
  worst: number;
  mean: number;
  beyond: boolean;
  reason: string;
  pupils: PupilKey[];
}

export interface PupilsJudged {
  /** only the span of the tune was known */
  coarse: boolean;
  /** for each pupil all twelve keys, best first */
  each: Record<string, PupilKey[]>;
  /** all twelve keys for everybody together, fairest first; empty where nobody is judged */
  together: ClassKey[];
}

/** Every key for every pupil, and for all of them together. */
export function judgePupils({ tune, written, voices }: PupilsQuestion): PupilsJudged {
  const options = { mode: written.mode, presentKey: written.tonic };
  const each = Object.fromEntries(
    voices.map(({ memberId, voice }) => [memberId, scoreKeys(tune, voice, options).map((key) => pupilKey(key, voice))]),
  );
  const together = voices.length === 0 ? [] : scoreSharedKeys(tune, voices, options);
  return {
    coarse: tune.kind === "span",
    each,
    together: together.map(({ tonic, worst, mean, beyond, reason, singers }) => ({
      tonic,
      worst,
      mean,
      beyond,
      reason,
      pupils: singers.map(({ key }, k) => pupilKey(key, voices[k]!.voice)),
    })),
  };
}

type Scored = ReturnType<typeof scoreKeys>[number];

function pupilKey(key: Scored, { comfort }: SingingVoice): PupilKey {
  const { tonic, shift, score, reason, lowMidi, highMidi, beyond, reserves } = key;
  const over = Math.max(0, highMidi - Math.round(comfort.highMidi));
  const under = Math.max(0, Math.round(comfort.lowMidi) - lowMidi);
  return {
    tonic,
    shift,
    score,
    reason,
    lowMidi,
    highMidi,
    fit: beyond ? "beyond" : over > 0 || under > 0 ? "reach" : "comfort",
    over,
    above: Math.round(reserves.upper),
    under,
    below: Math.round(reserves.lower),
  };
}
