import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import { InstrumentList } from "./InstrumentList";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);

beforeEach(() => {
  kept.clear();
  refuseStorage(null);
  queryClient.clear();
});

const open = () =>
  render(
    <QueryClientProvider client={queryClient}>
      <InstrumentList />
    </QueryClientProvider>,
  );
const card = async (id: string) => within(await screen.findByTestId(`instrument-${id}`));

test("the instrument one plays is kept, and only one is", async () => {
  open();
  fireEvent.click((await card("guitar")).getByRole("button", { name: /^I play this/ }));
  await screen.findByText(/Ways are found for Guitar first/);
  fireEvent.click((await card("ukulele")).getByRole("button", { name: /^I play this/ }));
  await screen.findByText(/Ways are found for Concert ukulele first/);
  const favourites = (await shelf.list("instruments")).filter((own) => own.favourite);
  expect(favourites.map((own) => own.presetId)).toEqual(["ukulele"]);
});

test("the other hand is kept with the instrument", async () => {
  open();
  const hand = (await card("guitar")).getByTestId("left-handed-guitar");
  expect(hand.getAttribute("aria-pressed")).toBe("false");
  fireEvent.click(hand);
  await waitFor(() => expect(screen.getByTestId("left-handed-guitar").getAttribute("aria-pressed")).toBe("true"));
  expect((await shelf.list("instruments")).map((own) => [own.presetId, own.leftHanded])).toEqual([["guitar", true]]);
});

test("what cannot be kept is told, and the list stays", async () => {
  open();
  await card("guitar");
  refuseStorage(new DOMException("full", "QuotaExceededError"));
  fireEvent.click((await card("guitar")).getByRole("button", { name: /^I play this/ }));
  expect((await screen.findByRole("alert")).textContent).toMatch(/no room left.*as they were/);
});
