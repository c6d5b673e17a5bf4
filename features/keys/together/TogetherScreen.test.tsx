import { QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { aDecision, aSong, aVoice } from "@/__tests__/client/belongings";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import type { Song } from "@/shared/contract/song";
import { parseNoteName } from "@/shared/music/pitch";
import type { ReadNotes } from "./singers/SingerForm";
import type { OwnVoice } from "./singers/singers";
import { TogetherScreen } from "./TogetherScreen";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: unknown; children: React.ReactNode }) => (
    <a href={typeof href === "string" ? href : JSON.stringify(href)}>{children}</a>
  ),
}));

const ferry = aSong({ tune: { kind: "span", lowMidi: 62, highMidi: 74, home: "D" } });
const singing = { range: { lowMidi: 53, highMidi: 74 }, comfort: { lowMidi: 56, highMidi: 70 } };
const own: OwnVoice[] = [
  { id: "v1", name: "Maren", singing },
  { id: "v2", name: "Mornings", singing: null },
];

const readNotes: ReadNotes = ({ lowest, highest }) => {
  const low = parseNoteName(lowest);
  const high = parseNoteName(highest);
  if (low === null || high === null) return { ok: false, errors: { lowest: "Which note?" } };
  if (low >= high) return { ok: false, errors: { highest: "The highest note must be above the lowest." } };
  const range = { lowMidi: low, highMidi: high };
  return { ok: true, voice: { range, comfort: { lowMidi: low + 2, highMidi: high - 3 } } };
};

beforeEach(async () => {
  kept.clear();
  refuseStorage(null);
  queryClient.clear();
  localStorage.clear();
  await shelf.put("songs", ferry);
});

function open(song: Song = ferry, error: Error | null = null) {
  const onRetry = jest.fn();
  const page = render(
    <QueryClientProvider client={queryClient}>
      <TogetherScreen song={song} own={own} pending={false} error={error} onRetry={onRetry} readNotes={readNotes} />
    </QueryClientProvider>,
  );
  return { ...page, onRetry };
}
const press = (id: string) => fireEvent.click(screen.getByTestId(id));
const type = (id: string, text: string) => fireEvent.change(screen.getByTestId(id), { target: { value: text } });
const columns = () =>
  within(screen.getByTestId("heat-table"))
    .getAllByRole("columnheader")
    .slice(1)
    .map((head) => head.textContent);
const addByHand = (name: string, lowest: string, highest: string) => {
  type("singer-name", name);
  type("singer-lowest", lowest);
  type("singer-highest", highest);
  press("singer-keep");
};

test("nobody, one, and two singers: what is there, and what to do next", () => {
  open();
  expect(screen.getByTestId("together-empty")).toBeTruthy();
  press("add-voice-v1");
  expect(screen.getByTestId("together-one")).toBeTruthy();
  expect(screen.queryByTestId("take-shared-key")).toBeNull();
  addByHand("Ben", "G2", "E4");
  expect(screen.getAllByTestId("span-row")).toHaveLength(2);
  expect(screen.getByTestId("octaves").textContent).toMatch(
    /Ben sings it an octave lower\.|Maren sings it an octave higher\./,
  );
});

test("a voice that nothing was sung with is listed and not judged", () => {
  open();
  press("add-voice-v1");
  press("add-voice-v2");
  expect(screen.getByText("Nothing sung yet")).toBeTruthy();
  expect(screen.getByTestId("together-one")).toBeTruthy();
});

test("a plain voice type is called a table figure, with its source", () => {
  open();
  press("add-type-soprano");
  press("add-type-soprano");
  expect(screen.getAllByTestId("singer")[1]?.textContent).toMatch(/^Soprano 2Table figure, /);
  expect(screen.getAllByText(/^Table figure, /)).toHaveLength(2);
  press("adding");
  expect(screen.getByTestId("table-sources").textContent).toMatch(/nobody’s own voice.*Harvard/);
});

test("faults of a typed singer are told at their fields, and nothing is added", () => {
  open();
  press("singer-keep");
  expect(screen.getByText("Give the singer a name.")).toBeTruthy();
  expect(screen.getByText("Give the lowest note, such as G3.")).toBeTruthy();
  addByHand("Nils", "G4", "C3");
  expect(screen.getByText(/The highest note must be above/)).toBeTruthy();
  expect(screen.queryByTestId("singer")).toBeNull();
  type("singer-highest", "C5");
  press("singer-keep");
  expect(screen.getAllByTestId("singer")).toHaveLength(1);
});

