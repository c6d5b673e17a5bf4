import type { CSSProperties } from "react";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { numberGlyphs } from "@/shared/coach/degrees";
import type { NumberedChord } from "@/shared/coach/numberedChords";
import { glyphs } from "@/shared/music/pitch";

export interface ChordTableProps {
  chords: readonly NumberedChord[];
  /** heads of the two columns of chords, such as "in D" and "in C" */
  from: string;
  to: string;
}

/** The song's chords by number, as written and in the new key. */
export function ChordTable({ chords, from, to }: ChordTableProps) {
  return (
    <table style={table}>
      <caption style={unseen}>{setSigns(`The chords by number, ${from} and ${to}`)}</caption>
      <thead>
        <tr>
          {["number", "plainly", from, to].map((head) => (
            <th key={head} scope="col" style={headCell}>
              {setSigns(head)}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {chords.map(({ written, sounding, roman, plain }) => (
          <tr key={written}>
            <th scope="row" style={{ ...cell, fontWeight: 600, color: colors.plum }} data-mono>
              {setSigns(numberGlyphs(roman))}
            </th>
            <td style={{ ...cell, color: colors.inkSoft }} data-mono>
              {setSigns(numberGlyphs(plain))}
            </td>
            <td style={cell} data-mono>
              {setSigns(glyphs(written))}
            </td>
            <td style={{ ...cell, fontWeight: 600 }} data-mono>
              {setSigns(glyphs(sounding))}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const table: CSSProperties = { width: "100%", maxWidth: 420, borderCollapse: "collapse", color: colors.ink };
const headCell: CSSProperties = {
  font: `500 12px/16px ${fonts.text}`,
  color: colors.inkSoft,
  textAlign: "left",
  padding: "4px 8px 4px 0",
  borderBottom: `1.5px solid ${colors.ink}`,
};
const cell: CSSProperties = {
  font: `400 15px/20px ${fonts.mono}`,
  textAlign: "left",
  padding: "6px 8px 6px 0",
  borderBottom: `1px solid ${colors.line}`,
};
