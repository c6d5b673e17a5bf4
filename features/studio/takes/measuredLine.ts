import type { HandIn } from "@/shared/contract/studio/handIn";
import { glyphs, noteName } from "@/shared/music/pitch";

const percent = (share: number) => `${Math.round(100 * share)} %`;
const noteAt = ({ midi }: { midi: number }) => glyphs(noteName(Math.round(midi)));

/** What was measured in a take, in figures that read the same for pupil and teacher. */
export function measuredLine(measures: NonNullable<HandIn["measures"]>): string {
  const { sungShare, inTune, offCents, fellShort, ranOutOfLow } = measures;
  const facts = [
    `${percent(sungShare)} of the tune sung`,
    inTune === null ? null : `${percent(inTune)} of it in tune`,
    offCents === null ? null : `${Math.round(offCents)} cents off on average`,
    fellShort && `fell short at ${noteAt(fellShort)}`,
    ranOutOfLow && `the low ${noteAt(ranOutOfLow)} ${ranOutOfLow.why === "weak" ? "was weak" : "was left out"}`,
  ];
  return `${facts.filter((fact) => fact !== null).join(", ")}.`;
}
