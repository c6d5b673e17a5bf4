import { memo, startTransition, useEffect, useRef, useState, type CSSProperties, type KeyboardEvent } from "react";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { glyphs } from "@/shared/music/pitch";
import { cellWords, type PlaceCell, type PlaceItem, type PlaceLine } from "./placeLines";
import type { Placing } from "./usePlacing";

/** So many lines are drawn in one go. */
const atOnce = 60;

/** The words as syllables to touch. Arrow keys go from one to the next, figures place the chords of the palette. */
export function PlaceChords({ placing, onDone }: { placing: Placing; onDone: () => void }) {
  const { items, spot, choose, place, nudge, remove, palette } = placing;
  const [grown, setGrown] = useState(atOnce);
  const box = useRef<HTMLDivElement>(null);
  const grows = grown < items.length;
  useEffect(() => {
    if (grows) startTransition(() => setGrown(grown + atOnce));
  }, [grows, grown]);
  const latest = useRef(choose);
  useEffect(() => {
    latest.current = choose;
  });
  const [onChoose] = useState(() => (row: number, column: number) => latest.current({ row, column }));

  const chosen = spot ? `${spot.row}:${spot.column}` : null;
  useEffect(() => {
    // After a change the place may have got another line: the focus goes with it.
    const held = document.activeElement;
    if (chosen === null || !(held === document.body || box.current?.contains(held))) return;
    box.current?.querySelector<HTMLElement>(`[data-spot="${chosen}"]`)?.focus();
  }, [chosen, items]);

  const keys = (event: KeyboardEvent) => {
    const all = [...(box.current?.querySelectorAll<HTMLElement>("[data-spot]") ?? [])];
    const at = all.indexOf(event.target as HTMLElement);
    const step = event.key === "ArrowRight" ? 1 : event.key === "ArrowLeft" ? -1 : 0;
    const line = event.key === "ArrowDown" ? 1 : event.key === "ArrowUp" ? -1 : 0;
    const figure = /^[1-9]$/.test(event.key) ? Number(event.key) : 0;
    if (at < 0 || event.ctrlKey || event.metaKey) return;
    if (step !== 0 && event.altKey) nudge(step);
    else if (step !== 0) all[at + step]?.focus();
    else if (line !== 0) nextLine(all, at, line)?.focus();
    else if (figure > 0) {
      const chord = [...palette.own, ...palette.others][figure - 1];
      if (chord) place(chord.text);
    } else if (event.key === "Delete" || event.key === "Backspace") remove();
    else if (event.key === "Escape") onDone();
    else return;
    event.preventDefault();
  };

  const first = items.find((item): item is PlaceLine => item.kind === "line");
  if (!first)
    return (
      <Text tone="soft" testID="place-chords">
        There are no words yet. Paste or type them first, then put the chords over them here.
      </Text>
    );
  const entry = chosen ?? `${first.row}:${first.words[0]?.[0]?.column ?? 0}`;
  return (
    <div
      ref={box}
      data-testid="place-chords"
      role="group"
      aria-label="Words to put chords over. Arrow keys move, figures 1 to 9 place a chord, Delete takes it away, Alt and an arrow moves it."
      onKeyDown={keys}
      style={{ display: "flex", flexDirection: "column", gap: 4 }}
    >
      {items.slice(0, grown).map((item, index) => (
        <Item
          key={index}
          item={item}
          chosen={spot !== null && item.kind === "line" && item.row === spot.row ? spot.column : null}
          entry={item.kind === "line" && entry.startsWith(`${item.row}:`) ? Number(entry.split(":")[1]) : null}
          onChoose={onChoose}
        />
      ))}
    </div>
  );
}

/** The place nearest below or above: the same number along the line, as far as there are so many. */
function nextLine(all: readonly HTMLElement[], at: number, by: number): HTMLElement | undefined {
  const rowOf = (node: HTMLElement | undefined) => node?.dataset.spot?.split(":")[0];
  const here = rowOf(all[at]);
  const along = all.slice(0, at).filter((node) => rowOf(node) === here).length;
  let next = at;
  while (rowOf(all[next]) === here && next >= 0 && next < all.length) next += by;
  const row = rowOf(all[next]);
  const line = all.filter((node) => row !== undefined && rowOf(node) === row);
  return line[Math.min(along, line.length - 1)];
}

