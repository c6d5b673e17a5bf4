import { presets } from "@/shared/instruments/presets";
import type { WaysQuestion } from "@/shared/ways/wayCandidates";
import type { WayAnswer } from "./waySearch";

const question = (tonic: string): WaysQuestion => ({
  chords: ["C", "G"],
  from: { tonic: "C", mode: "major" },
  to: { tonic, mode: "major" },
  instrument: presets.find(({ id }) => id === "guitar")!,
});

/** A worker that answers when the test says so. */
class HeldWorker {
  static opened: HeldWorker[] = [];
  asked: string[] = [];
  ended = false;
  onmessage: ((event: { data: WayAnswer }) => void) | null = null;
  onerror: (() => void) | null = null;
  constructor(readonly address: string) {
    HeldWorker.opened.push(this);
  }
  postMessage({ to }: WaysQuestion) {
    this.asked.push(to.tonic);
  }
  terminate() {
    this.ended = true;
  }
}

/** The search as a page begins with it. */
function aSearch() {
  let search: typeof import("./waySearch");
  jest.isolateModules(() => {
    search = jest.requireActual<typeof import("./waySearch")>("./waySearch");
  });
  return search!;
}

describe("beside the page", () => {
  beforeEach(() => {
    HeldWorker.opened = [];
    Object.assign(globalThis, { Worker: HeldWorker });
  });
  afterEach(() => {
    Reflect.deleteProperty(globalThis, "Worker");
  });

  test("one question after the other goes to one worker, and each has its own answer", async () => {
    const { searchWays } = aSearch();
    const [first, second] = [searchWays(question("D")), searchWays(question("E"))];
    const [worker] = HeldWorker.opened;
    expect(worker!.asked).toEqual(["D"]);
    worker!.onmessage!({ data: { ways: [] } });
    expect(worker!.asked).toEqual(["D", "E"]);
    worker!.onmessage!({ data: { fault: "E is no key here." } });
    await expect(first).resolves.toEqual([]);
    await expect(second).rejects.toThrow("E is no key here.");
    expect(HeldWorker.opened).toHaveLength(1);
  });

  test("what is no longer wanted when its turn comes is not searched", async () => {
    const { searchWays } = aSearch();
    const gone = new AbortController();
    void searchWays(question("D"));
    const unwanted = searchWays(question("E"), gone.signal);
    const wanted = searchWays(question("F"));
    gone.abort(new Error("The page was left."));
    const [worker] = HeldWorker.opened;
    worker!.onmessage!({ data: { ways: [] } });
    expect(worker!.asked).toEqual(["D", "F"]);
    await expect(unwanted).rejects.toThrow("The page was left.");
    worker!.onmessage!({ data: { ways: [] } });
    await expect(wanted).resolves.toEqual([]);
  });

  test("a search that does not open says so to all who wait, and is opened anew for the next", async () => {
    const { searchWays, openWaySearch } = aSearch();
    const opening = openWaySearch();
    const asked = [searchWays(question("D")), searchWays(question("E"))];
    HeldWorker.opened[0]!.onerror!();
    await expect(opening).rejects.toThrow(/Check your connection/);
    for (const each of asked) await expect(each).rejects.toThrow(/Check your connection/);
    expect(HeldWorker.opened[0]!.ended).toBe(true);
    const again = searchWays(question("D"));
    HeldWorker.opened[1]!.onmessage!({ data: { ways: [] } });
    await expect(again).resolves.toEqual([]);
  });

  test("it is open when the worker listens", async () => {
    const { openWaySearch } = aSearch();
    const opening = openWaySearch();
    HeldWorker.opened[0]!.onmessage!({ data: { ready: true } });
    await expect(opening).resolves.toBeUndefined();
    expect(HeldWorker.opened[0]!.address).toBe("/worklets/wayWorker.js");
  });
});

test("where there are no workers it says that it could not be opened", async () => {
  await expect(aSearch().searchWays(question("D"))).rejects.toThrow(/could not be opened/);
});
