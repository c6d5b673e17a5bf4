import type { TryOutcome } from "./hearing/guidedHold";
import { beforeGuided, guidedSteps, shownEnds, type GuidedEvent, type GuidedState } from "./guidedSteps";

const start = (change: Partial<GuidedEvent & { kind: "start" }> = {}): GuidedEvent => ({
  kind: "start",
  id: "g1",
  startedAt: "2026-11-28T09:40:00.000Z",
  home: 57,
  under16: false,
  ...change,
});
const held = (midi: number): TryOutcome => ({ kind: "held", note: { midi, heldS: 1.6, steadinessCents: 12 } });
const unsteady: TryOutcome = { kind: "unsteady" };
const after = (events: GuidedEvent[], from: GuidedState = beforeGuided) => events.reduce(guidedSteps, from);
const runOf = (state: GuidedState) => {
  if (!("run" in state)) throw new Error(`no run in ${state.step}`);
  return state.run;
};

/** A singer who can hold all notes from `low` to `high`; walks until the machine waits for a decision or is done. */
function walk(state: GuidedState, low: number, high: number): { state: GuidedState; asked: number[] } {
  const asked: number[] = [];
  for (let guard = 0; guard < 200; guard += 1) {
    const { step } = state;
    if (step === "tone") state = guidedSteps(state, { kind: "toneEnded" });
    else if (step === "listening") state = guidedSteps(state, { kind: "listened" });
    else if (step === "judging") {
      const target = runOf(state).target ?? 57;
      asked.push(target);
      state = guidedSteps(state, {
        kind: "judged",
        outcome: target >= low && target <= high ? held(target) : unsteady,
      });
    } else if (step === "held") state = guidedSteps(state, { kind: "next" });
    else if (step === "missed") state = guidedSteps(state, { kind: "again" });
    else return { state, asked };
  }
  throw new Error("does not end");
}

const begun = () => after([start(), { kind: "opened" }]);

test("the way goes down in whole tones, tries a missed note once more, then its semitone once", () => {
  const { state, asked } = walk(begun(), 50, 70);
  expect(state.step).toBe("turn");
  expect(asked).toEqual([57, 55, 53, 51, 49, 49, 50]);
});

test("a note that was held is never asked for again on its way", () => {
  const { asked } = walk(begun(), 51, 70);
  expect(asked).toEqual([57, 55, 53, 51, 49, 49, 50]);
});

test("then it goes up from the same note, and what was found is sorted into held and for singing", () => {
  const turned = walk(begun(), 50, 70).state;
  const { state, asked } = walk(guidedSteps(turned, { kind: "up" }), 50, 70);
  expect(asked).toEqual([59, 61, 63, 65, 67, 69, 71, 71, 70]);
  expect(state).toMatchObject({
    step: "done",
    brokenOff: null,
    findings: { lowMidi: 50, highMidi: 70, singLow: 52, singHigh: 67, effort: null },
  });
  expect(shownEnds(runOf(state))).toEqual(["low", "high"]);
});

test("under 16 the first miss ends an end: nothing is pushed", () => {
  const { state, asked } = walk(after([start({ under16: true }), { kind: "opened" }]), 50, 70);
  expect(state.step).toBe("turn");
  expect(asked).toEqual([57, 55, 53, 51, 49]);
});

test("without a known voice the singer hums a comfortable note first, and both ways start from it", () => {
  const listening = after([start({ home: null }), { kind: "opened" }]);
  expect(listening.step).toBe("listening");
  const found = after([{ kind: "listened" }, { kind: "judged", outcome: held(52.2) }], listening);
  expect(runOf(found).home).toBe(52);
  expect(runOf(guidedSteps(found, { kind: "next" })).target).toBe(50);
});

test("who sings a neighbour of the note asked for goes on from what was really sung", () => {
  const far = after(
    [
      { kind: "toneEnded" },
      { kind: "listened" },
      { kind: "judged", outcome: held(57) },
      { kind: "next" },
      { kind: "toneEnded" },
      { kind: "listened" },
      { kind: "judged", outcome: held(54.1) },
      { kind: "next" },
    ],
    begun(),
  );
  expect(runOf(far).target).toBe(52);
});

test("a try in which nothing could be heard is no try of the voice", () => {
  const silent: TryOutcome = { kind: "unheard", why: "too-quiet" };
  const missed = after([{ kind: "toneEnded" }, { kind: "listened" }, { kind: "judged", outcome: silent }], begun());
  expect(missed).toMatchObject({ step: "missed", run: { tries: 0, target: 57 } });
});

test("enough at any moment keeps what was held, and finishing leaves the other end unsaid", () => {
  const down = after(
    [
      { kind: "toneEnded" },
      { kind: "listened" },
      { kind: "judged", outcome: held(57) },
      { kind: "next" },
      { kind: "toneEnded" },
      { kind: "listened" },
      { kind: "judged", outcome: held(55) },
    ],
    begun(),
  );
  const turned = guidedSteps(down, { kind: "enough" });
  expect(turned.step).toBe("turn");
  const done = guidedSteps(turned, { kind: "finish" });
  expect(done).toMatchObject({ step: "done", findings: { lowMidi: 55, highMidi: 57 } });
  expect(shownEnds(runOf(done))).toEqual(["low"]);
  expect(guidedSteps(begun(), { kind: "finish" })).toEqual(beforeGuided);
});