interface ItemProps {
  item: PlaceItem;
  chosen: number | null;
  entry: number | null;
  onChoose: (row: number, column: number) => void;
}

const Item = memo(
  function Item({ item, chosen, entry, onChoose }: ItemProps) {
    if (item.kind === "heading")
      return (
        <View style={{ marginTop: 12 }}>
          <Heading level={2} size={14} style={{ color: colors.inkSoft, fontWeight: "600", letterSpacing: 0 }}>
            {item.text}
          </Heading>
        </View>
      );
    if (item.kind === "remark")
      return (
        <Text variant="small" tone="soft" style={{ fontStyle: "italic" }}>
          {item.text}
        </Text>
      );
    return (
      <div style={lineStyle}>
        {item.words.map((word) => (
          <span key={word[0]!.column} style={wordStyle}>
            {word.map((cell) => (
              <Cell
                key={cell.column}
                cell={cell}
                row={item.row}
                chosen={cell.column === chosen}
                reachable={cell.column === entry}
                onChoose={onChoose}
              />
            ))}
          </span>
        ))}
      </div>
    );
  },
  (before, now) =>
    before.chosen === now.chosen &&
    before.entry === now.entry &&
    (before.item === now.item || JSON.stringify(before.item) === JSON.stringify(now.item)),
);

const lineStyle: CSSProperties = { display: "flex", flexWrap: "wrap", alignItems: "flex-end", columnGap: 8, rowGap: 4 };
const wordStyle: CSSProperties = { display: "inline-flex", flexWrap: "wrap", maxWidth: "100%" };

interface CellProps {
  cell: PlaceCell;
  row: number;
  chosen: boolean;
  reachable: boolean;
  onChoose: (row: number, column: number) => void;
}

function Cell({ cell, row, chosen, reachable, onChoose }: CellProps) {
  const { chord, text, column } = cell;
  const fixed = chord !== null && (chord.kind === "bar" || chord.kind === "repeat" || chord.kind === "beat");
  const over: CSSProperties = {
    font: `600 16px/22px ${fonts.mono}`,
    color: chord?.kind === "unread" ? colors.honeyText : fixed ? colors.inkSoft : colors.plum,
    minHeight: 22,
    whiteSpace: "pre",
  };
  const under: CSSProperties = {
    font: `400 17px/24px ${fonts.mono}`,
    minHeight: 24,
    borderBottom: `1.5px ${chosen ? "solid" : "dotted"} ${chosen ? colors.plum : colors.inkSoft}`,
  };
  const face = (
    <>
      <span style={over}>{chord ? setSigns(glyphs(chord.text)) : ""}</span>
      {fixed ? null : <span style={under}>{text === "" ? "\u00a0" : setSigns(text)}</span>}
    </>
  );
  if (fixed) return <span style={{ ...cellStyle, ...faceStyle, cursor: "default" }}>{face}</span>;
  return (
    <button
      type="button"
      data-spot={`${row}:${column}`}
      aria-pressed={chosen}
      tabIndex={reachable ? 0 : -1}
      onFocus={() => onChoose(row, column)}
      onClick={() => onChoose(row, column)}
      style={{ ...cellStyle, ...(chosen ? { background: "var(--tint)", outline: `2px solid ${colors.plum}` } : null) }}
    >
      <span aria-hidden style={faceStyle}>
        {face}
      </span>
      <span style={unseen}>{cellWords(cell, row)}</span>
    </button>
  );
}

const faceStyle: CSSProperties = { display: "inline-flex", flexDirection: "column", alignItems: "stretch" };

const cellStyle: CSSProperties = {
  position: "relative",
  display: "inline-flex",
  flexDirection: "column",
  justifyContent: "flex-end",
  alignItems: "stretch",
  textAlign: "start",
  minHeight: 52,
  minWidth: 28,
  padding: "2px 2px 3px",
  border: 0,
  borderRadius: 8,
  background: "transparent",
  color: colors.ink,
  cursor: "pointer",
};
