import type { SectionKind } from "@/shared/songs/sectionKind";

/** Kinds that one can name a part by; a name of one's own is written. */
export const partKinds = [
  "verse",
  "chorus",
  "pre-chorus",
  "bridge",
  "solo",
  "intro",
  "outro",
  "tag",
  "interlude",
] as const satisfies readonly SectionKind[];
export type NamedKind = (typeof partKinds)[number];

export const kindWords: Record<NamedKind, string> = {
  verse: "Verse",
  chorus: "Chorus",
  "pre-chorus": "Pre-chorus",
  bridge: "Bridge",
  solo: "Solo",
  intro: "Intro",
  outro: "Outro",
  tag: "Tag",
  interlude: "Interlude",
};

/** The name a new part of this kind gets: verses are counted, the others only from the second on. */
export function freeName(kind: NamedKind, taken: readonly (string | null)[]): string {
  const names = new Set(taken.map((name) => name?.toLowerCase()));
  const plain = kindWords[kind];
  if (kind !== "verse" && !names.has(plain.toLowerCase())) return plain;
  let number = kind === "verse" ? 1 : 2;
  while (names.has(`${plain} ${number}`.toLowerCase())) number += 1;
  return `${plain} ${number}`;
}
