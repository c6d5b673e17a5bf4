import { fireEvent, render, screen } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import { SongShelf } from "./SongShelf";

jest.mock("expo-router", () => ({
  Link: ({ href, children, ...rest }: { href: unknown; children: React.ReactNode; testID?: string }) => (
    <a href={JSON.stringify(href)} data-testid={rest.testID}>
      {children}
    </a>
  ),
}));

const songs = [
  aSong({ title: "Gulls" }),
  aSong({ title: "Slack Water", tune: { kind: "span", lowMidi: 57, highMidi: 71, home: "D" } }),
];

test("each song says its written key, and the decided key with its words where there is one", () => {
  render(
    <SongShelf
      songs={songs}
      myKey={(song) =>
        song.title === "Gulls"
          ? null
          : {
              key: { tonic: "C", mode: "major" } as const,
              words: "My key, a whole tone under the chart",
              strip: <i>strip</i>,
            }
      }
    />,
  );
  expect(screen.getAllByRole("listitem").map((row) => row.textContent)).toEqual([
    "DGullsWritten in D, no melody yet.",
    "CSlack WaterMy key, a whole tone under the chart. Written in D.strip",
  ]);
});

test("a mode is set small beside its tonic and spoken in full", () => {
  render(
    <SongShelf
      songs={[aSong({ title: "Gulls", writtenKey: { tonic: "Eb", mode: "mixolydian" } })]}
      myKey={() => null}
    />,
  );
  expect(screen.getByText("mixo.")).toBeTruthy();
  expect(screen.getByRole("listitem").textContent).toMatch(/^E♭ mixolydian.*Written in E♭ mixolydian/);
});

test("the search narrows the shelf and says when nothing fits", () => {
  render(<SongShelf songs={songs} myKey={() => null} />);
  fireEvent.change(screen.getByLabelText("Search your songs"), { target: { value: "slack" } });
  expect(screen.getAllByRole("listitem")).toHaveLength(1);
  expect(screen.getByRole("status").textContent).toBe("1 song found");
  fireEvent.change(screen.getByLabelText("Search your songs"), { target: { value: "anchor" } });
  expect(screen.queryByRole("listitem")).toBeNull();
  expect(screen.getByText(/No title and no line holds “anchor”/)).toBeTruthy();
});

test("an empty shelf says what it will be and offers the one next step", () => {
  render(<SongShelf songs={[]} myKey={() => null} />);
  expect(screen.getByRole("heading", { name: "No songs yet" })).toBeTruthy();
  expect(screen.getByText("Add a song").closest("a")?.getAttribute("href")).toBe('"/songs/new"');
});
