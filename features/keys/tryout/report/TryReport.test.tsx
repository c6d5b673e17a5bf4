import { fireEvent, render, screen } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import { measureTake } from "@/shared/keys/measureTake";
import { midiToHz } from "@/shared/music/pitch";
import type { TakeReport } from "@/shared/voice/takeReport";
import { TryReport } from "./TryReport";
import { tryPlan, usualWishes } from "../setup/tryWishes";

const notes = [62, 64, 66, 67, 69, 67, 66, 62].map((midi, start) => ({ midi, start, duration: 1 }));
const song = aSong({ tune: { kind: "melody", notes, home: "D" } });
const key = { tonic: "C", shift: -2 };
const wishes = usualWishes(song);
const plan = tryPlan(song, key, wishes)!;
const endS = Math.max(...plan.notes.map(({ at, duration }) => at + duration));

/** Every note of the plan sung as it stands. */
const report: TakeReport = {
  verdict: "heard",
  sentence: "Heard.",
  nextStep: "Go on.",
  advice: "go-on",
  durationS: endS + 0.5,
  f0: Array.from({ length: Math.ceil(100 * (endS + 0.5)) }, (_, k) => {
    const note = plan.notes.find(({ at, duration }) => k / 100 >= at && k / 100 < at + duration);
    return note ? midiToHz(note.midi) : null;
  }),
  notes: plan.notes.map(({ at, duration, midi }) => ({
    start: at,
    end: at + duration,
    midi,
    steadinessCents: 8,
    vibrato: null,
    levelDb: -20,
    sustained: true,
    clear: true,
  })),
  range: null,
  comfort: null,
  estimate: null,
  tessitura: null,
  tuningCents: 0,
  certainty: 0.9,
  reasons: [],
};
const measures = measureTake(report, plan, { startS: 0 });

function show(state: { playing?: boolean; failed?: boolean } = {}) {
  const heard: unknown[] = [];
  render(
    <TryReport
      measured={{
        key,
        wishes,
        startS: 0,
        plan,
        measures,
        take: { id: "take", sungAt: "2026-11-24T19:10:00.000Z", report, processed: [], brokenOff: null },
      }}
      spelling="sharps"
      playback={{
        playing: false,
        failed: false,
        play: (part) => Promise.resolve(void heard.push(part)),
        stop: () => heard.push("stop"),
        position: () => 0,
        ...state,
      }}
    />,
  );
  return heard;
}

test("the whole take is played back from its start to its end", () => {
  const heard = show();
  fireEvent.click(screen.getByRole("button", { name: "Play back" }));
  expect(heard).toEqual([{ startS: 0, endS: report.durationS }]);
});

test("a phrase is heard by itself, with a little before and after it", () => {
  const heard = show();
  const phrase = measures!.phrases[0]!;
  fireEvent.click(screen.getAllByRole("button", { name: /^Hear it: / })[0]!);
  expect(heard).toEqual([{ startS: Math.max(0, phrase.start! - 0.2), endS: phrase.end! + 0.3 }]);
});

test("what plays is stopped by the same button", () => {
  const heard = show({ playing: true });
  expect(screen.queryByRole("button", { name: "Play back" })).toBeNull();
  fireEvent.click(screen.getByRole("button", { name: "Stop playing" }));
  expect(heard).toEqual(["stop"]);
});

test("a take that cannot be played says so, and its figures stand", () => {
  show({ failed: true });
  expect(screen.getByText(/This browser could not play the take/)).toBeTruthy();
  expect(screen.getByTestId("try-summary").textContent).toMatch(/In tune: 100 %/);
});
