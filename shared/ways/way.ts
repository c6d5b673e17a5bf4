/** One fingering of a chord. Frets are counted from the nut, or from the capo where one is on. */
export interface Shape {
  /** low (bass side) to high: 0 = open, null = silent */
  frets: (number | null)[];
  /** finger 1-4 per string, 0 where none is needed */
  fingers: number[];
  /** the barre, if one finger stops several strings */
  barre: { fret: number; fromString: number; toString: number } | null;
  /** distance between the lowest and highest stopped fret, mm */
  reachMm: number;
  /** 0 (hardest) to 1 (easiest) */
  ease: number;
  /** indices of strings that sound the chord's root */
  roots: number[];
}

/** A chord of the song inside one way. */
export interface WayChord {
  /** as in the target key: what is heard, ASCII */
  sounding: string;
  /** as it stands in the chart as written, ASCII */
  written: string;
  /** name of the shape the fingers play, ASCII */
  played: string;
  /** best shape in the flow of the song; null where the instrument cannot play this chord */
  shape: Shape | null;
  /** whether the player knows this shape; absent where nothing is known of the player */
  known?: boolean;
}

/** One string before and after a retune. */
export interface StringChange {
  from: string;
  to: string;
  /** pounds-force; null when the gauge is not known */
  beforeLb: number | null;
  afterLb: number | null;
  verdict: "fine" | "slack" | "tight" | "unsafe";
}

/** One proposed manner of reaching a key. */
export interface Way {
  kind: "as-is" | "capo" | "retune" | "retune-capo";
  /** semitones, all strings alike; negative = down */
  retune: number;
  capo: number;
  shapeKey: string;
  soundingKey: string;
  chords: WayChord[];
  /** 0 (easy) to 1 (hard) */
  difficulty: number;
  strings: StringChange[];
  /** what to do, one sentence: "Capo 3, play the shapes you know in A" */
  title: string;
  /** cost in words: "Two closed shapes, one barre. 17 frets left." */
  cost: string;
  cautions: string[];
  why: string;
  /** how far the hand travels along the neck, the song through, mm */
  travelMm: number;
  /** the same in words: "The hand stays in one place." */
  travel: string;
}

/** The player's wishes. They weigh; safety forbids. */
export interface WayPreferences {
  /** how much to avoid each, 0 (do not mind) to 1 (avoid) */
  barre: number;
  capo: number;
  retune: number;
  /** how much to keep strings ringing open, 0 (does not matter) to 1; default 0 */
  ringing?: number;
  /** how much to stay with shapes that are known, 0 (does not matter) to 1; default 0.5 */
  familiar?: number;
  /** chord names whose usual shapes the player knows */
  knownShapes: string[];
  /** shapes the player knows, as `shapeMark` names them; none of these and no names = no preference */
  knownMarks?: readonly string[];
  highestCapo: number;
}
