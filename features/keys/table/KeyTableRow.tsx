import { useLayoutEffect, useRef, useState, type CSSProperties, type ReactNode, type RefObject } from "react";
import { Icon } from "@/features/ui/Icon";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { keySignParts } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import type { KeyRow, Room } from "../keyRows";
import { cell, firstColumn, secondColumn } from "./tableCells";
import type { TableColumns } from "./tableColumns";
import type { TableWay } from "./tableWays";

export interface KeyTableRowProps {
  row: KeyRow;
  /** name of the radio group */
  group: string;
  on: boolean;
  onSelect: () => void;
  pinned: boolean;
  /** whether one more key can be pinned */
  pinRoom: boolean;
  onPin: () => void;
  /** where the chords stand */
  chords: TableColumns["chords"];
  /** the best way to play it; undefined while it is searched, null where there is none */
  way: TableWay | null | undefined;
  /** what is said of the decided key */
  mark: string | null;
  /** the picture, for a row of this height */
  children: (height: number) => ReactNode;
}

const usualHeight = 51;

/** One key as a row of the table. Its picture is drawn as high as the words beside it make the row. */
export function KeyTableRow({
  row,
  group,
  on,
  onSelect,
  pinned,
  pinRoom,
  onPin,
  chords,
  way,
  mark,
  children,
}: KeyTableRowProps) {
  const [focused, setFocused] = useState(false);
  const line = useRef<HTMLTableRowElement>(null);
  const height = useHeight(line);
  const parts = keySignParts(row.key);
  const ground = on ? colors.card : colors.paper;
  const td: CSSProperties = { ...cell, background: ground, borderBottom: `1px solid ${colors.line}`, height: 50 };
  const faint = row.beyond ? colors.inkSoft : colors.ink;
  return (
    <tr ref={line} onClick={onSelect} style={{ cursor: "pointer" }} data-testid={`key-row-${row.key.tonic}`}>
      <td style={{ ...td, ...firstColumn, boxShadow: on ? `-12px 0 0 ${colors.card}` : undefined }}>
        {on && (
          <span
            style={{
              position: "absolute",
              left: -12,
              top: 0,
              bottom: 0,
              width: 4,
              borderRadius: 2,
              background: colors.plum,
            }}
          />
        )}
        <PinButton sign={row.sign} pinned={pinned} room={pinRoom} onPin={onPin} />
      </td>
      <th scope="row" style={{ ...td, ...secondColumn, textAlign: "left", fontWeight: 400 }}>
        <input
          type="radio"
          name={group}
          checked={on}
          onChange={onSelect}
          onFocus={() => setFocused(true)}
          onBlur={() => setFocused(false)}
          aria-label={`${row.sign}, ${row.moved}`}
          style={{
            position: "absolute",
            inset: 0,
            width: "100%",
            height: "100%",
            margin: 0,
            opacity: 0,
            cursor: "pointer",
          }}
        />
        <span
          style={{
            ...(focused ? { outline: `2px solid ${colors.plum}`, outlineOffset: 3, borderRadius: 4 } : null),
            display: "flex",
            flexWrap: "wrap",
            alignItems: "center",
            columnGap: 6,
          }}
        >
          <span style={{ font: `700 26px/1 ${fonts.display}`, minWidth: 36, color: faint }}>
            {setSigns(glyphs(parts.large))}
            {parts.mode !== "" && (
              <>
                <span aria-hidden style={{ font: `600 13px/1 ${fonts.display}`, color: colors.inkSoft }}>
                  {` ${parts.mode}`}
                </span>
                <span style={unseen}>{` ${row.key.mode}`}</span>
              </>
            )}
          </span>
          <span
            style={{
              font: `500 12px/13px ${fonts.text}`,
              color: colors.inkSoft,
              flex: parts.mode === "" ? "1 1 40px" : "1 0 100%",
              paddingRight: 6,
            }}
          >
            {row.moved}
            {mark !== null && (
              <strong style={{ display: "block", fontWeight: 600, color: colors.plum }}>
                {`${mark.charAt(0).toUpperCase()}${mark.slice(1)}`}
              </strong>
            )}
          </span>
        </span>
      </th>
      <td style={td}>
        <div style={{ display: "grid", gridTemplateColumns: "46px 1fr", alignItems: "center" }}>
          <span
            data-testid="key-score"
            style={{
              font: `${on ? 700 : 600} ${on ? 26 : 20}px/1 ${fonts.display}`,
              color: row.beyond ? colors.brick : on ? colors.lagoon : colors.ink,
            }}
          >
            {row.score}
          </span>
          <span
            style={{ font: `400 13px/16px ${fonts.text}`, color: on ? colors.ink : colors.inkSoft, paddingRight: 12 }}
          >
            {setSigns(row.reason.replace(/\.$/, ""))}
          </span>
        </div>
      </td>
      <td style={{ ...td, padding: 0, lineHeight: 0, position: "relative" }}>
        <div style={{ position: "absolute", left: 0, top: 0 }}>{children(height)}</div>
      </td>
      <RoomCell room={row.below} style={td} strong={on} />
      <RoomCell room={row.above} style={td} strong={on} />
      {chords === "own" && (
        <td style={{ ...td, paddingLeft: 8 }}>
          <Chords names={row.chords} on={on} color={faint} />
        </td>
      )}
      {chords !== "none" && (
        <td style={chords === "own" ? td : { ...td, paddingLeft: 8 }}>
          {chords === "folded" && <Chords names={row.chords} on={on} color={faint} />}
          <BestWay way={way} on={on} color={faint} />
        </td>
      )}
    </tr>
  );
}

