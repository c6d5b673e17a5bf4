import { act, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { ByHandForm } from "./ByHandForm";
import { letGoOfByHandDraft } from "./useByHandDraft";

const type = (id: string, text: string) => fireEvent.change(screen.getByTestId(id), { target: { value: text } });
const valueOf = (id: string) => (screen.getByTestId(id) as HTMLInputElement).value;
const send = () => act(async () => fireEvent.submit(screen.getByRole("form")));

function open(onKeep = jest.fn(), voice: Parameters<typeof ByHandForm>[0]["voice"] = null) {
  render(<ByHandForm place="new" voice={voice} busy={false} refusal={null} onKeep={onKeep} />);
  return onKeep;
}

beforeEach(() => sessionStorage.clear());

it("tells each fault at its field, keeps what was typed, and keeps nothing", async () => {
  const onKeep = open();
  type("by-hand-lowest", "X4");
  type("by-hand-highest", "G");
  await send();
  expect(screen.getByText(/There is no X4/)).toBeTruthy();
  expect(screen.getByText(/Which G/)).toBeTruthy();
  expect(valueOf("by-hand-lowest")).toBe("X4");
  expect(screen.getByTestId("by-hand-lowest").getAttribute("aria-invalid")).toBe("true");
  expect(onKeep).not.toHaveBeenCalled();
});

it("keeps the notes once they can be read", async () => {
  const onKeep = open();
  type("by-hand-lowest", "X4");
  await send();
  type("by-hand-lowest", "F3");
  type("by-hand-highest", "C5");
  await waitFor(() => expect(screen.queryByText(/There is no X4/)).toBeNull());
  await send();
  expect(onKeep).toHaveBeenCalledWith({ range: { lowMidi: 53, highMidi: 72 }, comfort: { lowMidi: 55, highMidi: 69 } });
});

it("fills the chosen field by a tap on the ladder and moves a note by a semitone", async () => {
  open();
  await act(async () => fireEvent.click(screen.getByRole("button", { name: "G3" })));
  expect(valueOf("by-hand-lowest")).toBe("G3");
  // The next tap is for the highest note; back to the lowest.
  await act(async () => fireEvent.click(screen.getByRole("radio", { name: "Lowest" })));
  await act(async () => fireEvent.click(screen.getByRole("button", { name: "Lowest note: a semitone higher" })));
  expect(valueOf("by-hand-lowest")).toBe("Ab3");
  await act(async () => fireEvent.click(screen.getByRole("radio", { name: "Highest" })));
  await act(async () => fireEvent.click(screen.getByRole("button", { name: "D5" })));
  expect(valueOf("by-hand-highest")).toBe("D5");
});

it("two taps on the ladder are a voice", async () => {
  const onKeep = open();
  await act(async () => fireEvent.click(screen.getByRole("button", { name: "F3" })));
  await act(async () => fireEvent.click(screen.getByRole("button", { name: "C5" })));
  expect([valueOf("by-hand-lowest"), valueOf("by-hand-highest")]).toEqual(["F3", "C5"]);
  await send();
  expect(onKeep).toHaveBeenCalledWith({ range: { lowMidi: 53, highMidi: 72 }, comfort: { lowMidi: 55, highMidi: 69 } });
});

it("begins with the notes that the voice has", () => {
  open(jest.fn(), { range: { lowMidi: 53.2, highMidi: 71.8 }, comfort: { lowMidi: 55, highMidi: 69 } });
  expect(["lowest", "highest", "comfortLow", "comfortTop"].map((name) => valueOf(`by-hand-${name}`))).toEqual([
    "F3",
    "C5",
    "G3",
    "A4",
  ]);
});

it("brings back what was typed and not kept after a reload, also where it is wrong, until one starts afresh", async () => {
  const first = render(<ByHandForm place="new" voice={null} busy={false} refusal={null} onKeep={jest.fn()} />);
  expect(screen.queryByTestId("by-hand-restored")).toBeNull();
  type("by-hand-lowest", "F3");
  type("by-hand-highest", "X4");
  first.unmount();
  open();
  expect(["lowest", "highest"].map((name) => valueOf(`by-hand-${name}`))).toEqual(["F3", "X4"]);
  expect(screen.getByTestId("by-hand-restored").textContent).toContain("did not keep");
  await act(async () => fireEvent.click(screen.getByTestId("by-hand-afresh")));
  expect(["lowest", "highest"].map((name) => valueOf(`by-hand-${name}`))).toEqual(["", ""]);
  expect(screen.queryByTestId("by-hand-restored")).toBeNull();
});

it("shows another voice's own notes and not what was typed for this one", () => {
  const first = render(<ByHandForm place="new" voice={null} busy={false} refusal={null} onKeep={jest.fn()} />);
  type("by-hand-lowest", "F3");
  first.unmount();
  const voice = { range: { lowMidi: 50, highMidi: 70 }, comfort: { lowMidi: 52, highMidi: 67 } };
  render(<ByHandForm place="other" voice={voice} busy={false} refusal={null} onKeep={jest.fn()} />);
  expect(valueOf("by-hand-lowest")).toBe("D3");
  expect(screen.queryByTestId("by-hand-restored")).toBeNull();
});

it("has nothing to bring back once the notes were kept", async () => {
  const first = render(<ByHandForm place="new" voice={null} busy={false} refusal={null} onKeep={jest.fn()} />);
  type("by-hand-lowest", "F3");
  letGoOfByHandDraft("new");
  first.unmount();
  open();
  expect(valueOf("by-hand-lowest")).toBe("");
});
