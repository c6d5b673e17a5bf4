import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor } from "@testing-library/react";
import { Answers } from "@/__tests__/client/answers";
import { aPart } from "@/__tests__/client/studioPeople";
import { queryClient } from "@/features/api/queryClient";
import { ThemeProvider } from "@/features/ui/ThemeProvider";
import { HandInTake } from "./HandInTake";
import type { Sending } from "./takeSender";
import type { UnsentTake } from "./unsentTakes";

const mockHandIn = jest.fn<Promise<void>, [UnsentTake]>();
jest.mock("./takeSender", () => ({ takeSender: { handIn: (take: UnsentTake) => mockHandIn(take) } }));
let mockSendings: Partial<Sending>[] = [];
jest.mock("./useSendings", () => ({ useSendings: () => mockSendings }));
jest.mock("@/features/api/SessionProvider", () => ({ useSession: () => ({ account: { id: "maren" } }) }));
jest.mock("expo-router", () => ({ Link: ({ children }: { children: React.ReactNode }) => <a>{children}</a> }));

const part = aPart({ side: "pupil" });
const take = { id: "take", effort: 2, measures: null, trail: [], tune: [], tonic: part.tonic, shift: part.shift };
let server: Answers;

beforeEach(() => {
  queryClient.clear();
  mockSendings = [];
  mockHandIn.mockReset().mockResolvedValue(undefined);
  server = new Answers().to("GET /parts", [part]).to(`GET /parts/${part.id}`, part);
  server.install();
});

const open = () =>
  render(
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <HandInTake
          songId={part.songId ?? ""}
          take={take}
          sound={async () => ({ sound: new Blob(["x"]), durationS: 1, waveform: [1] })}
        />
      </ThemeProvider>
    </QueryClientProvider>,
  );

it("hands in under a new id each time, so that one taken back can be handed in again", async () => {
  open();
  const button = await screen.findByTestId("hand-in-now");
  fireEvent.click(button);
  await waitFor(() => expect(mockHandIn).toHaveBeenCalledTimes(1));
  fireEvent.click(await screen.findByTestId("hand-in-now"));
  await waitFor(() => expect(mockHandIn).toHaveBeenCalledTimes(2));
  const sent = mockHandIn.mock.calls.map(([given]) => given);
  expect(sent.map(({ request }) => request.takeId)).toEqual(["take", "take"]);
  expect(new Set([...sent.map(({ id }) => id), "take"]).size).toBe(3);
  expect(sent.map(({ request }) => request.id)).toEqual(sent.map(({ id }) => id));
});

it("leads to the thread as soon as the take has arrived", async () => {
  mockSendings = [{ id: "sent", takeId: take.id, state: "sent" }];
  open();
  expect((await screen.findByTestId("handed-in")).textContent).toContain("gets a mail");
  expect(screen.getByText("Open the thread")).toBeTruthy();
});

it("says after a reload that this take is handed in, and offers it again only once it is taken back", async () => {
  server.to(`GET /parts/${part.id}`, { ...part, takesHandedIn: ["another", "take"] });
  const { unmount } = open();
  expect((await screen.findByTestId("handed-in")).textContent).toContain("has this take");
  expect(screen.getByText("Open the thread")).toBeTruthy();
  expect(screen.queryByTestId("hand-in-now")).toBeNull();
  unmount();
  queryClient.clear();
  server.to(`GET /parts/${part.id}`, { ...part, takesHandedIn: ["another"] });
  open();
  expect(await screen.findByTestId("hand-in-now")).toBeTruthy();
  expect(screen.queryByTestId("handed-in")).toBeNull();
});

it("says that it could not be looked up whether the song was given, and looks again", async () => {
  server.to("GET /parts", { code: "not-found", message: "Gone." }, 404);
  open();
  expect(await screen.findByTestId("hand-in-unknown")).toBeTruthy();
  server.to("GET /parts", [part]);
  fireEvent.click(screen.getByText("Look again"));
  expect(await screen.findByTestId("hand-in-now")).toBeTruthy();
});
