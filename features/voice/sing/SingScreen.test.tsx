import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { session } from "@/features/api/session";
import { shelf } from "@/features/api/shelf";
import { midiToHz } from "@/shared/music/pitch";
import type { TakeReport } from "@/shared/voice/takeReport";
import { MicrophoneUnavailable, openMicrophone } from "../recorder/microphone";
import type { Interruption, Processing, Unavailable } from "../recorder/recorder";
import type { FromTakeWorker, TakePart, ToTakeWorker } from "../recorder/takeProtocol";
import { SingScreen } from "./SingScreen";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  usePathname: () => "/voice/sing",
  Link: ({ href, children, testID }: { href: string; children: React.ReactNode; testID?: string }) => (
    <a href={href} data-testid={testID}>
      {children}
    </a>
  ),
}));
jest.mock("../recorder/worker/openTakeWorker", () => ({ openTakeWorker: () => mockWorker }));
jest.mock("../recorder/microphone", () => ({
  ...jest.requireActual<object>("../recorder/microphone"),
  openMicrophone: jest.fn(),
}));
jest.mock("../recorder/unkeptTake", () => ({
  takeOfThisTab: () => mockUnkept.mark,
  markTakeOfThisTab: (id: string | null) => {
    mockUnkept.mark = id;
  },
  beginUnkept: async () => undefined,
  saveUnkept: async (take: object) => {
    mockUnkept.take = take;
  },
  readUnkept: async () => mockUnkept.take && { result: mockUnkept.take },
  dropUnkept: async () => {
    mockUnkept.take = null;
  },
  dropStale: async () => undefined,
}));

const mockUnkept: { mark: string | null; take: object | null } = { mark: null, take: null };
const mockWorker = {
  onmessage: null as ((event: { data: FromTakeWorker }) => void) | null,
  told: [] as ToTakeWorker["kind"][],
  postMessage(message: ToTakeWorker) {
    this.told.push(message.kind);
  },
  terminate: () => undefined,
};
const answer = (data: FromTakeWorker) => act(async () => mockWorker.onmessage?.({ data }));

const band = (lowMidi: number, highMidi: number) => ({ lowMidi, highMidi });
const report: TakeReport = {
  verdict: "heard",
  sentence: "You sang from F3 to C5.",
  nextStep: "Try it in a song.",
  advice: "go-on",
  durationS: 9,
  f0: [],
  notes: [
    { start: 0, end: 1, midi: 64, steadinessCents: 10, vibrato: null, levelDb: -20, sustained: true, clear: true },
  ],
  range: band(53, 72),
  comfort: band(55, 69),
  estimate: band(51, 74),
  tessitura: null,
  tuningCents: 0,
  certainty: 0.7,
  reasons: ["Heard clearly in 1 of 1 note."],
};
const judged = (change: Partial<TakeReport> = {}, part: TakePart | null = null) =>
  answer({
    kind: "judged",
    report: { ...report, ...change },
    pcm: new Float32Array(9 * 48_000),
    sampleRate: 48_000,
    part,
  });

let interrupt: (cause: Interruption) => void = () => undefined;
let beat: (left: number) => void = () => undefined;
let comeIn: () => void = () => undefined;
const mockMicrophone: { processed: Processing[] } = { processed: [] };
beforeEach(async () => {
  localStorage.clear();
  new FakeApi().install();
  await session.settled();
  kept.clear();
  refuseStorage(null);
  Object.assign(mockUnkept, { mark: null, take: null });
  mockWorker.told = [];
  mockMicrophone.processed = [];
  const port = { close: () => undefined };
  Object.assign(globalThis, { MessageChannel: jest.fn(() => ({ port1: port, port2: port })) });
  Object.assign(window, { scrollTo: () => undefined });
  jest.mocked(openMicrophone).mockImplementation(async (onInterrupted) => {
    interrupt = onInterrupted;
    return {
      sampleRate: 48_000,
      processed: mockMicrophone.processed,
      countIn: (onBeat) => {
        beat = onBeat;
        return new Promise<void>((resolve) => {
          comeIn = resolve;
        });
      },
      listen: () => undefined,
      finish: async () => true,
      close: () => undefined,
    };
  });
});

