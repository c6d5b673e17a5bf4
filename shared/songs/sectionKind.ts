/** What a part of a song is; "own" for a name that its writer made up. */
export type SectionKind =
  | "pre-chorus"
  | "post-chorus"
  | "chorus"
  | "verse"
  | "bridge"
  | "solo"
  | "intro"
  | "outro"
  | "tag"
  | "instrumental"
  | "interlude"
  | "own";

/** A part's names: `plain` heads a section even without brackets or colon, `marked` words need such a sign. */
interface SectionNames {
  plain?: string;
  marked?: readonly string[];
}

/**
 * Names of the parts of a song, as patterns, in the order in which they are tried.
 *
 * @see common practice
 */
export const sectionNames: Record<Exclude<SectionKind, "own">, SectionNames> = {
  "pre-chorus": { plain: "pre[- ]?chorus" },
  "post-chorus": { plain: "post[- ]?chorus" },
  chorus: { plain: "chorus|refrain", marked: ["hook"] },
  verse: { plain: "verse|strophe", marked: ["rap", "spoken"] },
  bridge: { plain: "bridge|middle (?:eight|8)" },
  solo: { plain: String.raw`(?:(?:guitar|accordion|fiddle|piano|banjo|whistle|ukulele|harmonica)\s+)?solo` },
  intro: { plain: "intro(?:duction)?", marked: ["lead[- ]?in"] },
  outro: { plain: "outro|coda", marked: ["ending", "end"] },
  tag: { marked: ["tag"] },
  instrumental: { plain: "instrumental", marked: ["break", "riff"] },
  interlude: { plain: "interlude", marked: ["turnaround", "turn", "vamp", "link"] },
};
