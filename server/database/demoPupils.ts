import type { DemoPerson } from "./demoPeople";

/** A pupil of the class who has an account, but whom nobody plays: no password opens it. */
export interface DemoPupil extends DemoPerson {
  birthYear: number | null;
  /** has agreed that the teacher sees voice and instrument */
  agrees: boolean;
  /** when the newest take was handed in, how it felt, and what became of it; its sound is deleted. Null where none was */
  lastTake: { at: string; effort: number; state: "returned" | "accepted" } | null;
}

type Instrument = [presetId: string, name: string];

interface Sung {
  at: string;
  low: number;
  high: number;
  comfort: [low: number, high: number];
  effort: number;
}

/** A phrase that goes up from the middle of the voice, then down to its lowest note, and ends on its highest. */
function take({ at, low, high, comfort, effort }: Sung): DemoPerson["takes"][number] {
  const middle = Math.round((low + high) / 2);
  const sung: [number, number][] = [
    [middle, 0.9],
    [middle + 2, 0.7],
    [middle + 4, 1.2],
    [middle, 0.8],
    [comfort[0], 1.1],
    [low, 0.8],
    [middle, 0.6],
    [comfort[1], 1.3],
    [high, 0.7],
  ];
  return { sungAt: at, warmedUp: true, effort, comfort, sung };
}

function pupil(
  name: string,
  [presetId, instrument]: Instrument,
  takes: Sung[],
  lastTake: DemoPupil["lastTake"],
  { birthYear = 1984, agrees = true }: { birthYear?: number | null; agrees?: boolean } = {},
): DemoPupil {
  return {
    name,
    email: `${name.split(" ")[0]?.toLowerCase()}@orlow-quay.example`,
    role: "singer",
    voice: "My voice",
    takes: takes.map(take),
    instrument: { presetId, name: instrument },
    ...{ birthYear, agrees, lastTake },
  };
}

const inClass = "2026-11-24T19:45:00.000Z";

/** The rest of the evening class, all invented. */
export const demoPupils: readonly DemoPupil[] = [
  pupil("Lowri Tate", ["ukulele", "Ukulele"], [{ at: inClass, low: 54, high: 77, comfort: [57, 71], effort: 2 }], {
    at: "2026-11-26T17:10:00.000Z",
    effort: 2,
    state: "accepted",
  }),
  pupil(
    "Hob Carrow",
    ["banjo", "Banjo, five strings"],
    [{ at: inClass, low: 43, high: 66, comfort: [46, 61], effort: 2 }],
    { at: "2026-11-25T20:30:00.000Z", effort: 2, state: "accepted" },
  ),
  pupil("Odile Marsh", ["ukulele", "Ukulele"], [{ at: inClass, low: 56, high: 80, comfort: [59, 74], effort: 1 }], {
    at: "2026-11-27T08:20:00.000Z",
    effort: 1,
    state: "accepted",
  }),
  pupil(
    "Bram Tolley",
    ["box-dgb", "Box guitar"],
    [{ at: inClass, low: 40, high: 62, comfort: [43, 57], effort: 3 }],
    null,
  ),
  pupil("Ines Mallory", ["guitar", "Six-string"], [{ at: inClass, low: 52, high: 75, comfort: [55, 70], effort: 3 }], {
    at: "2026-11-22T16:00:00.000Z",
    effort: 5,
    state: "returned",
  }),
  pupil(
    "Joss Pell",
    ["box-adf", "Box guitar"],
    [
      { at: "2026-05-19T18:40:00.000Z", low: 55, high: 74, comfort: [58, 70], effort: 2 },
      { at: "2026-05-26T18:40:00.000Z", low: 55, high: 74, comfort: [58, 70], effort: 2 },
      { at: "2026-11-17T18:40:00.000Z", low: 46, high: 66, comfort: [50, 62], effort: 4 },
      { at: inClass, low: 46, high: 66, comfort: [50, 62], effort: 4 },
    ],
    { at: "2026-11-19T15:05:00.000Z", effort: 4, state: "returned" },
    { birthYear: 2009 },
  ),
  pupil("Greta Lunde", ["ukulele", "Ukulele"], [{ at: inClass, low: 55, high: 79, comfort: [58, 73], effort: 2 }], {
    at: "2026-11-21T11:45:00.000Z",
    effort: 2,
    state: "accepted",
  }),
  pupil(
    "Cass Wether",
    ["guitar", "Six-string"],
    [{ at: inClass, low: 57, high: 81, comfort: [60, 75], effort: 2 }],
    null,
    {
      birthYear: 2014,
    },
  ),
  pupil("Peter Quill", ["banjo", "Banjo"], [{ at: inClass, low: 46, high: 68, comfort: [49, 63], effort: 3 }], null, {
    birthYear: null,
    agrees: false,
  }),
];
