import { strToU8 } from "fflate";
import { readSongFile } from "./readSongFile";

jest.mock("./lazyReaders", () => ({
  lazyReaders: {
    melodyFile: () => Promise.resolve(jest.requireActual<object>("@/shared/songs/melodyFile")),
  },
}));

/** A worker that answers when it is told to, and remembers whether it was ended. */
class FakeWorker {
  static last: FakeWorker;
  onmessage: ((event: { data: unknown }) => void) | null = null;
  onerror: (() => void) | null = null;
  posted: unknown = null;
  ended = false;
  constructor(readonly address: string) {
    FakeWorker.last = this;
  }
  postMessage(message: unknown) {
    this.posted = message;
  }
  terminate() {
    this.ended = true;
  }
}
const fileOf = (text: string, name = "a.abc") =>
  Object.assign(new File([text], name), {
    arrayBuffer: () => Promise.resolve(Uint8Array.from(strToU8(text)).buffer),
  });
const started = async () => {
  for (let turn = 0; turn < 20; turn += 1) await Promise.resolve();
  return FakeWorker.last;
};

describe("with a worker", () => {
  beforeEach(() => {
    Object.assign(globalThis, { Worker: FakeWorker });
  });
  afterEach(() => {
    jest.useRealTimers();
    Reflect.deleteProperty(globalThis, "Worker");
  });

  test("the worker's answer is handed on, and the worker ended", async () => {
    const reading = readSongFile(fileOf("X:1"));
    const worker = await started();
    expect(worker.posted).toMatchObject({ name: "a.abc" });
    worker.onmessage?.({ data: { ok: false, reason: "No." } });
    expect(await reading).toEqual({ ok: false, reason: "No." });
    expect(worker.ended).toBe(true);
  });

  test("a worker that takes too long is ended, with a sentence", async () => {
    jest.useFakeTimers();
    const reading = readSongFile(fileOf("X:1"), { patienceMs: 2000 });
    const worker = await started();
    jest.advanceTimersByTime(2000);
    expect(await reading).toEqual({ ok: false, reason: expect.stringMatching(/longer than 2 seconds/) as string });
    expect(worker.ended).toBe(true);
  });

  test("who stops waiting ends the worker", async () => {
    const turn = new AbortController();
    const reading = readSongFile(fileOf("X:1"), { signal: turn.signal });
    const worker = await started();
    turn.abort();
    await expect(reading).rejects.toBe(turn.signal.reason);
    expect(worker.ended).toBe(true);
  });

  test("a worker that cannot be fetched is told with what is safe", async () => {
    const reading = readSongFile(fileOf("X:1"));
    (await started()).onerror?.();
    expect(await reading).toMatchObject({
      ok: false,
      reason: expect.stringMatching(/What you typed is safe/) as string,
    });
  });
});

test("without workers the file is read on the spot", async () => {
  const read = await readSongFile(fileOf("X:1\nT:Low Tide\nM:3/4\nQ:1/4=90\nK:D\nDEF|\nw:down by sea\n"));
  expect(read).toMatchObject({ ok: true, title: "Low Tide", tempo: 90, beatsPerBar: 3, proposed: 0 });
});

test.each([
  ["", /empty/],
  ["x".repeat(5_000_001), /larger than 5 MB/],
])("a file of no use is refused before it is opened", async (text, reason) => {
  expect(await readSongFile(fileOf(text))).toEqual({ ok: false, reason: expect.stringMatching(reason) as string });
});
