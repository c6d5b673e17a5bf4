import { act, renderHook } from "@testing-library/react";
import type { TakeReport } from "@/shared/voice/takeReport";
import type { RecorderEvent } from "./recorder";
import { useRecorder } from "./useRecorder";

jest.mock("./capture", () => ({
  createCapture: (emit: (event: RecorderEvent) => void) => {
    mockCapture.emit = emit;
    const nothing = () => undefined;
    return { warmUp: nothing, start: nothing, stop: nothing, read: nothing, drop: nothing, close: nothing };
  },
}));
jest.mock("./unkeptTake", () => ({
  takeOfThisTab: () => mockUnkept.mark,
  markTakeOfThisTab: (id: string | null) => {
    mockUnkept.mark = id;
  },
  saveUnkept: async (take: { id: string }) => void mockUnkept.takes.set(take.id, take),
  readUnkept: async (id: string) => {
    const result = mockUnkept.takes.get(id);
    return result ? { result } : null;
  },
  dropUnkept: async (id: string) => void mockUnkept.takes.delete(id),
  dropStale: async () => undefined,
}));

const mockCapture: { emit: (event: RecorderEvent) => void } = { emit: () => undefined };
const mockUnkept = { mark: null as string | null, takes: new Map<string, object>() };

beforeEach(() => {
  sessionStorage.clear();
  mockUnkept.mark = null;
  mockUnkept.takes.clear();
});

async function open() {
  const view = renderHook(() => useRecorder());
  await act(async () => undefined);
  const tell = (event: RecorderEvent) => act(async () => mockCapture.emit(event));
  const shownTake = () => {
    const { state } = view.result.current;
    return state.step === "result" ? state.take.id : state.step;
  };
  const opened = async (id: string) => {
    mockUnkept.mark = id;
    await tell({ kind: "opened", id, sungAt: "2026-11-01T10:00:00.000Z", processed: [] });
  };
  const sung = async (verdict: TakeReport["verdict"] = "heard") => {
    await tell({ kind: "stop" });
    await tell({ kind: "flushed" });
    const report = { verdict, sentence: "", nextStep: "" } as TakeReport;
    await tell({ kind: "judged", report, pcm: new Float32Array(8), sampleRate: 48_000, part: null });
  };
  const sing = () => act(async () => view.result.current.sing());
  return { ...view, now: () => view.result.current, tell, shownTake, opened, sung, sing };
}

async function withOneHeard() {
  const page = await open();
  await page.sing();
  await page.opened("first");
  await page.sung();
  return page;
}

it("keeps the take before until another one is heard: a failed try leads back to it, also after a reload", async () => {
  const page = await withOneHeard();
  await page.sing();
  await page.opened("second");
  await page.sung("too-short");
  expect(page.shownTake()).toBe("failure");
  expect(page.now().earlier?.id).toBe("first");
  page.unmount();
  const again = await open();
  expect(again.shownTake()).toBe("first");
});

it("leads back to the take before by its button, where the microphone is refused the second time", async () => {
  const page = await withOneHeard();
  await page.sing();
  await page.tell({ kind: "unavailable", why: "refused" });
  expect(mockUnkept.takes.has("first")).toBe(true);
  await act(async () => page.now().goBack());
  expect(page.shownTake()).toBe("first");
});

it("shows the take before again when the count-in of the next one is given up", async () => {
  const page = await withOneHeard();
  await page.sing();
  await page.tell({ kind: "beat", left: 4 });
  await act(async () => page.now().stop());
  expect(page.shownTake()).toBe("first");
});

it("erases the take before once another one is heard", async () => {
  const page = await withOneHeard();
  await page.sing();
  await page.opened("second");
  await page.sung();
  expect(page.shownTake()).toBe("second");
  expect([...mockUnkept.takes.keys()]).toEqual(["second"]);
});

it("erases both when they are left", async () => {
  const page = await withOneHeard();
  await act(async () => page.now().startOver());
  expect(page.shownTake()).toBe("idle");
  expect(page.now().earlier?.id).toBe("first");
  await act(async () => page.now().leave());
  expect(mockUnkept).toMatchObject({ mark: null, takes: new Map() });
});

it("says after a reload which recording was not read to its end", async () => {
  const page = await open();
  await act(async () => page.now().read(new File(["x"], "rehearsal.mp3")));
  page.unmount();
  const again = await open();
  expect(again.now().unread).toBe("rehearsal.mp3");
  await act(async () => again.now().read(new File(["x"], "rehearsal.mp3")));
  expect(again.now().unread).toBeNull();
});

it("says nothing of a recording that was read, or that was refused and said so", async () => {
  const page = await open();
  await act(async () => page.now().read(new File(["x"], "words.wav")));
  await page.tell({ kind: "unusable", why: "not-a-sound", file: null });
  page.unmount();
  const again = await open();
  expect(again.now().unread).toBeNull();
  await act(async () => again.now().read(new File(["x"], "song.wav")));
  await again.tell({ kind: "decoded", id: "song", sungAt: "2026-11-01T10:00:00.000Z", seconds: 5 });
  mockUnkept.mark = "song";
  const report = { verdict: "heard", sentence: "", nextStep: "" } as TakeReport;
  await again.tell({ kind: "judged", report, pcm: new Float32Array(8), sampleRate: 48_000, part: null });
  again.unmount();
  const third = await open();
  expect(third.now().unread).toBeNull();
  expect(third.shownTake()).toBe("song");
});
