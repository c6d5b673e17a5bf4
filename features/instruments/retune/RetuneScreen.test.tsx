import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen } from "@testing-library/react";
import { kept } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { RetuneScreen } from "./RetuneScreen";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({ Link: () => null }));

beforeEach(() => {
  kept.clear();
  queryClient.clear();
  localStorage.clear();
});

const open = (instrument: string, shift: number) =>
  render(
    <QueryClientProvider client={queryClient}>
      <RetuneScreen instrumentId={instrument} shift={shift} />
    </QueryClientProvider>,
  );

// D'Addario's chart 13934: the light set pulls 163.3 lb at its pitch, 79.4 % of it a whole tone down.
test("a way's retune stands there as it was asked for; inches and pounds when they are wished", async () => {
  open("guitar", -2);
  expect((await screen.findByTestId("total-tension")).textContent).toMatch(/74\.1 kg.*58\.8 kg.*−21 %/);
  fireEvent.click(screen.getByRole("radio", { name: "inches and lb" }));
  expect(screen.getByTestId("total-tension").textContent).toMatch(/163\.3 lb before, 129\.6 lb after/);
  expect(screen.getByTestId("retune-string-0").textContent).toMatch(/D2.*\.053 in.*26\.0 lb.*20\.7 lb.*Fine: 79 %/);
});

test("one string alone is turned, the order follows, and too far is no order at all", async () => {
  open("guitar", 0);
  const order = await screen.findByTestId("retune-order");
  expect(order.textContent).toBe("");
  fireEvent.click(screen.getByTestId("shift-0-down"));
  fireEvent.click(screen.getByTestId("shift-0-down"));
  expect(screen.getByTestId("retune-order").textContent).toBe("1. String 1: E2 down to D2");
  expect(screen.getByTestId("shift-all").textContent).toBe("each its own");
  fireEvent.click(screen.getByTestId("shift-1-up"));
  fireEvent.click(screen.getByTestId("shift-1-up"));
  expect(screen.queryByTestId("retune-order")).toBeNull();
  expect(screen.getByTestId("retune-cautions").textContent).toMatch(/Not for A2: more than a semitone above/);
});

test("a shift that is none, or beyond all sense, begins at a sensible one", async () => {
  open("ukulele", Number.NaN);
  expect((await screen.findByTestId("shift-all")).textContent).toBe("as it is");
  expect(screen.getByTestId("total-tension").textContent).toMatch(/not known/);
});
