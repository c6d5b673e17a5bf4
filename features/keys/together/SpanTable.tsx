import type { CSSProperties } from "react";
import { KeySpan } from "@/features/span/KeySpan";
import { keySpanWidth, keySpanX } from "@/features/span/keySpanGeometry";
import { head, table } from "@/features/ui/table/tableStyles";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { spellingIn } from "../keyRows";
import type { GroupKey } from "./groupKey";
import { octaveNote } from "./groupWords";
import { groupScale } from "./groupScale";
import { SpanScale } from "@/features/span/SpanScale";

const widths = { name: 140, score: 60, words: 270 } as const;
const rowHeight = 51;

export interface SpanTableProps {
  picked: GroupKey;
  /** px that the table may take */
  room: number;
}

/** Wide: each singer as a row, the tune over its own band, all on one scale. */
export function SpanTable({ picked, room }: SpanTableProps) {
  const scale = groupScale(picked);
  const step = Math.min(14.4, (room - widths.name - widths.score - widths.words) / keySpanWidth(scale, 1));
  const width = keySpanWidth(scale, step);
  return (
    <table data-testid="span-table" style={table}>
      <caption style={unseen}>{`The tune in ${picked.sign} against each voice`}</caption>
      <thead>
        <tr>
          <th scope="col" style={{ ...th, width: widths.name }}>
            Singer
          </th>
          <th scope="col" style={{ ...th, width, padding: 0 }}>
            <span style={unseen}>Span of the tune against the voice</span>
            <SpanScale scale={scale} width={width} x={(midi) => keySpanX(midi, scale, step)} />
          </th>
          <th scope="col" style={{ ...th, width: widths.score, textAlign: "center" }}>
            Score
          </th>
          <th scope="col" style={th}>
            How it lies
          </th>
        </tr>
      </thead>
      <tbody>
        {picked.parts.map((part) => (
          <tr key={part.id} data-testid="span-row">
            <th scope="row" style={{ ...td, textAlign: "left", paddingRight: 12 }}>
              <span style={{ display: "block", font: `600 15px/18px ${fonts.text}`, overflowWrap: "anywhere" }}>
                {setSigns(part.name)}
              </span>
              {part.octaves !== 0 && (
                <span style={{ font: `500 13px/16px ${fonts.text}`, color: colors.inkSoft }}>
                  {octaveNote(part.octaves)}
                </span>
              )}
            </th>
            <td style={{ ...td, lineHeight: 0 }}>
              <KeySpan
                voice={part.voice}
                marks={part.marks}
                scale={scale}
                perSemitone={step}
                height={rowHeight}
                spelling={spellingIn(picked.key)}
              />
            </td>
            <td
              style={{
                ...td,
                textAlign: "center",
                font: `600 20px/1 ${fonts.display}`,
                color: part.fit === "beyond" ? colors.brick : colors.ink,
              }}
            >
              {Math.round(part.score)}
            </td>
            <td style={{ ...td, font: `400 14px/18px ${fonts.text}`, color: toneOf[part.fit], paddingLeft: 4 }}>
              {setSigns(part.words)}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const toneOf = { comfort: colors.inkSoft, reach: colors.honeyText, beyond: colors.brick } as const;
const th: CSSProperties = { ...head, borderBottom: `1.5px solid ${colors.ink}`, padding: "0 0 8px" };
const td: CSSProperties = {
  padding: 0,
  borderBottom: `1px solid ${colors.line}`,
  boxSizing: "border-box",
  height: rowHeight + 1,
  verticalAlign: "middle",
};
