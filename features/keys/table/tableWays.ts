/** A way to play a key, as a row of the table shows and weighs it. */
export interface TableWay {
  /** "Capo 5, shapes in G" */
  title: string;
  /** "easy, nothing retuned" */
  cost: string;
  /** its fret, 0 for none */
  capo: number;
  barres: number;
  /** 0 (easy) to 1 (hard) */
  difficulty: number;
}

/** All ways into one key, best first: undefined while they are searched, null where none can be searched. */
export type FoundWays = readonly TableWay[] | null | undefined;

/** What a way has to do without. */
export interface WayNeeds {
  noCapo: boolean;
  noBarre: boolean;
}

/** The best of the ways that does without: undefined while they are searched, null where there is none. */
export function bestWay(found: FoundWays, { noCapo, noBarre }: WayNeeds): TableWay | null | undefined {
  if (!found) return found;
  return found.find(({ capo, barres }) => (!noCapo || capo === 0) && (!noBarre || barres === 0)) ?? null;
}
