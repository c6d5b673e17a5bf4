import type { Try } from "@/shared/contract/try";
import { glyphs, noteName } from "@/shared/music/pitch";
import { sameKey } from "../sameKey";
import { effortWords } from "@/shared/voice/effortWords";

const percentOf = (share: number) => `${Math.round(100 * share)} %`;

/** What was sung of a song by a voice in the key of that move, in whatever octave. */
export function takesIn<Some extends Try>(
  tries: readonly Some[],
  songId: string,
  voiceId: string | null,
  shift: number,
): Some[] {
  return tries.filter((each) => each.songId === songId && each.voiceId === voiceId && sameKey(each.shift, shift));
}

/** "2 tries, best 92 % in tune" */
export function takesSummary(tries: readonly Try[]): string {
  const shares = tries.flatMap(({ measures }) => (typeof measures?.inTune === "number" ? [measures.inTune] : []));
  const count = `${tries.length} ${tries.length === 1 ? "try" : "tries"}`;
  return shares.length === 0 ? count : `${count}, best ${percentOf(Math.max(...shares))} in tune`;
}

/** "felt hard work; 78 % in tune, A4 fell short" */
export function takeInWords({ effort, measures }: Try, spelling: "sharps" | "flats"): string {
  const felt = effort === null ? "how it felt is not said" : `felt ${effortWords[effort - 1]}`;
  if (!measures) return `${felt}; not measured`;
  const { inTune, fellShort } = measures;
  const note = fellShort && glyphs(noteName(Math.round(fellShort.midi), spelling));
  const missed =
    fellShort === null
      ? ""
      : fellShort.semitones === null
        ? `, ${note} left out`
        : `, ${note} ${fellShort.side === "above" ? "fell short" : "came out higher"}`;
  return inTune === null ? `${felt}; too little sung to tell` : `${felt}; ${percentOf(inTune)} in tune${missed}`;
}

/** "Tue 24 Nov" */
export function takeDay(sungAt: string): string {
  const at = new Date(sungAt);
  const part = (options: Intl.DateTimeFormatOptions) => new Intl.DateTimeFormat("en-GB", options).format(at);
  return `${part({ weekday: "short" })} ${part({ day: "numeric", month: "short" })}`;
}
