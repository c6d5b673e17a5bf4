import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import { NewInstrument } from "./NewInstrument";
import { OwnInstrumentPage } from "./OwnInstrumentPage";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => {
  const { createElement } = jest.requireActual<typeof import("react")>("react");
  const Link = ({ children, testID }: { children?: unknown; testID?: string }) =>
    createElement("a", { href: "#", "data-testid": testID }, children as never);
  return { Link };
});

beforeEach(() => {
  // jsdom scrolls nothing.
  Element.prototype.scrollIntoView = () => undefined;
  kept.clear();
  refuseStorage(null);
  queryClient.clear();
  localStorage.clear();
});

const show = (page: React.ReactElement) =>
  render(<QueryClientProvider client={queryClient}>{page}</QueryClientProvider>);
const type = (testID: string, value: string) => fireEvent.change(screen.getByTestId(testID), { target: { value } });
const keep = () => fireEvent.click(screen.getByTestId("keep-instrument"));

test("an instrument from nothing: errors in place, then kept as it was typed", async () => {
  const onKept = jest.fn();
  show(<NewInstrument from={null} onKept={onKept} />);
  keep();
  expect((await screen.findByTestId("instrument-wrong")).textContent).toMatch(/4 fields/);
  expect(screen.getByTestId("instrument-name").getAttribute("aria-invalid")).toBe("true");
  type("instrument-name", "Net-loft box");
  ["D3", "A3", "D4"].forEach((note, k) => type(`note-${k}`, note));
  fireEvent.click(screen.getByRole("button", { name: "Move string 3 towards the bass" }));
  fireEvent.click(screen.getByRole("button", { name: "Remove string 1" }));
  fireEvent.click(screen.getByTestId("add-string"));
  type("note-2", "F♯4");
  keep();
  await waitFor(() => expect(onKept).toHaveBeenCalledTimes(1));
  const [own] = await shelf.list("instruments");
  expect(own).toMatchObject({ name: "Net-loft box", presetId: null, favourite: false, scaleMm: 635 });
  expect(own!.strings.map(({ note }) => note)).toEqual(["D4", "A3", "F#4"]);
});

test("while the neck cannot be drawn, it is said what is missing for it", () => {
  show(<NewInstrument from="banjo" onKept={() => undefined} />);
  expect(screen.queryByText(/the neck is drawn and can be heard here/)).toBeNull();
  type("scale", "-5");
  expect(screen.getByText(/Scale or frets cannot be read yet/)).toBeTruthy();
  type("scale", "660");
  expect(screen.queryByText(/cannot be read yet/)).toBeNull();
  for (const k of [0, 1, 2, 3, 4]) type(`note-${k}`, "");
  expect(screen.getByText(/Name the note of a string/)).toBeTruthy();
});

test("what was typed outlives a reload, and can be let go", async () => {
  const first = show(<NewInstrument from="banjo" onKept={() => undefined} />);
  type("instrument-name", "Slipway banjo");
  first.unmount();
  show(<NewInstrument from="banjo" onKept={() => undefined} />);
  const back = await screen.findByTestId("draft-restored");
  expect((screen.getByTestId("instrument-name") as HTMLInputElement).value).toBe("Slipway banjo");
  fireEvent.click(within(back).getByRole("button", { name: "Start afresh" }));
  expect((screen.getByTestId("instrument-name") as HTMLInputElement).value).toBe("Five-string banjo");
});

test("what cannot be kept is told, and stays in the fields", async () => {
  const onKept = jest.fn();
  show(<NewInstrument from="mandolin" onKept={onKept} />);
  refuseStorage(new DOMException("full", "QuotaExceededError"));
  keep();
  expect((await screen.findByRole("alert")).textContent).toMatch(/no room left.*still here/);
  expect(onKept).not.toHaveBeenCalled();
});

test("an own instrument is copied and, asked twice, deleted; one of somebody else is not there", async () => {
  show(<NewInstrument from="banjo" onKept={() => undefined} />);
  keep();
  await waitFor(async () => expect(await shelf.list("instruments")).toHaveLength(1));
  const [own] = await shelf.list("instruments");
  document.body.innerHTML = "";
  const onOpen = jest.fn();
  const onDone = jest.fn();
  show(<OwnInstrumentPage id={own!.id} onDone={onDone} onOpen={onOpen} />);
  fireEvent.click(await screen.findByTestId("copy-instrument"));
  await waitFor(() => expect(onOpen).toHaveBeenCalledTimes(1));
  expect((await shelf.list("instruments")).map(({ name }) => name).sort()).toEqual([
    "Five-string banjo",
    "Five-string banjo, copy",
  ]);
  fireEvent.click(screen.getByTestId("remove-instrument"));
  fireEvent.click(screen.getByTestId("remove-confirmed"));
  await waitFor(() => expect(onDone).toHaveBeenCalledTimes(1));
  expect((await shelf.list("instruments")).map(({ name }) => name)).toEqual(["Five-string banjo, copy"]);
  expect(await screen.findByTestId("no-such-instrument")).toBeTruthy();
});
