import { midiToHz } from "@/shared/music/pitch";
import type { TakeReport } from "@/shared/voice/takeReport";
import { fellSilent, holdNow, readTry } from "./guidedHold";

const report = (
  notes: [midi: number, seconds: number, sustained?: boolean][],
  verdict: TakeReport["verdict"] = "heard",
) =>
  ({
    verdict,
    f0: notes.flatMap(([, seconds]) => Array(Math.round(100 * seconds)).fill(220)),
    notes: notes.map(([midi, seconds, sustained = true], k) => ({
      start: 3 * k,
      end: 3 * k + seconds,
      midi,
      steadinessCents: 10,
      sustained,
      clear: sustained,
    })),
  }) as unknown as TakeReport;
const down = { midi: 51, beyond: { midi: 53, side: -1 as const } };

test.each([
  ["the note asked for, a little flat", report([[50.7, 1.5]]), { kind: "held", note: { midi: 50.7 } }],
  [
    "after a slip the note asked for",
    report([
      [54, 2],
      [51.2, 0.9],
    ]),
    { kind: "held", note: { midi: 51.2 } },
  ],
  ["a neighbour that is farther than before", report([[49.6, 1.2]]), { kind: "held", note: { midi: 49.6 } }],
  ["the note before once more", report([[53, 1.5]]), { kind: "elsewhere", note: { midi: 53 } }],
  ["the note an octave up", report([[63, 1.5]]), { kind: "elsewhere", note: { midi: 63 } }],
  ["an octave too low: no step, a slip", report([[39, 1.5]]), { kind: "elsewhere" }],
  ["a note that did not stay", report([[51, 0.4, false]], "too-short"), { kind: "unsteady" }],
  ["silence", report([], "too-quiet"), { kind: "unheard", why: "too-quiet" }],
  ["hardly a sound", report([], "too-short"), { kind: "unheard", why: "too-short" }],
  ["a note that slid away", report([[51, 0.6]], "not-singing"), { kind: "unsteady" }],
  ["a click", report([[51, 0.1]], "not-singing"), { kind: "unheard", why: "not-singing" }],
  ["a loud room", report([[51, 2]], "too-noisy"), { kind: "unheard", why: "too-noisy" }],
])("%s", (_, heard, outcome) => {
  expect(readTry(heard, down)).toMatchObject(outcome);
});

test("the first hum may be any note, the longest one counts", () => {
  expect(
    readTry(
      report([
        [60, 0.6],
        [55.1, 1.4],
      ]),
      null,
    ),
  ).toMatchObject({ kind: "held", note: { midi: 55.1 } });
});

test("a live note is held since it settled, across a short gap, and ends with its singer", () => {
  const frame = (midi: number | null, k: number) => ({
    t: k / 100,
    hz: midi === null ? null : midiToHz(midi),
    clarity: 1,
    levelDb: -20,
  });
  const sung = [...Array(50).fill(60), ...Array(4).fill(null), ...Array(80).fill(60.3)].map(frame);
  expect(holdNow(sung)?.heldS).toBeCloseTo(1.34, 2);
  expect(holdNow([...Array(60).fill(55), ...Array(60).fill(60)].map(frame))?.heldS).toBeCloseTo(0.6, 2);
  expect(holdNow([...sung, ...Array(40).fill(null).map(frame)])).toBeNull();
  expect(fellSilent([...sung, ...Array(130).fill(null).map(frame)])).toBe(true);
  expect(fellSilent([...sung, ...Array(60).fill(null).map(frame)])).toBe(false);
  expect(fellSilent(Array(300).fill(null).map(frame))).toBe(false);
});