/** Height of a row, its lower rule left out; the usual one until it is measured. */
function useHeight(line: RefObject<HTMLTableRowElement | null>): number {
  const [height, setHeight] = useState(usualHeight);
  useLayoutEffect(() => {
    const element = line.current;
    if (!element || typeof ResizeObserver === "undefined") return;
    const observer = new ResizeObserver(() => setHeight(Math.max(usualHeight, element.offsetHeight)));
    observer.observe(element);
    return () => observer.disconnect();
  }, [line]);
  return height;
}

function Chords({ names, on, color }: { names: readonly string[]; on: boolean; color: string }) {
  return (
    <div
      data-mono
      style={{
        display: "flex",
        flexWrap: "wrap",
        columnGap: 8,
        paddingRight: 8,
        font: `${on ? 600 : 400} 14px/18px ${fonts.mono}`,
        color,
        whiteSpace: "nowrap",
      }}
    >
      {names.map((chord) => (
        <span key={chord} style={{ minWidth: 30 }}>
          {setSigns(chord)}
        </span>
      ))}
    </div>
  );
}

interface PinButtonProps {
  sign: string;
  pinned: boolean;
  room: boolean;
  onPin: () => void;
}

function PinButton({ sign, pinned, room, onPin }: PinButtonProps) {
  const full = !pinned && !room;
  const what = pinned ? `Unpin ${sign}` : `Pin ${sign} to compare it`;
  return (
    <button
      type="button"
      aria-pressed={pinned}
      aria-disabled={full || undefined}
      aria-label={`Pin ${sign}`}
      title={full ? `Four keys are pinned, the most there can be. Unpin one to pin ${sign}.` : what}
      data-testid={`pin-${sign}`}
      onClick={(event) => {
        event.stopPropagation();
        if (!full) onPin();
      }}
      style={{ ...pin, color: pinned ? colors.plum : colors.inkSoft, opacity: full ? 0.45 : 1 }}
    >
      <Icon name={pinned ? "bookmarkFilled" : "bookmark"} size={20} />
    </button>
  );
}

const pin: CSSProperties = {
  background: "none",
  border: 0,
  padding: 0,
  width: 28,
  height: 48,
  cursor: "pointer",
  display: "flex",
  alignItems: "center",
};

function BestWay({ way, on, color }: { way: TableWay | null | undefined; on: boolean; color: string }) {
  if (way === undefined)
    return (
      <span style={{ display: "block", height: 12, width: 120, borderRadius: 6, background: colors.line }}>
        <span style={unseen}>Searching</span>
      </span>
    );
  if (way === null) return <span style={{ color: colors.inkSoft }}>None found</span>;
  return (
    <>
      <span style={{ display: "block", font: `${on ? 600 : 500} 14px/17px ${fonts.text}`, color }}>
        {setSigns(way.title)}
      </span>
      <span style={{ display: "block", font: `400 12px/15px ${fonts.text}`, color: colors.inkSoft }}>{way.cost}</span>
    </>
  );
}

function RoomCell({ room, style, strong }: { room: Room; style: CSSProperties; strong: boolean }) {
  const color = { ink: colors.ink, honey: colors.honeyText, brick: colors.brick }[room.tone];
  return (
    <td style={{ ...style, textAlign: "center", font: `${strong ? 600 : 400} 14px/1 ${fonts.mono}`, color }}>
      {room.text}
    </td>
  );
}
