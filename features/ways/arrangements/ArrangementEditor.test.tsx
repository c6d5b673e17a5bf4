import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import { kept as stored } from "@/__tests__/client/memoryIdb";
import { shelf } from "@/features/api/shelf";
import { deviceShelf } from "@/features/api/deviceShelf";
import type { Arrangement } from "@/shared/contract/arrangement";
import { arrangement as contract } from "@/shared/contract/arrangement";
import { findPreset } from "@/shared/instruments/presets";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { findWays } from "@/shared/ways/findWays";
import { proposeArrangements } from "@/shared/ways/arrangements/proposeArrangements";
import { ArrangementEditor } from "./ArrangementEditor";
import { proposedEntry } from "./arrangementEntry";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  Link: ({ children }: { children: React.ReactNode }) => <a href="#x">{children}</a>,
  usePathname: () => "/",
  useRouter: () => ({}),
}));

const instrument = findPreset("box-adf")!;
const key = { tonic: "D", mode: "major" } as const;
const song = { ...aSong(), chart: "| D | G | A | D |", writtenKey: key, beatsPerBar: 4, tempo: 100 };
const [way] = findWays({ chords: ["D", "G", "A"], from: key, to: key, instrument });
const question = { chords: way!.chords, sequence: ["D", "G", "A", "D"], instrument, capo: way!.capo };
const proposal = proposeArrangements(question)[0]!;
const on = { song, tonic: "D", shift: 0, instrument, way: way! };

async function open(kept: Arrangement | null = null) {
  const heard: BackingPlan[] = [];
  const went: unknown[] = [];
  const desk = {
    possible: true,
    heard: null,
    play: (_: string, plan: BackingPlan) => heard.push(plan),
    stop: () => undefined,
    lights: null,
  };
  render(
    <QueryClientProvider client={new QueryClient()}>
      <ArrangementEditor
        entry={proposedEntry(proposal, on)}
        sequence={question.sequence}
        instrumentWords="Box guitar"
        kept={kept}
        firstOpen="G"
        desk={desk}
        onGo={(path) => went.push(path)}
      />
    </QueryClientProvider>,
  );
  await screen.findByTestId("shapes", {}, { timeout: 5000 });
  return { heard, went };
}

beforeEach(async () => {
  stored.clear();
  sessionStorage.clear();
  await deviceShelf.put("songs", song);
});

test("another shape of one chord is chosen on the neck, weighed, heard and kept under its name", async () => {
  const { heard, went } = await open();
  const before = screen.getByTestId("arrangement-weight").textContent;
  const shapes = within(screen.getByTestId("shapes")).getAllByRole("radio");
  const other = shapes.find((shape) => shape.getAttribute("aria-checked") === "false")!;
  fireEvent.click(other);
  expect(screen.getByTestId("arrangement-weight").textContent).not.toBe(before);
  fireEvent.click(screen.getByRole("button", { name: /^Hear it/ }));
  expect(heard[0]!.events.some(({ kind, midis }) => kind === "strum-down" && midis.length === 3)).toBe(true);
  fireEvent.change(screen.getByTestId("arrangement-name"), { target: { value: "For the quay" } });
  fireEvent.click(screen.getByTestId("keep-arrangement"));
  await waitFor(() => expect(went).toHaveLength(1));
  const [mine] = await act(() => shelf.list("arrangements"));
  expect(contract.parse(mine)).toMatchObject({ name: "For the quay", songId: song.id, instrument: "box-adf" });
  const [was, is] = [proposal.chords, mine!.chords].map(
    (chords) => chords.find(({ written }) => written === "G")!.shape!.frets,
  );
  expect(is).not.toEqual(was);
});

test("without a name it is not kept, and says so", async () => {
  await open();
  fireEvent.change(screen.getByTestId("arrangement-name"), { target: { value: "  " } });
  fireEvent.click(screen.getByTestId("keep-arrangement"));
  expect(screen.getByText("Give the arrangement a name.")).toBeTruthy();
  expect(await shelf.list("arrangements")).toEqual([]);
});

test("what was changed is found again after a reload", async () => {
  await open();
  fireEvent.change(screen.getByTestId("arrangement-name"), { target: { value: "Half done" } });
  document.body.replaceChildren();
  await open();
  expect(screen.getByTestId<HTMLInputElement>("arrangement-name").value).toBe("Half done");
});