const press = (id: string) => act(async () => fireEvent.click(screen.getByTestId(id)));
async function keep() {
  await waitFor(() => expect((screen.getByTestId("sing-keep") as HTMLButtonElement).disabled).toBe(false));
  await press("sing-keep");
}
async function open() {
  const onKept = jest.fn();
  const client = new QueryClient({ defaultOptions: { queries: { retry: false }, mutations: { retry: false } } });
  const view = render(
    <QueryClientProvider client={client}>
      <SingScreen onKept={onKept} />
    </QueryClientProvider>,
  );
  await act(async () => undefined);
  return { onKept, view };
}
async function sing() {
  await press("sing-start");
  const frames = Array.from({ length: 50 }, (_, k) => ({ t: k / 100, hz: midiToHz(64), clarity: 0.9, levelDb: -20 }));
  await answer({ kind: "heard", frames, ahead: [], seconds: 4.4, levelDb: -20, peak: 0.2 });
}

it("leads from the caution through listening to the result, and keeps it as My voice", async () => {
  const { onKept } = await open();
  expect(screen.getByText("Stop if it hurts, tickles or turns hoarse.")).toBeTruthy();
  await sing();
  expect(screen.getByTestId("take-seconds").textContent).toBe("4 s");
  await press("sing-stop");
  await judged();
  expect(mockWorker.told).toEqual(["warmUp", "begin", "judge"]);
  expect(screen.getByTestId("comfort-notes").textContent).toContain("G3 to A4");
  await keep();
  await waitFor(() => expect(onKept).toHaveBeenCalledWith("voice"));
  const [voice] = await shelf.list("voices");
  expect(voice).toMatchObject({ name: "My voice", byHand: null });
  expect(await shelf.list("takes")).toMatchObject([{ voiceId: voice?.id, range: report.range }]);
  expect(mockUnkept).toEqual({ mark: null, take: null });
});

it.each([
  ["refused", "The microphone is not allowed here"],
  ["no-microphone", "No microphone found"],
  ["insecure", "This address is not secure"],
  ["busy", "The microphone is in use"],
  ["unsupported", "This browser cannot listen"],
] as [Unavailable, string][])("says what to do when there is no microphone: %s", async (why, title) => {
  jest.mocked(openMicrophone).mockRejectedValue(new MicrophoneUnavailable(why));
  await open();
  await press("sing-start");
  expect(screen.getByRole("heading", { level: 1 }).textContent).toBe(title);
  expect(screen.getByTestId("sing-again")).toBeTruthy();
  expect(screen.getByTestId("sing-by-hand").getAttribute("href")).toBe("/voice/by-hand");
});

it.each([
  ["too-short", "Too short to tell"],
  ["too-quiet", "Too quiet to hear"],
  ["too-noisy", "Too noisy around you"],
  ["clipped", "Too loud for the microphone"],
  ["not-singing", "No singing heard"],
  ["several-voices", "More than one voice"],
] as const)("gives the engine's reason when nothing could be read: %s", async (verdict, title) => {
  await open();
  await sing();
  await press("sing-stop");
  await judged({
    verdict,
    sentence: "Why it was not.",
    nextStep: "What to do.",
    range: null,
    comfort: null,
    estimate: null,
  });
  expect(screen.getByRole("heading", { level: 1 }).textContent).toBe(title);
  expect(screen.getByText("Why it was not.")).toBeTruthy();
  expect(screen.getByText("What to do.")).toBeTruthy();
});

it("keeps what was sung before a call took the microphone", async () => {
  await open();
  await sing();
  await act(async () => interrupt("taken"));
  await judged();
  expect(screen.getByTestId("take-broken-off").textContent).toContain("A call or another program took the microphone");
  expect(screen.getByTestId("comfort-notes")).toBeTruthy();
});

it("counts in where that is wanted, and gives the take up on Not yet", async () => {
  await open();
  expect(screen.getByTestId("count-in").getAttribute("aria-checked")).toBe("false");
  await press("count-in");
  await press("sing-start");
  await act(async () => beat(4));
  expect(screen.getByTestId("count-left").textContent).toBe("4");
  await press("count-cancel");
  expect(mockWorker.told).not.toContain("begin");
  expect(screen.getByTestId("count-in").getAttribute("aria-checked")).toBe("true");
  await press("sing-start");
  await act(async () => beat(1));
  await act(async () => comeIn());
  expect(screen.getByTestId("sing-stop")).toBeTruthy();
  expect(mockWorker.told).toContain("begin");
});

