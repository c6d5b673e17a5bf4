import { fireEvent, render, screen, within } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import { partFacts } from "@/shared/keys/partFacts";
import { wholeVoice, type KeyRow } from "../keyRows";
import { keyRowsOf } from "../songKeys";
import { CompareTable } from "./CompareTable";
import { compareColumns, compareHeight, compareScale } from "./compareGeometry";
import { compareTitle, partInWords, whyNotOneHigher } from "./compareWords";

const notes = [62, 64, 66, 67, 69, 71, 76].map((midi, start) => ({ midi, start, duration: 1 + (start % 2) }));
const song = aSong({ tune: { kind: "melody", notes, home: "D" } });
const singing = { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };
const rows = keyRowsOf(song, singing) ?? [];
const [first, second, third] = [rows[0]!, rows[1]!, rows[11]!];

const factsOf = (row: KeyRow) => partFacts(song.tune!, singing, row.judged);

function show(chooser: string | null = "my guitar") {
  const heard: string[] = [];
  render(
    <CompareTable
      rows={[first, second, third]}
      all={rows}
      voice={wholeVoice(singing)}
      room={1280}
      selected={first}
      onSelect={(row) => heard.push(`look at ${row.sign}`)}
      onUnpin={(row) => heard.push(`without ${row.sign}`)}
      markOf={(row) => (row === second ? "my key" : null)}
      chooser={chooser}
      wayOf={(row) => `way into ${row.sign}`}
      factsOf={factsOf}
      chordsOf={(row) => row.chords}
      takesOf={(row) => `sung in ${row.sign}`}
    />,
  );
  return heard;
}

test("each key is a column, each thing that is compared a row", () => {
  show();
  const table = screen.getByRole("table", { name: `${first.sign}, ${second.sign}, ${third.sign} side by side` });
  expect(within(table).getAllByRole("columnheader")).toHaveLength(3);
  const heads = within(table)
    .getAllByRole("rowheader")
    .map((head) => head.textContent);
  expect(heads).toEqual([
    expect.stringContaining("Span of the tune"),
    "Time in comfort",
    "Room above",
    "Room below",
    "Long high notes",
    "Low notes carry",
    "Why not one higher?",
    "Chords",
    "Best waymy guitar",
    "Takes triedand how they felt",
  ]);
  expect(
    within(table)
      .getAllByRole("img")
      .map((picture) => picture.getAttribute("aria-label")),
  ).toEqual([0, 1, 2].map(() => expect.stringMatching(/^Voice from .* of the time in comfort/)));
  expect(screen.getByRole("columnheader", { name: /my key/ }).textContent).toContain(second.sign);
  expect(screen.getByText(`way into ${third.sign}`)).toBeTruthy();
  expect(screen.getByText(`sung in ${second.sign}`)).toBeTruthy();
});

test("a key is chosen by its head and taken away by its cross", () => {
  const heard = show();
  fireEvent.click(screen.getByRole("radio", { name: new RegExp(`^${second.sign},`) }));
  fireEvent.click(screen.getByRole("button", { name: `Take ${third.sign} away` }));
  expect(heard).toEqual([`look at ${second.sign}`, `without ${third.sign}`]);
});

test("a song without chords has no rows for them", () => {
  show(null);
  expect(screen.queryByRole("rowheader", { name: /Chords|Best way/ })).toBeNull();
});

test.each([1, 2, 3, 4])("%i keys fill a wide page and scroll on a narrow one", (count) => {
  const wide = compareColumns(1280, count);
  expect(wide.lead).toBe(150);
  expect(wide.total).toBeLessThanOrEqual(1280);
  expect(wide.total).toBeGreaterThan(1280 - count - 1);
  expect(compareColumns(358, count).each).toBeGreaterThanOrEqual(216);
});

test("a semitone is 15 px, with air at both ends", () => {
  const scale = compareScale([first], { range: { lowMidi: 51, highMidi: 74 }, comfort: singing.comfort });
  expect(scale).toEqual({ low: 50, high: 76 });
  expect(compareHeight(scale)).toBe(405);
});

test("the answer to why not one higher names both keys", () => {
  for (const row of rows) {
    const higher = rows.find(({ shift }) => (((shift - row.shift - 1) % 12) + 12) % 12 === 0)!;
    const words = whyNotOneHigher(row, rows);
    expect(words).toContain(higher.sign);
    expect(words).toContain(row.sign);
  }
  expect(whyNotOneHigher(first, [first])).toBeNull();
});

test("each part is said in words that hold its figures", () => {
  const facts = factsOf(first);
  const said = (part: keyof typeof facts, change: object = {}) =>
    partInWords(part, { ...facts, [part]: { ...facts[part], ...change } }, "flats");
  expect(said("comfort", { inside: 1 })).toBe("all of the time in your comfort band");
  expect(said("comfort", { inside: 0.934 })).toBe("93 % of the time in your comfort band");
  expect(said("roomAbove", { semitones: 5 })).toBe("five semitones to the top of your range");
  expect(said("roomAbove", { semitones: 0 })).toBe("the top note is your last");
  expect(said("roomBelow", { semitones: -1 })).toBe("a semitone past the bottom of your range");
  expect(said("longHigh", { share: 0 })).toBe("nothing as high as A♭4");
  expect(said("longHigh", { share: 0.2, longShare: 0.004 })).toBe(
    "20 % of the time on A♭4 or higher, under 1 % in long notes",
  );
  expect(said("longHigh", { share: 0.2, longShare: 0 })).toBe("20 % of the time on A♭4 or higher, no long notes");
  expect(said("longHigh", { share: 0.2, longShare: null })).toBe("20 % of the time on A♭4 or higher");
  expect(said("lowCarry", { share: 0 })).toBe("nothing as low as A3");
  expect(said("lowCarry", { share: 0.5 })).toBe("50 % of the time on A3 or lower");
});

test("the title counts", () => {
  expect([1, 2, 3, 4].map(compareTitle)).toEqual([
    "One key",
    "Two keys, side by side",
    "Three keys, side by side",
    "Four keys, side by side",
  ]);
});
