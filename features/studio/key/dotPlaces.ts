import type { ClassKey, PupilKey } from "../judge/judgePupils";

/** A pupil's score in a key as a dot, px from the top left of the picture. */
export interface Dot {
  x: number;
  y: number;
  fit: PupilKey["fit"];
}

/** Measures of the picture, px. */
export const dotPicture = { left: 30, column: 43, top: 14, height: 128, base: 104, radius: 2.7 } as const;

/** Height of a score. */
export const yOfScore = (score: number): number => dotPicture.top + (100 - score) * 0.978;

/** Middle of a key's column. */
export const xOfKey = (index: number): number => dotPicture.left + dotPicture.column * (index + 0.6);

/** Scores that lie within this stand side by side. */
const row = 5;
const step = 5.8;
const widest = 36;

/** The scores of a class in one key: equal ones side by side, closer together where many are. */
export function dotPlaces({ pupils }: Pick<ClassKey, "pupils">, index: number): Dot[] {
  const rows = new Map<number, PupilKey[]>();
  for (const pupil of pupils) {
    const at = Math.round(pupil.score / row) * row;
    rows.set(at, [...(rows.get(at) ?? []), pupil]);
  }
  return [...rows].flatMap(([at, beside]) => {
    const distance = beside.length === 1 ? 0 : Math.min(step, widest / (beside.length - 1));
    return beside.map(({ fit }, k) => ({
      x: xOfKey(index) + (k - (beside.length - 1) / 2) * distance,
      y: Math.min(dotPicture.base - 4, yOfScore(at)),
      fit,
    }));
  });
}
