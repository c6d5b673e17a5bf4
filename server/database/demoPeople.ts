import type { Account } from "../../shared/contract/account";

/** Somebody of the evening class in Orlow Quay, all invented. */
export interface DemoPerson {
  name: string;
  email: string;
  role: Account["role"];
  voice: string;
  /** what they sang, oldest first; notes as [MIDI number, seconds] */
  takes: {
    /** a sung phrase unless said otherwise */
    kind?: "phrase" | "hold";
    sungAt: string;
    warmedUp: boolean;
    effort: number;
    comfort: [low: number, high: number];
    sung: [number, number][];
  }[];
  /** the preset their instrument came from, and what they call it */
  instrument: { presetId: string; name: string };
}

/** Known to everybody who can read this: it opens nothing but invented accounts. */
export const demoPassword = "slipway lantern";

export const demoPeople: readonly DemoPerson[] = [
  {
    name: "Maren Oake",
    email: "maren@orlow-quay.example",
    role: "singer",
    voice: "My voice",
    takes: [
      {
        sungAt: "2026-11-12T18:05:00.000Z",
        warmedUp: false,
        effort: 3,
        comfort: [55, 68],
        sung: [
          [60, 0.9],
          [62, 0.6],
          [64, 1.4],
          [60, 0.7],
          [57, 0.8],
          [55, 1.3],
          [53.1, 0.7],
          [57, 0.5],
          [62, 0.9],
          [65, 0.8],
          [67, 1.1],
          [69, 0.9],
          [70, 0.6],
        ],
      },
      {
        sungAt: "2026-11-24T19:20:00.000Z",
        warmedUp: true,
        effort: 2,
        comfort: [55, 69],
        sung: [
          [59, 0.7],
          [62, 0.8],
          [64, 2.6],
          [60, 0.6],
          [57, 1.2],
          [55, 1.5],
          [52.9, 0.8],
          [60, 0.6],
          [65, 0.9],
          [67, 1.3],
          [69, 1.2],
          [71, 0.7],
          [72, 0.9],
          [67, 0.8],
        ],
      },
      {
        kind: "hold",
        sungAt: "2026-11-28T09:40:00.000Z",
        warmedUp: true,
        effort: 3,
        comfort: [55, 69],
        sung: [
          [62, 1.8],
          [60, 1.7],
          [58, 1.7],
          [56, 1.6],
          [54, 1.4],
          [53, 1.1],
          [64, 1.8],
          [66, 1.7],
          [68, 1.6],
          [70, 1.4],
          [72, 1],
        ],
      },
    ],
    instrument: { presetId: "box-adf", name: "Box guitar" },
  },
  {
    name: "Nils Arden",
    email: "nils@orlow-quay.example",
    role: "singer",
    voice: "My voice",
    takes: [
      {
        sungAt: "2026-11-24T19:35:00.000Z",
        warmedUp: true,
        effort: 2,
        comfort: [47, 60],
        sung: [
          [52, 1.1],
          [50, 0.8],
          [48, 1.3],
          [47, 0.9],
          [45, 1],
          [43.2, 0.9],
          [48, 0.6],
          [53, 1.2],
          [55, 1.6],
          [57, 1],
          [59, 0.9],
          [60, 1.1],
          [62, 0.7],
          [63.8, 0.6],
        ],
      },
    ],
    instrument: { presetId: "guitar", name: "The old six-string" },
  },
  {
    name: "Ruth Callow",
    email: "ruth@orlow-quay.example",
    role: "teacher",
    voice: "Head voice",
    takes: [
      {
        sungAt: "2026-11-17T17:45:00.000Z",
        warmedUp: true,
        effort: 1,
        comfort: [60, 74],
        sung: [
          [64, 1.2],
          [67, 1.4],
          [69, 1.1],
          [65, 0.9],
          [62, 0.8],
          [60, 1.2],
          [57.1, 0.7],
          [64, 0.6],
          [70, 1],
          [72, 1.5],
          [74, 1.1],
          [76, 0.8],
          [77, 0.9],
        ],
      },
    ],
    instrument: { presetId: "ukulele-baritone", name: "The class's baritone" },
  },
];
