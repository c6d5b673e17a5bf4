import { useMemo, useState } from "react";
import { parseChord } from "@/shared/music/chord";
import type { KeyName } from "@/shared/music/keyName";
import { glyphs } from "@/shared/music/pitch";
import type { Chart } from "@/shared/songs/chart";
import { nudgeChord, placeChord, removeChord, type ChartSpot } from "@/shared/songs/chartEdits";
import { chordPalette, type Palette } from "./palette";
import { cellAt, cellWords, placeItems, withoutTabs, type PlaceCell, type PlaceItem } from "./placeLines";

export interface Placing {
  items: readonly PlaceItem[];
  palette: Palette;
  spot: ChartSpot | null;
  cell: PlaceCell | null;
  /** the chosen place in words, or why the last touch did nothing */
  words: string;
  refusal: string | null;
  choose: (spot: ChartSpot) => void;
  place: (symbol: string) => boolean;
  nudge: (by: number) => void;
  remove: () => void;
}

interface Asked {
  text: string;
  chart: Chart;
  key: KeyName | null;
  /** whether chords are being placed: only then are the places worked out, which takes a while for a long chart */
  placing: boolean;
  onText: (text: string) => void;
}

/** Putting chords over syllables: a place is chosen, then a chord. All of it changes the text of the chart. */
export function usePlacing({ text, chart, key, placing, onText }: Asked): Placing {
  const [spot, setSpot] = useState<ChartSpot | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const items = useMemo(() => (placing ? placeItems(text) : []), [text, placing]);
  const palette = useMemo(() => chordPalette(chart, key), [chart, key]);
  const cell = cellAt(items, spot);
  const plain = withoutTabs(text);

  /** The row of the words moves when a line of chords comes or goes above it. */
  const follow = (now: string, column: number) => {
    if (spot === null) return;
    setSpot({ row: spot.row + now.split("\n").length - plain.split("\n").length, column });
    setRefusal(null);
    onText(now);
  };
  return {
    items,
    palette,
    spot: cell ? spot : null,
    cell,
    words: cell && spot ? cellWords(cell, spot.row) : "Choose a syllable, then a chord.",
    refusal,
    choose(next) {
      setSpot(next);
      setRefusal(null);
    },
    place(symbol) {
      const name = symbol.trim();
      if (!spot || !cell) setRefusal("Choose a syllable first.");
      else if (!parseChord(name)) setRefusal(`“${name}” cannot be read as a chord.`);
      else {
        const now = placeChord(plain, spot, name);
        if (now === null) setRefusal(`There is no room for ${glyphs(name)} here: another chord stands too near.`);
        else {
          follow(now, spot.column);
          return true;
        }
      }
      return false;
    },
    nudge(by) {
      const moved = spot && nudgeChord(plain, spot, by);
      if (!moved) setRefusal("It cannot go further: the next chord or the end of the line is there.");
      else follow(moved.text, moved.column);
    },
    remove() {
      const now = spot && removeChord(plain, spot);
      if (now === null) return;
      const column = spot?.column ?? 0;
      follow(now, column);
    },
  };
}