test("the table has singers as rows and twelve keys as columns, and each cell says how it lies", () => {
  open();
  press("add-voice-v1");
  addByHand("Ben", "G2", "E4");
  const table = screen.getByTestId("heat-table");
  expect(within(table).getAllByRole("columnheader")).toHaveLength(13);
  expect(
    within(table)
      .getAllByRole("rowheader")
      .map((head) => head.textContent),
  ).toEqual(["Maren", "Ben", "Lowest score", "Average"]);
  const cells = within(table).getAllByRole("cell");
  expect(cells).toHaveLength(48);
  for (const cell of cells.slice(0, 24))
    expect(cell.textContent).toMatch(/^\d+.*, (comfortable|\d+ (over|under|beyond))/);
});

test("a picked key is spoken of, whatever the order; the order can be one singer's", () => {
  open();
  press("add-voice-v1");
  addByHand("Nils", "F3", "D4");
  const fairest = columns();
  expect(fairest[0]).toMatch(/ fairest, lowest score /);
  fireEvent.change(screen.getByTestId("group-order"), {
    target: { value: (screen.getByRole("option", { name: /best for Maren/ }) as HTMLOptionElement).value },
  });
  expect(columns()).not.toEqual(fairest);
  expect([...columns()].sort()).toEqual([...fairest].sort());
  press("pick-F");
  expect(screen.getByTestId("pick-F").getAttribute("aria-pressed")).toBe("true");
  expect(screen.getByTestId("fairest").textContent).toMatch(/of twelve; .+ is the fairest/);
});

test("the group is remembered for the song, and offered for the next one", () => {
  const { unmount } = open();
  press("add-voice-v1");
  addByHand("Ben", "G2", "E4");
  unmount();
  const again = open();
  expect(screen.getAllByTestId("singer")).toHaveLength(2);
  again.unmount();
  open(aSong({ tune: ferry.tune }));
  press("add-last");
  expect(screen.getAllByTestId("span-row")).toHaveLength(2);
});

test("a singer is renamed, changed and left out", () => {
  open();
  press("add-voice-v1");
  addByHand("Ben", "G2", "E4");
  press("adding");
  fireEvent.click(screen.getByRole("button", { name: "Change Ben" }));
  type("singer-name", "Old Ben");
  type("singer-highest", "F4");
  press("singer-keep");
  expect(screen.getByText("Typed, G2 to F4")).toBeTruthy();
  expect(screen.queryByTestId("add-singers")).toBeNull();
  fireEvent.click(screen.getByRole("button", { name: "Leave out Old Ben" }));
  expect(screen.getAllByTestId("singer")).toHaveLength(1);
  // With fewer than two, the places that singers come from stand open.
  expect(screen.getByTestId("add-singers")).toBeTruthy();
  expect(document.activeElement?.textContent).toBe("Who sings");
});

test("the decided key is kept for whoever sings, with its reason", async () => {
  open();
  press("add-voice-v1");
  addByHand("Ben", "G2", "E4");
  await act(async () => press("take-shared-key"));
  await waitFor(() => expect(screen.getByTestId("shared-key-kept")).toBeTruthy());
  const [decision] = await shelf.list("decisions");
  expect(decision).toMatchObject({ songId: ferry.id, voiceId: null });
  expect(decision?.reason).toMatch(/^The fairest key for Maren and Ben: the lowest score is \d+/);
});

test("a voice's own key stays beside the group's, and what the group decided before is its history", async () => {
  const maren = await shelf.put("voices", aVoice());
  const own = await shelf.put("decisions", aDecision(ferry.id, maren.id));
  open();
  press("add-voice-v1");
  addByHand("Ben", "G2", "E4");
  const take = async (tonic: string) => {
    press(`pick-${tonic}`);
    await act(async () => press("take-shared-key"));
    await waitFor(() => expect(screen.getByTestId("shared-key-kept")).toBeTruthy());
  };
  await take("E");
  await take("F");
  const decisions = await shelf.list("decisions");
  expect(decisions).toHaveLength(2);
  expect(decisions).toContainEqual(own);
  expect(decisions.find(({ voiceId }) => voiceId === null)).toMatchObject({ tonic: "F", earlier: [{ tonic: "E" }] });
});

test("without a tune, and without the voices, there is a next step", () => {
  const { unmount } = open(aSong());
  expect(screen.getByTestId("together-needs-tune")).toBeTruthy();
  unmount();
  const { onRetry } = open(ferry, new Error("There is no connection."));
  fireEvent.click(screen.getByRole("button", { name: "Try again" }));
  expect(onRetry).toHaveBeenCalled();
});