test("a microphone that is taken away keeps what was held, and says so where nothing was", () => {
  const one = after([{ kind: "toneEnded" }, { kind: "listened" }, { kind: "judged", outcome: held(57) }], begun());
  const two = after(
    [{ kind: "next" }, { kind: "toneEnded" }, { kind: "listened" }, { kind: "judged", outcome: held(55) }],
    one,
  );
  expect(guidedSteps(two, { kind: "interrupted", cause: "unplugged" })).toMatchObject({
    step: "done",
    brokenOff: "unplugged",
  });
  expect(guidedSteps(one, { kind: "interrupted", cause: "unplugged" })).toMatchObject({
    ...{ step: "paused", next: "low", cause: "unplugged" },
    run: { held: [{ midi: 57 }] },
  });
  expect(guidedSteps(one, { kind: "finish" })).toEqual({ step: "failed", why: "nothing" });
  expect(guidedSteps(begun(), { kind: "interrupted", cause: "taken" })).toEqual({ step: "failed", why: "taken" });
  expect(after([start(), { kind: "unavailable", why: "refused" }])).toEqual({ step: "failed", why: "refused" });
});

test("the ways end where notes can no longer be heard surely", () => {
  const { state, asked } = walk(begun(), 0, 127);
  expect(Math.min(...asked)).toBe(37);
  expect(Math.max(...walk(guidedSteps(state, { kind: "up" }), 0, 127).asked)).toBe(87);
});

test("notes for a song stay among the held ones and in order, whatever is asked for", () => {
  const turned = walk(begun(), 50, 70).state;
  const done = walk(guidedSteps(turned, { kind: "up" }), 50, 70).state;
  const wild = after(
    [
      { kind: "found", change: { singHigh: 99 } },
      { kind: "found", change: { singLow: 80 } },
    ],
    done,
  );
  expect(wild).toMatchObject({ findings: { singLow: 70, singHigh: 70 } });
});

test("an event that makes no sense in a step changes nothing", () => {
  const listening = guidedSteps(begun(), { kind: "toneEnded" });
  for (const kind of ["opened", "toneEnded", "next", "up"] as const) {
    expect(guidedSteps(listening, { kind })).toBe(listening);
  }
  expect(guidedSteps(beforeGuided, { kind: "judged", outcome: held(57) })).toBe(beforeGuided);
  expect(guidedSteps(listening, { kind: "leave" })).toEqual(beforeGuided);
});

test("the tone can be heard again before singing, which is no try", () => {
  const listening = guidedSteps(begun(), { kind: "toneEnded" });
  expect(guidedSteps(listening, { kind: "again" })).toEqual(begun());
  const humming = after([start({ home: null }), { kind: "opened" }]);
  expect(guidedSteps(humming, { kind: "again" })).toBe(humming);
});

test("what was held comes back after a reload: on down, on up from the turn, finished, or straight to the result", () => {
  const one = after([start(), { kind: "opened" }, { kind: "toneEnded" }, { kind: "listened" }]);
  const down = after([{ kind: "judged", outcome: held(57) }, { kind: "next" }], one);
  const back = after([{ kind: "restored", kept: { step: "way", run: runOf(down), next: "low" } }]);
  expect(back).toMatchObject({ step: "paused", cause: "reloaded" });
  expect(runOf(after([{ kind: "resume" }, { kind: "opened" }], back))).toMatchObject({
    end: "low",
    target: 55,
    tries: 0,
  });
  expect(after([{ kind: "resume" }], back).step).toBe("opening");

  const turned = runOf(walk(begun(), 50, 70).state);
  const atTurn = after([{ kind: "restored", kept: { step: "way", run: turned, next: "high" } }]);
  expect(runOf(after([{ kind: "resume" }, { kind: "opened" }], atTurn))).toMatchObject({ end: "high", target: 59 });
  const finished = after([{ kind: "finish" }], atTurn);
  expect(finished).toMatchObject({ step: "done", findings: { lowMidi: 50, highMidi: 57 } });
  if (finished.step !== "done") throw new Error("not done");
  const { run, findings } = finished;
  expect(after([{ kind: "restored", kept: { step: "done", run, findings } }])).toEqual({
    ...finished,
    brokenOff: null,
  });
  // A way that has begun meanwhile is not overrun.
  expect(after([{ kind: "restored", kept: { step: "done", run, findings } }], begun())).toEqual(begun());
});

test("tries that did not hold are counted at their end, and the first note's are not", () => {
  const { misses } = runOf(walk(begun(), 50, 70).state);
  expect(misses).toEqual({ low: 2, high: 0 });
  expect(runOf(walk(begun(), 51, 70).state).misses).toEqual({ low: 3, high: 0 });
});

test("the found notes are named by the singer's own tuning", () => {
  const sharp = [57.4, 55.42, 53.38].reduce<GuidedState>(
    (state, midi) =>
      after(
        [{ kind: "toneEnded" }, { kind: "listened" }, { kind: "judged", outcome: held(midi) }, { kind: "next" }],
        state,
      ),
    begun(),
  );
  expect(after([{ kind: "finish" }], sharp)).toMatchObject({ step: "done", findings: { lowMidi: 53, highMidi: 57 } });
});
