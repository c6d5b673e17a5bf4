import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act, cleanup, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { aTake, aVoice } from "@/__tests__/client/belongings";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { session } from "@/features/api/session";
import { shelf } from "@/features/api/shelf";
import { VoiceScreen } from "./VoiceScreen";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  usePathname: () => "/voice",
  Link: ({ href, children, testID }: { href: string; children: React.ReactNode; testID?: string }) => (
    <a href={href} data-testid={testID}>
      {children}
    </a>
  ),
}));

beforeEach(async () => {
  localStorage.clear();
  new FakeApi().install();
  await session.settled();
  kept.clear();
  refuseStorage(null);
});

function open() {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false }, mutations: { retry: false } } });
  render(
    <QueryClientProvider client={client}>
      <VoiceScreen />
    </QueryClientProvider>,
  );
}
const press = (id: string) => act(async () => fireEvent.click(screen.getByTestId(id)));
const title = () => screen.getByRole("heading", { level: 1 }).textContent;

const wide = {
  range: { lowMidi: 50, highMidi: 76 },
  comfort: { lowMidi: 52, highMidi: 72 },
  estimate: { lowMidi: 50, highMidi: 76 },
};
const narrow = {
  range: { lowMidi: 53, highMidi: 72 },
  comfort: { lowMidi: 55, highMidi: 69 },
  estimate: { lowMidi: 53, highMidi: 72 },
};

it("tells a first comer what this will be and the one next step", async () => {
  open();
  const empty = await screen.findByTestId("voice-empty");
  expect(within(empty).getByTestId("voice-sing").getAttribute("href")).toBe("/voice/sing");
  expect(within(empty).getByTestId("voice-upload").getAttribute("href")).toBe("/voice/upload");
});

it("shows the voice from its takes, and without an erased take after asking once more", async () => {
  const voice = aVoice({ name: "My voice" });
  await shelf.put("voices", voice);
  const base = { tuningCents: 0, effort: null };
  await shelf.put("takes", aTake(voice.id, { ...base, ...narrow, sungAt: "2026-11-01T10:00:00.000Z" }));
  await shelf.put("takes", aTake(voice.id, { ...base, ...wide, sungAt: "2026-11-02T10:00:00.000Z" }));
  open();
  expect((await screen.findByTestId("voice-range")).textContent).toBe("You can hold: D3 to E5.");
  const [newest] = screen.getAllByTestId("take-row");
  fireEvent.click(within(newest!).getByTestId("take-erase"));
  expect(await shelf.list("takes")).toHaveLength(2);
  await press("take-erase-confirm");
  await waitFor(() => expect(screen.getByTestId("voice-range").textContent).toBe("You can hold: F3 to C5."));
  expect(await shelf.list("takes")).toHaveLength(1);
});

it("goes back from notes set by hand to what was sung", async () => {
  const voice = aVoice({ byHand: { range: wide.range, comfort: wide.comfort } });
  await shelf.put("voices", voice);
  await shelf.put("takes", aTake(voice.id, { ...narrow, tuningCents: 0 }));
  open();
  expect((await screen.findByTestId("voice-range")).textContent).toBe("Your range: D3 to E5.");
  await press("voice-use-takes");
  await waitFor(() => expect(screen.getByTestId("voice-range").textContent).toBe("You can hold: F3 to C5."));
});

it("adds, renames and switches voices, and deletes one with its takes after asking once more", async () => {
  const first = aVoice({ name: "Chest voice", createdAt: "2026-11-01T10:00:00.000Z" });
  await shelf.put("voices", first);
  await shelf.put("takes", aTake(first.id, narrow));
  open();
  await screen.findByTestId("voice-range");
  await press("voice-new");
  fireEvent.change(screen.getByTestId("voice-name"), { target: { value: " " } });
  fireEvent.submit(screen.getByTestId("voice-name").closest("form")!);
  expect(await screen.findByText("Give the voice a name.")).toBeTruthy();
  fireEvent.change(screen.getByTestId("voice-name"), { target: { value: "With a cold" } });
  fireEvent.submit(screen.getByTestId("voice-name").closest("form")!);
  await waitFor(() => expect(title()).toBe("With a cold"));
  await press("voice-rename");
  fireEvent.change(screen.getByTestId("voice-name"), { target: { value: "Head voice" } });
  fireEvent.submit(screen.getByTestId("voice-name").closest("form")!);
  await waitFor(() => expect(title()).toBe("Head voice"));
  await act(async () => fireEvent.click(screen.getByRole("radio", { name: /Chest voice/ })));
  await waitFor(() => expect(title()).toBe("Chest voice"));
  await press("voice-delete");
  expect(await shelf.list("voices")).toHaveLength(2);
  await press("voice-delete-confirm");
  await waitFor(() => expect(title()).toBe("Head voice"));
  expect(await shelf.list("takes")).toEqual([]);
});

it("says kindly that a voice moves, and names no kind of voice", async () => {
  const voice = aVoice({ name: "My voice" });
  await shelf.put("voices", voice);
  const at = (sungAt: string, lowMidi: number, highMidi: number) => {
    const band = { lowMidi, highMidi };
    return aTake(voice.id, { sungAt, tuningCents: 0, range: band, comfort: band, estimate: band });
  };
  await shelf.put("takes", at("2026-09-01T10:00:00.000Z", 57, 77));
  await shelf.put("takes", at("2026-09-05T10:00:00.000Z", 57, 77));
  await shelf.put("takes", at("2026-10-20T10:00:00.000Z", 52, 71));
  open();
  await screen.findByTestId("voice-range");
  expect(screen.queryByTestId("voice-moving")).toBeNull();
  await act(async () => void (await shelf.put("takes", at("2026-10-24T10:00:00.000Z", 52, 71))));
  cleanup();
  open();
  const words = (await screen.findByTestId("voice-moving")).textContent;
  expect(words).toContain("In about 7 weeks your lowest note went down by 5 semitones.");
  expect(words).not.toMatch(/soprano|alto|tenor|bass|doctor|!/i);
});

it("takes a rating, and back again exactly what was", async () => {
  const voice = aVoice();
  await shelf.put("voices", voice);
  await shelf.put("takes", aTake(voice.id, { ...wide, tuningCents: 0, effort: null }));
  open();
  const comfort = () => screen.getByTestId("comfort-notes").textContent;
  await screen.findByTestId("voice-range");
  const before = comfort();
  await press("take-felt");
  await act(async () => fireEvent.click(screen.getByRole("radio", { name: "5" })));
  await waitFor(() => expect(comfort()).not.toBe(before));
  await act(async () => fireEvent.click(await screen.findByTestId("take-unrate")));
  await waitFor(() => expect(comfort()).toBe(before));
  expect((await shelf.list("takes"))[0]?.effort).toBeNull();
});