it("says what the browser did to the sound although it was asked not to", async () => {
  mockMicrophone.processed = ["echo cancellation", "noise suppression"];
  await open();
  await sing();
  await press("sing-stop");
  await judged();
  expect(screen.getByTestId("take-processed").textContent).toContain("echo cancellation and noise suppression");
});

it("leaves out a part by the keys, shows its notes, and goes back to the whole", async () => {
  await open();
  await sing();
  await press("sing-stop");
  await judged();
  const start = screen.getByTestId("trim-start");
  expect(start.getAttribute("aria-valuetext")).toBe("0.0 seconds");
  // In one go: the part is read as soon as the keys pause.
  for (let k = 0; k < 3; k += 1) fireEvent.keyDown(start, { key: "PageUp" });
  expect(start.getAttribute("aria-valuetext")).toBe("3.0 seconds");
  await waitFor(() => expect(mockWorker.told.at(-1)).toBe("judgeKept"));
  expect(start.getAttribute("aria-valuetext")).toBe("3.0 seconds");
  await judged({ range: band(57, 72), comfort: band(59, 69) }, { startS: 3, endS: 9 });
  expect(screen.getByTestId("comfort-notes").textContent).toContain("B3 to A4");
  expect(screen.getByTestId("take-part").textContent).toContain("From 3.0 to 9.0 s of 9.0 s");
  await press("take-whole");
  expect(screen.getByTestId("comfort-notes").textContent).toContain("G3 to A4");
});

it("keeps the take as it was where too little is left between the handles", async () => {
  await open();
  await sing();
  await press("sing-stop");
  await judged();
  await act(async () => fireEvent.keyDown(screen.getByTestId("trim-end"), { key: "Home" }));
  await waitFor(() => expect(mockWorker.told.at(-1)).toBe("judgeKept"));
  await judged({ verdict: "too-short", sentence: "That was too short.", range: null }, { startS: 0, endS: 2 });
  expect(screen.getByTestId("take-part-refused").textContent).toContain("That was too short. The take is as it was.");
  expect(screen.getByTestId("comfort-notes").textContent).toContain("G3 to A4");
});

it("shows the result again after a reload", async () => {
  const first = await open();
  await sing();
  await press("sing-stop");
  await judged();
  first.view.unmount();
  await open();
  expect(screen.getByTestId("comfort-notes").textContent).toContain("G3 to A4");
});

it("keeps the take on the page when the shelf refuses it, and does not keep it twice", async () => {
  const { onKept } = await open();
  await sing();
  await press("sing-stop");
  await judged();
  refuseStorage(new DOMException("full", "QuotaExceededError"));
  await keep();
  expect(await screen.findByText("Not kept yet")).toBeTruthy();
  refuseStorage(null);
  await keep();
  await waitFor(() => expect(onKept).toHaveBeenCalledTimes(1));
  expect(await shelf.list("voices")).toHaveLength(1);
  expect(await shelf.list("takes")).toHaveLength(1);
});

it("asks into which voice a take goes where there are some, and takes notes set by hand out of force", async () => {
  const byHand = { range: band(50, 70), comfort: band(52, 67) };
  const id = "8d2c5b1e-6f0d-4c8e-9a51-3f2f7a1f7c11";
  await shelf.put("voices", { id, name: "Head voice", byHand, createdAt: "2026-11-01T10:00:00.000Z" });
  const { onKept } = await open();
  await sing();
  await press("sing-stop");
  await judged();
  await keep();
  const panel = await screen.findByTestId("keep-panel");
  fireEvent.submit(panel.querySelector("form") ?? panel);
  await waitFor(() => expect(onKept).toHaveBeenCalledWith("voice"));
  expect(await shelf.list("voices")).toMatchObject([{ id, byHand: null }]);
  expect(await shelf.list("takes")).toMatchObject([{ voiceId: id }]);
});
