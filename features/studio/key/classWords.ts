import { listWords } from "@/shared/music/listWords";
import type { ClassKey, PupilKey } from "../judge/judgePupils";
import { capitalized, countWord } from "@/shared/music/countWords";

/** A pupil in the key that is looked at. */
export interface InKey {
  memberId: string;
  name: string;
  key: PupilKey;
}

/** The shift that most of a class sing at; of equally many the one nearest to the chart. */
function commonShift(pupils: readonly Pick<PupilKey, "shift">[]): number {
  const counts = new Map<number, number>();
  for (const { shift } of pupils) counts.set(shift, (counts.get(shift) ?? 0) + 1);
  const [most] = [...counts].sort(([a, n], [b, m]) => m - n || Math.abs(a) - Math.abs(b) || a - b);
  return most?.[0] ?? 0;
}

const namedUpTo = 3;

/** Who sings in another octave than most: "Six sing it an octave lower."; "" where all sing in one. */
export function octaveSentence(pupils: readonly InKey[]): string {
  const common = commonShift(pupils.map(({ key }) => key));
  const octaveOf = ({ key }: InKey) => Math.round((key.shift - common) / 12);
  const octaves = [...new Set(pupils.map(octaveOf))].filter((each) => each !== 0).sort((a, b) => b - a);
  return octaves
    .map((octave) => {
      const who = pupils.filter((pupil) => octaveOf(pupil) === octave).map(({ name }) => name);
      const subject = who.length <= namedUpTo ? listWords(who) : capitalized(countWord(who.length, 20));
      const size = Math.abs(octave) === 1 ? "an octave" : `${Math.abs(octave)} octaves`;
      return `${subject} ${who.length === 1 ? "sings" : "sing"} it ${size} ${octave < 0 ? "lower" : "higher"}.`;
    })
    .join(" ");
}

const places = ["fairest key", "second fairest", "third fairest"];

/** "fairest key. The worst-off singer still scores 73, the class 85 on average." */
export function fairnessSentence(key: ClassKey, place: number): string {
  const which = places[place] ?? `${place + 1}th of twelve`;
  return `${which}. The worst-off singer ${key.beyond ? "scores" : "still scores"} ${Math.round(key.worst)}, the class ${Math.round(key.mean)} on average.`;
}

/** Those who have it hardest in a key, the hardest first; those who are all in comfort are left out. */
export function squeezed(pupils: readonly InKey[], most: number): InKey[] {
  return pupils
    .filter(({ key }) => key.fit !== "comfort")
    .sort((a, b) => a.key.score - b.key.score || a.name.localeCompare(b.name, "en"))
    .slice(0, most);
}
