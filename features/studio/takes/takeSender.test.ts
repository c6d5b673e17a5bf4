import { ApiError } from "@/features/api/apiError";
import type { HandIn } from "@/shared/contract/studio/handIn";
import type { UnsentTake } from "./unsentTakes";

type Sender = typeof import("./takeSender").takeSender;

const mockDevice = new Map<string, UnsentTake>();
const mockUpload = jest.fn<Promise<HandIn>, [UnsentTake, (bytes: number) => void]>();
jest.mock("./unsentTakes", () => ({
  keepUnsent: async (take: UnsentTake) => void mockDevice.set(take.id, take),
  unsentOf: async (accountId: string) => [...mockDevice.values()].filter((take) => take.accountId === accountId),
  forgetUnsent: async (id: string) => void mockDevice.delete(id),
}));
jest.mock("./uploadTake", () => ({
  uploadTake: (take: UnsentTake, onSent: (bytes: number) => void) => mockUpload(take, onSent),
}));
const mockSession = { id: "maren" as string | null, listeners: new Set<() => void>() };
jest.mock("@/features/api/session", () => ({
  session: {
    current: () => ({ account: mockSession.id === null ? null : { id: mockSession.id } }),
    subscribe: (listener: () => void) => mockSession.listeners.add(listener),
  },
}));

/** Somebody else signs in, or nobody is signed in. */
function become(id: string | null): void {
  mockSession.id = id;
  for (const listener of [...mockSession.listeners]) listener();
}

const aTake = (id = "one"): UnsentTake => ({
  ...{ id, accountId: "maren", partId: "part", title: "Slack Water", at: "2026-12-01T19:20:00.000Z" },
  request: {
    id,
    takeId: "take",
    kind: "pupil-take",
    bytes: 1000,
    durationS: 10,
    effort: 2,
    measures: null,
    picture: null,
  },
  sound: new Blob(["x".repeat(1000)]),
});
const arrived = { state: "ready" } as HandIn;

let Problem = ApiError;

/** As after a reload: nothing is remembered but what lies on the device. */
function reload(): Sender {
  jest.resetModules();
  const { takeSender } = jest.requireActual<{ takeSender: Sender }>("./takeSender");
  // The class of the module registry that the sender uses now.
  Problem = jest.requireActual<{ ApiError: typeof ApiError }>("@/features/api/apiError").ApiError;
  return takeSender;
}

const settled = () => jest.advanceTimersByTimeAsync(0);

beforeEach(() => {
  jest.useFakeTimers();
  mockDevice.clear();
  become("maren");
  mockUpload.mockReset();
});
afterEach(() => jest.useRealTimers());

it("keeps a take on the device until the server has it, and says how far it is", async () => {
  const sender = reload();
  let done: (answer: HandIn) => void = () => undefined;
  mockUpload.mockImplementation((_take, onSent) => {
    onSent(400);
    return new Promise((resolve) => (done = resolve));
  });
  await sender.handIn(aTake());
  expect(mockDevice.has("one")).toBe(true);
  expect(sender.current()).toMatchObject([{ id: "one", state: "sending", sentBytes: 400, bytes: 1000 }]);
  done(arrived);
  await settled();
  expect(mockDevice.has("one")).toBe(false);
  expect(sender.current()).toMatchObject([{ state: "sent", sentBytes: 1000 }]);
});

it("waits while there is no connection, goes on by itself, and at once when the browser is online again", async () => {
  const sender = reload();
  mockUpload.mockImplementation(() => Promise.reject(new Problem(0, "offline", "Away.")));
  await sender.handIn(aTake());
  await settled();
  expect(sender.current()).toMatchObject([{ state: "waiting" }]);
  await jest.advanceTimersByTimeAsync(3000);
  expect(mockUpload).toHaveBeenCalledTimes(2);
  mockUpload.mockResolvedValue(arrived);
  window.dispatchEvent(new Event("online"));
  await settled();
  expect(sender.current()).toMatchObject([{ state: "sent" }]);
  expect(mockDevice.size).toBe(0);
});

it("goes on after a reload, only with one's own", async () => {
  const first = reload();
  mockUpload.mockImplementation(() => new Promise(() => undefined));
  await first.handIn(aTake());
  mockDevice.set("other", { ...aTake("other"), accountId: "ida" });
  const after = reload();
  mockUpload.mockReset().mockResolvedValue(arrived);
  await after.resume("maren");
  await settled();
  expect(mockUpload.mock.calls.map(([{ id }]) => id)).toEqual(["one"]);
  expect([...mockDevice.keys()]).toEqual(["other"]);
});

it("says why a take is refused, keeps it, and forgets it only when it is given up", async () => {
  const sender = reload();
  mockUpload.mockImplementation(() => Promise.reject(new Problem(403, "not-agreed", "You have not agreed.")));
  await sender.handIn(aTake());
  await settled();
  expect(sender.current()).toMatchObject([{ state: "refused", message: "You have not agreed." }]);
  expect(mockDevice.has("one")).toBe(true);
  await jest.advanceTimersByTimeAsync(120_000);
  expect(mockUpload).toHaveBeenCalledTimes(1);
  await sender.giveUp("one");
  expect([mockDevice.size, sender.current()]).toEqual([0, []]);
});

it("shows and sends nothing of one's own to whoever uses this device next, and goes on when one is back", async () => {
  const sender = reload();
  mockUpload.mockImplementation(() => Promise.reject(new Problem(0, "offline", "Away.")));
  await sender.handIn(aTake());
  await settled();
  become("ida");
  expect(sender.current()).toEqual([]);
  mockUpload.mockClear();
  mockUpload.mockResolvedValue(arrived);
  window.dispatchEvent(new Event("online"));
  sender.again("one");
  await jest.advanceTimersByTimeAsync(120_000);
  expect(mockUpload).not.toHaveBeenCalled();
  expect(mockDevice.has("one")).toBe(true);
  become("maren");
  await sender.resume("maren");
  await settled();
  expect(mockUpload).toHaveBeenCalledTimes(1);
  expect(mockDevice.size).toBe(0);
});

it("keeps on the device what the next account's session broke off", async () => {
  const sender = reload();
  let fail: (reason: Error) => void = () => undefined;
  mockUpload.mockImplementation(() => new Promise((_resolve, reject) => (fail = reject)));
  await sender.handIn(aTake());
  become("ida");
  fail(new Problem(403, "not-yours", "Not yours."));
  await jest.advanceTimersByTimeAsync(120_000);
  expect([sender.current(), mockUpload.mock.calls.length, mockDevice.has("one")]).toEqual([[], 1, true]);
});
