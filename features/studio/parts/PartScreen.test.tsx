import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor } from "@testing-library/react";
import { Answers } from "@/__tests__/client/answers";
import { aPart } from "@/__tests__/client/studioPeople";
import { queryClient } from "@/features/api/queryClient";
import { ThemeProvider } from "@/features/ui/ThemeProvider";
import type { Comment, Part } from "@/shared/contract/studio/assignment";
import { PartScreen } from "./PartScreen";

jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
}));

const handInId = "00000000-0000-4000-8000-000000000801";
const remark: Comment = {
  ...{ id: "00000000-0000-4000-8000-000000000802", handInId, atS: 42.4, text: "Breathe here.", mine: false },
  author: { memberId: "00000000-0000-4000-8000-000000000901", name: "Rhona Teale", role: "owner" },
  createdAt: "2026-11-24T19:00:00.000Z",
};
let server: Answers;

beforeEach(() => {
  queryClient.clear();
  server = new Answers();
  server.install();
});

function open(change: Partial<Part>) {
  const part = aPart(change);
  server.to(`GET /parts/${part.id}/comments`, [remark]);
  render(
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <PartScreen
          part={part}
          now={new Date("2026-11-25T12:00:00.000Z")}
          takes={({ onTime }) => (
            <button type="button" onClick={() => onTime({ handInId, atS: 61 })}>
              Here
            </button>
          )}
        />
      </ThemeProvider>
    </QueryClientProvider>,
  );
  return part;
}

it("leads the pupil to their own copy of the song, in the key and the way that the teacher set", async () => {
  open({ side: "pupil" });
  expect(screen.getByTestId("part-key").textContent).toMatch(
    /D major.*a whole tone over the chart.*Box guitar: capo 2/,
  );
  expect(screen.getByRole("link", { name: "Sing it and hand it in" }).getAttribute("href")).toMatch(
    /^\/songs\/[\w-]+\/try\?key=D&shift=2$/,
  );
  expect((await screen.findByTestId("comment")).textContent).toMatch(/Rhona Teale.*at 0:42.*Breathe here/);
});

it("puts what is written at a time into the take, and lets the time go afterwards", async () => {
  const { id } = open({ state: "handed-in" });
  server.to(`POST /parts/${id}/comments`, remark, 201);
  fireEvent.click(await screen.findByRole("button", { name: "Here" }));
  expect(screen.getByTestId("comment-time").textContent).toBe("This will stand at 1:01 in the take.");
  fireEvent.change(screen.getByTestId("comment-text"), { target: { value: "Softer." } });
  fireEvent.click(screen.getByTestId("send-comment"));
  await waitFor(() => expect(screen.getByTestId("comment-time").textContent).toBe(""));
  expect(server.bodiesOf(`POST /parts/${id}/comments`)).toEqual([
    { id: expect.any(String), text: "Softer.", handInId, atS: 61 },
  ]);
});

it("answers what was handed in with words, and nothing that was not", async () => {
  const seenTakeAt = "2026-11-24T18:00:00.000Z";
  const { id } = open({ state: "handed-in", lastTake: { at: seenTakeAt, effort: 3 } });
  server.to(`PUT /parts/${id}`, aPart({ state: "returned" }));
  fireEvent.change(await screen.findByTestId("answer-message"), { target: { value: "Once more, lighter." } });
  fireEvent.click(screen.getByTestId("return"));
  await waitFor(() =>
    expect(server.bodiesOf(`PUT /parts/${id}`)).toEqual([
      { state: "returned", seenTakeAt, message: "Once more, lighter.", messageId: expect.any(String) },
    ]),
  );
});

it("has no answer to give before anything is handed in", async () => {
  open({ state: "assigned" });
  await screen.findByTestId("comments");
  expect(screen.queryByTestId("answer")).toBeNull();
});

it("sends words again under the id they had, and the next words under another", async () => {
  const { id } = open({});
  const path = `POST /parts/${id}/comments`;
  server.to(path, { code: "unavailable", message: "Try again." }, 503);
  const say = async (text: string, times: number) => {
    fireEvent.change(await screen.findByTestId("comment-text"), { target: { value: text } });
    fireEvent.click(screen.getByTestId("send-comment"));
    await waitFor(() => expect(server.bodiesOf(path)).toHaveLength(times));
    await waitFor(() => expect(screen.getByTestId("send-comment").getAttribute("aria-busy")).not.toBe("true"));
  };
  await say("Softer.", 1);
  server.to(path, remark, 201);
  await say("Softer.", 2);
  await waitFor(() => expect(screen.getByTestId<HTMLTextAreaElement>("comment-text").value).toBe(""));
  await say("Softer.", 3);
  const [first, again, more] = (server.bodiesOf(path) as { id: string }[]).map((body) => body.id);
  expect(again).toBe(first);
  expect(more).not.toBe(first);
});

it("keeps what was written when the answer does not arrive", async () => {
  const { id } = open({ state: "handed-in" });
  server.to(`PUT /parts/${id}`, { code: "not-agreed", message: "The pupil does not agree at present." }, 403);
  fireEvent.change(await screen.findByTestId("answer-message"), { target: { value: "Well done." } });
  fireEvent.click(screen.getByTestId("accept"));
  expect(await screen.findByText(/does not agree at present.*still here/)).toBeTruthy();
  expect(screen.getByTestId<HTMLTextAreaElement>("answer-message").value).toBe("Well done.");
});

it("asks for nothing of a pupil who does not share", () => {
  open({ shares: false });
  expect(screen.getByTestId("not-shared").textContent).toMatch(/Maren Oake does not share this/);
  expect(server.sent).toEqual([]);
});
