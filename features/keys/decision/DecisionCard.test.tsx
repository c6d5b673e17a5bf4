import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { aDecision, aSong, aVoice } from "@/__tests__/client/belongings";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import { useSongKeys } from "../useSongKeys";
import { presentChoice } from "@/shared/contract/decisionHistory";
import { DecisionCard } from "./DecisionCard";
import { readGone } from "./goneDecisions";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

const song = aSong({ tune: { kind: "span", lowMidi: 57, highMidi: 71, home: "D" } });
const [maren, ilse] = [aVoice({ name: "Maren" }), aVoice({ name: "Ilse" })];
const singing = { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };

beforeEach(async () => {
  kept.clear();
  localStorage.clear();
  refuseStorage(null);
  queryClient.clear();
  await shelf.put("songs", song);
  await shelf.put("voices", maren);
  await shelf.put("voices", ilse);
});

function Page({
  voice,
  instruments,
}: {
  voice: typeof maren | null;
  instruments: { id: string; name: string }[] | undefined;
}) {
  const keys = useSongKeys(song, { voice, voices: [maren, ilse], forKeys: singing }, instruments);
  const take = (tonic: string, shift: number) => () =>
    keys.take({ tonic, shift, instrument: "box-gdg", way: { retune: 0, capo: 3, shapeKey: "G" } });
  return (
    <>
      <button onClick={take("C", -2)}>take C</button>
      <button onClick={take("Bb", -4)}>take B flat</button>
      {keys.error && <p role="alert">{keys.error.message}</p>}
      <DecisionCard keys={keys} />
    </>
  );
}

function open(voice: typeof maren | null = maren, instruments?: { id: string; name: string }[]) {
  const view = (of: typeof maren | null) => (
    <QueryClientProvider client={queryClient}>
      <Page voice={of} instruments={instruments} />
    </QueryClientProvider>
  );
  const page = render(view(voice));
  return { sing: (of: typeof maren | null) => page.rerender(view(of)), leave: page.unmount };
}

const press = (id: string) => fireEvent.click(screen.getByTestId(id));
const card = () => screen.getByTestId("decided").textContent ?? "";
const past = () => screen.queryAllByTestId("past-choice").map((each) => each.textContent ?? "");
const takeBoth = async () => {
  fireEvent.click(screen.getByText("take C"));
  await waitFor(() => expect(card()).toMatch(/^C/));
  fireEvent.click(screen.getByText("take B flat"));
  await waitFor(() => expect(card()).toMatch(/^B♭/));
};

test("nothing is shown while nothing is decided", async () => {
  open();
  await waitFor(() => expect(queryClient.isFetching()).toBe(0));
  expect(screen.queryByTestId("decided")).toBeNull();
  expect(screen.queryByTestId("key-removed")).toBeNull();
});

test("the key, for whom, since when, why and how it is played", async () => {
  const way = { retune: 0, capo: 3, shapeKey: "A" };
  const decision = aDecision(song.id, maren.id, { instrument: "box-gdg", way, reason: "All of it is comfortable." });
  await shelf.put("decisions", decision);
  open();
  await waitFor(() =>
    expect(card()).toContain(
      "CYour key for Marensince 5 March 2026All of it is comfortable.Played with Box guitar, G-D-G: capo 3, chords in A",
    ),
  );
});

test("the history opens and closes: what was decided before, and for other voices", async () => {
  await shelf.put("decisions", aDecision(song.id, ilse.id, { tonic: "F", reason: "Ilse sings higher." }));
  await shelf.put("decisions", aDecision(song.id, null, { tonic: "G", reason: "For the whole class." }));
  open();
  await takeBoth();
  expect(screen.getByTestId("key-history").getAttribute("aria-expanded")).toBe("false");
  press("key-history");
  expect(screen.getByTestId("key-history").getAttribute("aria-expanded")).toBe("true");
  expect(within(screen.getByRole("list", { name: "Before that" })).getAllByRole("listitem")).toHaveLength(1);
  expect(past()).toEqual([
    expect.stringMatching(/^C.* · Box guitar, G-D-G: capo 3, chords in G.*Judged by the span alone\.Use again$/),
    expect.stringMatching(/^FIlse · 5 March 2026Ilse sings higher\.$/),
    expect.stringMatching(/^GWhoever sings · 5 March 2026For the whole class\.$/),
  ]);
  press("key-history");
  expect(screen.queryByTestId("key-history-list")).toBeNull();
});

test("a first decision has nothing before it, and says so", async () => {
  await shelf.put("decisions", aDecision(song.id, maren.id));
  open();
  await screen.findByTestId("decided");
  press("key-history");
  expect(screen.getByTestId("key-history-list").textContent).toBe("Nothing was decided before.");
});

test("undo brings the choice before; that can be brought back, with its history", async () => {
  open();
  await takeBoth();
  const both = await shelf.list("decisions");
  press("undo-key");
  await waitFor(() => expect(card()).toMatch(/^C/));
  expect(screen.getByTestId("key-removed").textContent).toContain("B♭ is not your key any more.");
  press("bring-back");
  await waitFor(() => expect(card()).toMatch(/^B♭/));
  expect(screen.queryByTestId("key-removed")).toBeNull();
  expect(await shelf.list("decisions")).toEqual(both);
});

test("undo of the only choice leaves none, and it can be brought back", async () => {
  await shelf.put("decisions", aDecision(song.id, maren.id));
  open();
  await screen.findByTestId("decided");
  press("undo-key");
  await screen.findByTestId("bring-back");
  expect(await shelf.list("decisions")).toEqual([]);
  expect(screen.queryByTestId("decided")).toBeNull();
  await waitFor(() => expect(document.activeElement).toBe(screen.getByTestId("bring-back")));
  press("bring-back");
  await waitFor(() => expect(card()).toMatch(/^C/));
  await waitFor(() => expect(document.activeElement).toBe(screen.getByTestId("key-history")));
});

