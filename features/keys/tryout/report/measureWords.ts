import type { Measures, TakeMeasures } from "@/shared/keys/takeMeasures";
import { glyphs, noteName } from "@/shared/music/pitch";
import { semitoneWords } from "@/shared/music/moveWords";

/** One measured thing in words and a number. */
export interface MeasureWord {
  name: string;
  text: string;
  tone: "ink" | "soft" | "honey" | "brick";
}

/** From here on a phrase was less steady than the singer is elsewhere. */
const unsteadyFrom = 1.8;
export const UNKNOWN = "not to be told";
const unknown = { text: UNKNOWN, tone: "soft" } as const;

/** The measures of a whole take, as steady as its least steady phrase. */
export function wholeMeasures<Take extends Measures & Pick<TakeMeasures, "phrases">>(take: Take): Take {
  const told = take.phrases.flatMap(({ unsteady }) => (unsteady === null ? [] : [unsteady]));
  return { ...take, unsteady: told.length > 0 ? Math.max(...told) : null };
}

/** What was measured, thing by thing; notes are spelled as the key wants it. */
export function measureWords(measures: Measures, spelling: "sharps" | "flats"): MeasureWord[] {
  const { inTune, offCents, fellShort, unsteady, ranOutOfLow, sungShare } = measures;
  const note = (midi: number) => glyphs(noteName(Math.round(midi), spelling));
  const told = inTune !== null;
  return [
    {
      name: "Sung",
      text: `${Math.round(100 * sungShare)} % of its time`,
      tone: sungShare < 0.25 ? "brick" : sungShare < 0.75 ? "honey" : "ink",
    },
    {
      name: "In tune",
      ...(inTune === null || offCents === null
        ? unknown
        : {
            text: `${Math.round(100 * inTune)} %, ${Math.round(offCents)} cents off`,
            tone: inTune < 0.5 ? ("brick" as const) : inTune < 0.8 ? ("honey" as const) : ("ink" as const),
          }),
    },
    {
      name: "Reached",
      ...(fellShort
        ? {
            text: `${fellShort.side === "above" ? "not up to" : "not down to"} ${note(fellShort.midi)}, ${fellShort.semitones === null ? "left out" : `${steps(fellShort.semitones)} short`}`,
            tone: "brick" as const,
          }
        : told
          ? { text: "every note", tone: "ink" as const }
          : unknown),
    },
    {
      name: "Steady",
      ...(unsteady === null
        ? unknown
        : unsteady >= unsteadyFrom
          ? { text: `less: ${unsteady.toFixed(1)} times your usual sway`, tone: "honey" as const }
          : { text: "as ever", tone: "ink" as const }),
    },
    {
      name: "Low notes",
      ...(ranOutOfLow
        ? {
            text: `${note(ranOutOfLow.midi)} was ${ranOutOfLow.why === "weak" ? "much softer" : "left out"}`,
            tone: "honey" as const,
          }
        : told
          ? { text: "carried", tone: "ink" as const }
          : unknown),
    },
  ];
}

function steps(semitones: number): string {
  const rounded = Math.round(10 * Math.abs(semitones)) / 10;
  const shown = rounded >= 1 && Math.abs(rounded - Math.round(rounded)) < 0.15 ? Math.round(rounded) : rounded;
  return semitoneWords(shown);
}
