import { useId, type CSSProperties, type ReactNode } from "react";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { PartFacts } from "@/shared/keys/partFacts";
import { spellingIn, type KeyRow } from "../keyRows";
import { partNames } from "../partWords";
import { CompareHead } from "./CompareHead";
import { CompareLead, CompareSpan } from "./CompareSpan";
import { compareColumns, compareScale } from "./compareGeometry";
import { partInWords, whyNotOneHigher } from "./compareWords";
import { PartBar } from "./PartBar";

export interface CompareTableProps {
  /** the keys side by side */
  rows: readonly KeyRow[];
  /** all twelve: a key is compared with the one a semitone higher */
  all: readonly KeyRow[];
  /** on whole semitones */
  voice: SingingVoice;
  /** px there are for the whole */
  room: number;
  selected: KeyRow;
  onSelect: (row: KeyRow) => void;
  onUnpin: (row: KeyRow) => void;
  markOf: (row: KeyRow) => string | null;
  /** where ways are played: the list of instruments; null where the song has no chords */
  chooser: ReactNode | null;
  /** the best way into a key with its grids */
  wayOf: (row: KeyRow) => ReactNode;
  /** what each part of a key's score has measured */
  factsOf: (row: KeyRow) => PartFacts;
  /** all chords of the song in a key, with glyphs */
  chordsOf: (row: KeyRow) => readonly string[];
  /** what was sung in a key */
  takesOf: (row: KeyRow) => ReactNode;
}

/** Up to four keys in full, one a column: scores with their reasons, spans on one ladder, parts, chords and ways. */
export function CompareTable({
  rows,
  all,
  voice,
  room,
  selected,
  onSelect,
  onUnpin,
  markOf,
  chooser,
  wayOf,
  factsOf,
  chordsOf,
  takesOf,
}: CompareTableProps) {
  const group = useId();
  const { lead, each, total } = compareColumns(room, rows.length);
  const scale = compareScale(rows, voice);
  const scrolls = total > room;
  const cells = (of: (row: KeyRow, index: number) => ReactNode, style: CSSProperties = {}) =>
    rows.map((row, index) => (
      <td key={row.shift} style={{ ...td, ...style }}>
        {of(row, index)}
      </td>
    ));
  return (
    <div
      data-testid="compare"
      style={{
        overflowX: scrolls ? "auto" : "visible",
        position: "relative",
        // Scrolled past, a key must not show at the left of the names.
        marginRight: scrolls ? -16 : 0,
      }}
      {...(scrolls ? { tabIndex: 0, role: "region", "aria-label": "Keys side by side, scrolls sideways" } : null)}
    >
      <table
        style={{
          width: total,
          tableLayout: "fixed",
          borderCollapse: "separate",
          borderSpacing: 0,
          font: `400 14px/20px ${fonts.text}`,
          color: colors.ink,
        }}
      >
        <caption style={unseen}>{`${rows.map(({ sign }) => sign).join(", ")} side by side`}</caption>
        <colgroup>
          <col style={{ width: lead }} />
          {rows.map(({ shift }) => (
            <col key={shift} style={{ width: each }} />
          ))}
        </colgroup>
        <thead>
          <tr>
            <td style={{ ...td, ...first, borderBottom: strong }} />
            {rows.map((row) => (
              <CompareHead
                key={row.shift}
                row={row}
                group={group}
                on={row === selected}
                onSelect={() => onSelect(row)}
                onUnpin={() => onUnpin(row)}
                mark={markOf(row)}
              />
            ))}
          </tr>
        </thead>
        <tbody>
          <tr>
            <th scope="row" style={{ ...td, ...first, padding: 0, borderBottom: strong }}>
              <span style={unseen}>Span of the tune against your voice</span>
              <CompareLead voice={voice} scale={scale} width={lead} />
            </th>
            {cells(
              (row, index) => (
                <div style={index === 0 ? undefined : { boxShadow: `inset 1px 0 0 ${colors.line}` }}>
                  <CompareSpan row={row} voice={voice} scale={scale} width={each} />
                </div>
              ),
              { padding: 0, borderBottom: strong },
            )}
          </tr>
          {partNames.map(({ part, name }, index) => (
            <tr key={part}>
              <th scope="row" style={{ ...td, ...first, ...label, ...(index === 0 ? { paddingTop: 10 } : null) }}>
                {name}
              </th>
              {cells(
                (row) => (
                  <PartBar
                    part={part}
                    points={row.parts[part]}
                    width={each - 40}
                    words={partInWords(part, factsOf(row), spellingIn(row.key), row.beyond)}
                  />
                ),
                index === 0 ? { paddingTop: 10 } : {},
              )}
            </tr>
          ))}
          <tr>
            <th scope="row" style={{ ...td, ...first, ...label, ...ruled }}>
              Why not one higher?
            </th>
            {cells((row) => setSigns(whyNotOneHigher(row, all) ?? "It is not known."), ruled)}
          </tr>
          {chooser !== null && (
            <>
              <tr>
                <th scope="row" style={{ ...td, ...first, ...label, ...ruled }}>
                  Chords
                </th>
                {cells(
                  (row) => (
                    <div data-mono style={chordLine}>
                      {chordsOf(row).map((chord) => (
                        <span key={chord} style={{ minWidth: 36 }}>
                          {setSigns(chord)}
                        </span>
                      ))}
                    </div>
                  ),
                  ruled,
                )}
              </tr>
              <tr>
                <th scope="row" style={{ ...td, ...first, ...label, ...ruled }}>
                  <span style={{ display: "block" }}>Best way</span>
                  {chooser}
                </th>
                {cells(wayOf, ruled)}
              </tr>
            </>
          )}
          <tr>
            <th scope="row" style={{ ...td, ...first, ...label, ...ruled }}>
              <span style={{ display: "block" }}>Takes tried</span>
              <span style={{ fontWeight: 400, fontSize: 13 }}>and how they felt</span>
            </th>
            {cells(takesOf, ruled)}
          </tr>
        </tbody>
      </table>
    </div>
  );
}

const strong = `1.5px solid ${colors.ink}`;
const td: CSSProperties = { padding: "3px 20px", boxSizing: "border-box", verticalAlign: "top", textAlign: "left" };
const first: CSSProperties = {
  position: "sticky",
  left: 0,
  zIndex: 1,
  background: colors.paper,
  padding: "3px 8px 3px 0",
};
const label: CSSProperties = { font: `500 14px/20px ${fonts.text}`, color: colors.inkSoft };
const ruled: CSSProperties = { borderTop: `1px solid ${colors.line}`, paddingTop: 8, paddingBottom: 8 };
const chordLine: CSSProperties = {
  display: "flex",
  flexWrap: "wrap",
  columnGap: 22,
  font: `600 16px/20px ${fonts.mono}`,
};