test("removing takes the history along, and brings all of it back", async () => {
  open();
  await takeBoth();
  const both = await shelf.list("decisions");
  press("key-history");
  press("remove-key");
  await screen.findByTestId("bring-back");
  expect(await shelf.list("decisions")).toEqual([]);
  press("bring-back");
  await waitFor(() => expect(card()).toMatch(/^B♭/));
  expect(await shelf.list("decisions")).toEqual(both);
});

test("removing one's own key where one holds for all shows that one, and still offers one's own", async () => {
  await shelf.put("decisions", aDecision(song.id, null, { tonic: "G", shift: 5 }));
  await shelf.put("decisions", aDecision(song.id, maren.id));
  open();
  await waitFor(() => expect(card()).toMatch(/^C/));
  press("undo-key");
  await waitFor(() => expect(card()).toMatch(/^GYour key, whoever sings/));
  press("bring-back");
  await waitFor(() => expect(card()).toMatch(/^CYour key for Maren/));
  expect(await shelf.list("decisions")).toHaveLength(2);
});

test("what was let go is not offered once another key is decided, nor to another voice", async () => {
  await shelf.put("decisions", aDecision(song.id, maren.id));
  const page = open();
  await screen.findByTestId("decided");
  press("undo-key");
  await screen.findByTestId("bring-back");
  page.sing(ilse);
  expect(screen.queryByTestId("bring-back")).toBeNull();
  page.sing(maren);
  expect(screen.getByTestId("bring-back")).toBeTruthy();
  fireEvent.click(screen.getByText("take B flat"));
  await waitFor(() => expect(card()).toMatch(/^B♭/));
  expect(screen.queryByTestId("bring-back")).toBeNull();
});

test("another voice's key is told as such and cannot be undone from here", async () => {
  await shelf.put("decisions", aDecision(song.id, maren.id));
  open(ilse);
  await waitFor(() => expect(card()).toMatch(/^CDecided for Maren.*It was not judged for the voice/));
  press("key-history");
  expect(screen.queryByTestId("undo-key")).toBeNull();
  expect(screen.queryByTestId("remove-key")).toBeNull();
});

test("a removal that fails is told and the key stays", async () => {
  await shelf.put("decisions", aDecision(song.id, maren.id));
  open();
  await screen.findByTestId("decided");
  refuseStorage(new DOMException("full", "QuotaExceededError"));
  press("undo-key");
  expect((await screen.findByRole("alert")).textContent).toMatch(/no room left/);
  expect(card()).toMatch(/^C/);
  expect(screen.queryByTestId("bring-back")).toBeNull();
});

test("what was taken back is offered after a reload too, for a month", async () => {
  await shelf.put("decisions", aDecision(song.id, maren.id));
  const { leave } = open();
  await screen.findByTestId("decided");
  press("undo-key");
  await screen.findByTestId("bring-back");
  leave();
  open();
  await screen.findByText("C is not your key any more.");
  press("bring-back");
  await waitFor(() => expect(card()).toMatch(/^C/));
  expect(await shelf.list("decisions")).toHaveLength(1);
  leave();
  const all = readGone(
    JSON.stringify([{ account: null, goneAt: "2026-03-05T12:00:00Z", decision: aDecision(song.id, null) }]),
    Date.parse("2026-04-05T12:00:00Z"),
  );
  expect(all).toEqual([]);
});

test("the history offers every choice again: an earlier one, and one that was taken back", async () => {
  open();
  await takeBoth();
  press("undo-key");
  await waitFor(() => expect(card()).toMatch(/^C/));
  fireEvent.click(screen.getByText("take C"));
  await waitFor(() => expect(screen.queryByTestId("bring-back")).toBeNull());
  press("key-history");
  const takenBack = screen.getByRole("list", { name: "Taken back" });
  expect(takenBack.textContent).toMatch(/^B♭/);
  fireEvent.click(within(takenBack).getByRole("button", { name: /^Use again: B♭ of / }));
  await waitFor(() => expect(card()).toMatch(/^B♭/));
  expect(screen.queryByRole("list", { name: "Taken back" })).not.toBeNull();
  fireEvent.click(within(screen.getByRole("list", { name: "Before that" })).getAllByRole("button")[0]!);
  await waitFor(() => expect(card()).toMatch(/^C/));
  const [one] = await shelf.list("decisions");
  expect(one).toMatchObject({ tonic: "C", voiceId: maren.id });
  expect(one!.earlier.map(({ tonic }) => tonic)).toEqual(["Bb", "C", "C"]);
});

test("an instrument of one's own is named; what is gone is not, and what no longer fits the chart is not offered", async () => {
  const way = { retune: 0, capo: 3, shapeKey: "A" };
  const earlier = [presentChoice(aDecision(song.id, maren.id, { tonic: "F", shift: 0, instrument: "sold", way }))];
  await shelf.put("decisions", aDecision(song.id, maren.id, { instrument: "mine", way, earlier }));
  open(maren, [{ id: "mine", name: "Box of the slipway" }]);
  await waitFor(() => expect(card()).toContain("Played with Box of the slipway: capo 3, chords in A"));
  press("key-history");
  expect(past()).toEqual([expect.stringMatching(/^F5 March 2026 · capo 3, chords in A/)]);
  expect(screen.queryByTestId("use-again")).toBeNull();
});
