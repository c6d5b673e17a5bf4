import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { aDecision, aSong, aVoice } from "@/__tests__/client/belongings";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import { useSongKeys } from "../useSongKeys";
import { DecisionCard } from "./DecisionCard";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

const song = aSong({ tune: { kind: "span", lowMidi: 57, highMidi: 71, home: "D" } });
const [maren, ilse] = [aVoice({ name: "Maren" }), aVoice({ name: "Ilse" })];
const singing = { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };

beforeEach(async () => {
  kept.clear();
  refuseStorage(null);
  queryClient.clear();
  await shelf.put("songs", song);
  await shelf.put("voices", maren);
  await shelf.put("voices", ilse);
});

function Page({ voice }: { voice: typeof maren | null }) {
  const keys = useSongKeys(song, { voice, voices: [maren, ilse], forKeys: singing });
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

function open(voice: typeof maren | null = maren) {
  const view = (of: typeof maren | null) => (
    <QueryClientProvider client={queryClient}>
      <Page voice={of} />
    </QueryClientProvider>
  );
  const page = render(view(voice));
  return { sing: (of: typeof maren | null) => page.rerender(view(of)) };
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
    expect.stringMatching(/^C.* · Box guitar, G-D-G: capo 3, chords in G.*Judged by the span alone\.$/),
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
