import { QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { aPart } from "@/__tests__/client/studioPeople";
import { queryClient } from "@/features/api/queryClient";
import { ThemeProvider } from "@/features/ui/ThemeProvider";
import { RecordAnswer } from "./RecordAnswer";
import type { Recording } from "./recordSound";
import type { UnsentTake } from "./unsentTakes";

const mockRecord = jest.fn<Promise<Recording>, []>();
const mockRead = jest.fn<Promise<{ durationS: number; waveform: number[] }>, []>();
const mockHandIn = jest.fn<Promise<void>, [UnsentTake]>();
jest.mock("./recordSound", () => ({ recordSound: () => mockRecord(), readSound: () => mockRead() }));
jest.mock("./takeSender", () => ({ takeSender: { handIn: (take: UnsentTake) => mockHandIn(take) } }));
jest.mock("@/features/api/SessionProvider", () => ({ useSession: () => ({ account: { id: "rhona" } }) }));

const sound = new Blob(["my answer"]);
let recording: { stop: jest.Mock<Promise<Blob>>; drop: jest.Mock<void> };
beforeEach(() => {
  recording = { stop: jest.fn(async () => sound), drop: jest.fn() };
  mockRecord.mockReset().mockImplementation(async () => recording);
  mockRead.mockReset().mockResolvedValue({ durationS: 4, waveform: [1] });
  mockHandIn.mockReset().mockResolvedValue(undefined);
});

const open = () =>
  render(
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <RecordAnswer part={aPart()} />
      </ThemeProvider>
    </QueryClientProvider>,
  );

it("keeps an answer that could not be put by, and sends the same sound when it is tried again", async () => {
  mockHandIn.mockRejectedValueOnce(new Error("This device has no room."));
  open();
  fireEvent.click(screen.getByTestId("start-answer"));
  fireEvent.click(await screen.findByTestId("send-answer"));
  const again = await screen.findByTestId("send-answer-again");
  expect(screen.getByText("This device has no room.")).toBeTruthy();
  fireEvent.click(again);
  await waitFor(() => expect(screen.queryByTestId("send-answer-again")).toBeNull());
  expect(mockHandIn.mock.calls.map(([take]) => take.sound)).toEqual([sound, sound]);
  expect(recording.stop).toHaveBeenCalledTimes(1);
  expect(await screen.findByTestId("start-answer")).toBeTruthy();
});

it("lets the microphone go when one has left before it was allowed", async () => {
  let allow: (given: Recording) => void = () => undefined;
  mockRecord.mockImplementation(() => new Promise((resolve) => (allow = resolve)));
  const { unmount } = open();
  fireEvent.click(screen.getByTestId("start-answer"));
  await waitFor(() => expect(mockRecord).toHaveBeenCalled());
  unmount();
  await act(async () => allow(recording));
  expect(recording.drop).toHaveBeenCalled();
});
