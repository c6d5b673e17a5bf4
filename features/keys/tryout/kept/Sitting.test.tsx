import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor } from "@testing-library/react";
import { aSong, aTry, aVoice } from "@/__tests__/client/belongings";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import { useSongKeys } from "../../useSongKeys";
import { Sitting } from "./Sitting";

jest.mock("idb-keyval", () => ({
  ...jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb,
  // Nothing waits for a connection here.
  entries: () => Promise.resolve([]),
  del: () => Promise.resolve(),
}));

const song = aSong({ tune: { kind: "span", lowMidi: 57, highMidi: 71, home: "D" } });
const maren = aVoice({ name: "Maren" });
const singing = { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };
const hard = aTry(song.id, maren.id, { tonic: "C", shift: -2, effort: 5, sungAt: new Date().toISOString() });

beforeEach(async () => {
  kept.clear();
  refuseStorage(null);
  queryClient.clear();
  await shelf.put("songs", song);
  await shelf.put("voices", maren);
});

function Page() {
  const keys = useSongKeys(song, { voice: maren, voices: [maren], forKeys: singing });
  return (
    <>
      <p data-testid="ranking">{keys.rows?.map(({ sign, score }) => `${sign} ${score}`).join(", ")}</p>
      <p data-testid="comfort">{JSON.stringify(keys.voice?.comfort)}</p>
      <p data-testid="why">{keys.tried.join(" ")}</p>
      <Sitting song={song} keys={keys} singer={maren} voice={singing} />
    </>
  );
}

const open = () =>
  render(
    <QueryClientProvider client={queryClient}>
      <Page />
    </QueryClientProvider>,
  );
const told = () => ["ranking", "comfort", "why"].map((id) => screen.getByTestId(id).textContent);
const settled = () => waitFor(() => expect(queryClient.isFetching()).toBe(0));

async function toldWithout() {
  const page = open();
  await settled();
  const without = told();
  page.unmount();
  return without;
}

test("taking a try out restores ranking and comfort, and it counts no longer anywhere", async () => {
  const without = await toldWithout();
  await shelf.put("tries", hard);
  queryClient.clear();
  open();
  await screen.findByTestId("try-list");
  const [ranking, comfort, why] = told();
  expect(ranking).not.toBe(without[0]);
  expect(comfort).not.toBe(without[1]);
  expect(why).not.toBe("");
  fireEvent.click(screen.getByRole("button", { name: /^Take out: C, / }));
  await waitFor(() => expect(screen.queryByTestId("try-list")).toBeNull());
  expect(told()).toEqual(without);
  expect(await shelf.list("tries")).toEqual([]);
});

test("of two tries the one that stays still counts", async () => {
  const other = aTry(song.id, maren.id, { tonic: "Db", shift: -1, effort: 4, sungAt: new Date().toISOString() });
  await shelf.put("tries", other);
  const withOther = await toldWithout();
  await shelf.put("tries", hard);
  queryClient.clear();
  open();
  await waitFor(() => expect(screen.getAllByTestId("try-remove")).toHaveLength(2));
  fireEvent.click(screen.getByRole("button", { name: /^Take out: C, / }));
  await waitFor(() => expect(screen.getAllByTestId("try-remove")).toHaveLength(1));
  expect(told()).toEqual(withOther);
});

test("what could not be taken out is told and counts on", async () => {
  await shelf.put("tries", hard);
  open();
  await screen.findByTestId("try-list");
  const counted = told();
  refuseStorage(new Error("locked"));
  fireEvent.click(screen.getByTestId("try-remove"));
  await screen.findByText(/It is still counted/);
  expect(told()).toEqual(counted);
});
