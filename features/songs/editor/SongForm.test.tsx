import { TextDecoder, TextEncoder } from "node:util";
import { fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import type { Song } from "@/shared/contract/song";
import * as cells from "../chartCells";
import { draftStore } from "./draftStore";
import { emptyDraft, newOrigin, type SongDraft } from "./songDraft";
import { SongForm } from "./SongForm";

// The DOM of the tests lacks these two of the browser.
Object.assign(globalThis, { TextDecoder, TextEncoder });

// Jest runs no import() at run time; the readers themselves are the real ones.
jest.mock("../files/lazyReaders", () => ({
  lazyReaders: {
    melodyFile: async () => jest.requireActual<object>("@/shared/songs/melodyFile"),
    demoSongs: async () => jest.requireActual<object>("@/shared/songs/demoSongs"),
  },
}));

const origin = () => newOrigin("7f0b6f0e-6a51-4a8e-9a53-0a3d8f6f3f01", "2026-03-05T19:00:00.000Z");
const chart = "G       C\nLow tide and still\nD       G\nthe gulls go by";

function open(draft: Partial<SongDraft> = {}, problem: Error | null = null) {
  const saved: Song[] = [];
  const view = (error: Error | null) => (
    <SongForm
      draft={{ ...emptyDraft, ...draft }}
      songId={null}
      origin={origin}
      problem={error}
      onSave={(song) => saved.push(song)}
      frame={(form, submit) => (
        <>
          {form}
          <button type="button" onClick={submit}>
            Save the song
          </button>
        </>
      )}
    />
  );
  const page = render(view(problem));
  return { saved, fail: (error: Error) => page.rerender(view(error)) };
}

/** The file readers are fetched with the first file, which takes its time where nothing is compiled yet. */
const readerLoads = { timeout: 20_000 };
const type = (label: RegExp | string, text: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value: text } });
const save = () => fireEvent.click(screen.getByText("Save the song"));

afterEach(() => localStorage.clear());

test("a typed chart is read as one types: key found, preview shown, song saved", async () => {
  const { saved } = open();
  type("Title", "Slack Water");
  type(/^Chart/, chart);
  await waitFor(() => expect(screen.getByTestId("written-key-name").textContent).toBe("G major"));
  expect(within(screen.getByTestId("preview")).getByTestId("chart").textContent).toContain("tide");
  save();
  await waitFor(() => expect(saved).toHaveLength(1));
  expect(saved[0]).toMatchObject({
    title: "Slack Water",
    chart,
    writtenKey: { tonic: "G", mode: "major" },
    tune: null,
  });
});

test("what is missing is said at its field, and nothing typed is lost", async () => {
  const { saved } = open({ tune: "span" });
  type(/^Chart/, chart);
  type("Lowest note", "D");
  save();
  expect((await screen.findAllByText(/Give the song a title/)).length).toBeGreaterThan(0);
  expect(screen.getByText("3 things need mending")).toBeTruthy();
  expect(screen.getByLabelText("Lowest note").getAttribute("aria-invalid")).toBe("true");
  await waitFor(() => expect(document.activeElement).toBe(screen.getByLabelText("Title")));
  expect((screen.getByLabelText(/^Chart/) as HTMLTextAreaElement).value).toBe(chart);
  expect(saved).toEqual([]);
});

test("one thing that is wrong is told as one, and not as missing", async () => {
  open({ title: "x".repeat(201), chart });
  save();
  expect(await screen.findByText("One thing needs mending")).toBeTruthy();
});

test("typing in the title draws nothing of the chart anew", async () => {
  open({ chart });
  await screen.findByTestId("preview");
  const spy = jest.spyOn(cells, "chartCells");
  type("Title", "Slack Water");
  await waitFor(() => expect(draftStore.load(null)?.title).toBe("Slack Water"));
  expect(spy).not.toHaveBeenCalled();
  type(/^Chart/, `${chart}s`);
  await waitFor(() => expect(spy).toHaveBeenCalledTimes(1));
  spy.mockRestore();
});

test("a refusal by the shelf keeps the form and says so", () => {
  const { fail } = open({ title: "Slack Water", chart });
  fail(new Error("Larkspan cannot be reached."));
  expect(screen.getByRole("alert").textContent).toMatch(/cannot be reached.*Everything you typed is still here/);
  expect((screen.getByLabelText("Title") as HTMLInputElement).value).toBe("Slack Water");
});

test("every letter is kept on the device", async () => {
  open();
  type("Title", "Slack");
  await waitFor(() => expect(draftStore.load(null)?.title).toBe("Slack"));
});

test("an untouched form leaves no draft behind", () => {
  open();
  expect(draftStore.load(null)).toBeNull();
});

test("signs that are no chords are listed with line and column", async () => {
  open();
  type(/^Chart/, "G   C   Hx#  D\nLow tide and still");
  await waitFor(() => expect(screen.getByTestId("unread").textContent).toContain("Hx#"));
  expect(screen.getByTestId("unread").textContent).toContain("line 1, column 9");
});

test("the key can be changed by hand and given back", async () => {
  const { saved } = open({ title: "Slack Water", chart });
  fireEvent.click(screen.getByTestId("another-key"));
  fireEvent.change(screen.getByTestId("key-mode"), { target: { value: "mixolydian" } });
  expect(screen.getByTestId("written-key-name").textContent).toBe("G mixolydian");
  save();
  await waitFor(() => expect(saved[0]?.writtenKey).toEqual({ tonic: "G", mode: "mixolydian" }));
  fireEvent.click(screen.getByText("Use G major"));
  expect(screen.getByTestId("written-key-name").textContent).toBe("G major");
});

test("a melody file is read, and one that is none is refused in place", async () => {
  const { saved } = open({ title: "Slack Water", chart, tune: "melody" });
  const file = (name: string, text: string) => {
    const given = new File([text], name);
    given.arrayBuffer = () => Promise.resolve(new TextEncoder().encode(text).buffer as ArrayBuffer);
    return given;
  };
  const give = (each: File) => fireEvent.change(screen.getByTestId("melody-file"), { target: { files: [each] } });
  give(file("notes.txt", "nothing of use"));
  await waitFor(() => expect(screen.getByTestId("melody-refusal").textContent).toMatch(/^notes\.txt: /), readerLoads);
  expect(screen.queryByTestId("tune-home")).toBeNull();
  give(file("slack.abc", "X:1\nT:Slack\nM:3/4\nL:1/4\nK:G\nG A B | d2 B | A G2 |]\n"));
  await waitFor(() => expect(screen.getByTestId("tune").textContent).toContain("7 notes, G4 to D5"), readerLoads);
  expect(screen.queryByTestId("melody-refusal")).toBeNull();
  expect(screen.getByTestId("tune-home")).toBeTruthy();
  save();
  await waitFor(() => expect(saved[0]?.tune).toMatchObject({ kind: "melody", home: "G" }));
});
