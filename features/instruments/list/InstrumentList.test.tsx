import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import { InstrumentList } from "./InstrumentList";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({ Link: () => null }));

beforeEach(() => {
  kept.clear();
  refuseStorage(null);
  queryClient.clear();
});

/** The list on a phone, with every kind of instrument shown. */
const open = async () => {
  render(
    <QueryClientProvider client={queryClient}>
      <InstrumentList />
    </QueryClientProvider>,
  );
  for (const shown of await screen.findAllByRole("button", { name: /^Show \d/ })) fireEvent.click(shown);
};
const card = async (id: string) => within(await screen.findByTestId(`instrument-${id}`));

test("the instrument one plays is kept, and only one is", async () => {
  await open();
  fireEvent.click((await card("guitar")).getByRole("button", { name: /^I play this/ }));
  await screen.findByText(/Ways are found for Guitar first/);
  fireEvent.click((await card("ukulele")).getByRole("button", { name: /^I play this/ }));
  await screen.findByText(/Ways are found for Concert ukulele first/);
  const favourites = (await shelf.list("instruments")).filter((own) => own.favourite);
  expect(favourites.map((own) => own.presetId)).toEqual(["ukulele"]);
});

test("the other hand is kept with the instrument", async () => {
  await open();
  const hand = (await card("guitar")).getByTestId("left-handed-guitar");
  expect(hand.getAttribute("aria-pressed")).toBe("false");
  fireEvent.click(hand);
  await waitFor(() => expect(screen.getByTestId("left-handed-guitar").getAttribute("aria-pressed")).toBe("true"));
  expect((await shelf.list("instruments")).map((own) => [own.presetId, own.leftHanded])).toEqual([["guitar", true]]);
});

test("what cannot be kept is told, and the list stays", async () => {
  await open();
  await card("guitar");
  refuseStorage(new DOMException("full", "QuotaExceededError"));
  fireEvent.click((await card("guitar")).getByRole("button", { name: /^I play this/ }));
  expect((await screen.findByRole("alert")).textContent).toMatch(/no room left.*as they were/);
});

test("on the phone the kinds stay shut until they are asked for or searched", async () => {
  await open();
  fireEvent.click(screen.getByTestId("group-Ukuleles"));
  expect(screen.queryByTestId("instrument-ukulele")).toBeNull();
  fireEvent.change(screen.getByTestId("find-instrument"), { target: { value: "tenor low g" } });
  expect(screen.getByTestId("instrument-ukulele-tenor-low-g")).toBeTruthy();
  expect(screen.queryByTestId("instrument-guitar")).toBeNull();
  expect(screen.getByRole("status").textContent).toBe("1 instrument found");
});
