import type { CSSProperties } from "react";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import { gaugeWords } from "@/shared/instruments/units";
import { glyphs } from "@/shared/music/pitch";
import type { RetuneRowsProps } from "./retuneRowsProps";
import { pullWords } from "./retuneWords";
import { ShiftStepper } from "./ShiftStepper";
import { VerdictLine } from "./VerdictLine";

const headings = ["String", "Shift", "To", "Gauge", "Before", "After", "Verdict"];

/** The strings on a wide page: one table. */
export function RetuneTable({ plan, units, onChange }: RetuneRowsProps) {
  return (
    <table style={{ width: "100%", borderCollapse: "collapse" }} aria-label="Tension of each string">
      <thead>
        <tr>
          {headings.map((heading) => (
            <th key={heading} scope="col" style={head}>
              {heading}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {plan.changes.map((change, index) => (
          <tr key={index} data-testid={`retune-string-${index}`} style={{ borderBottom: `1px solid ${colors.line}` }}>
            <th scope="row" style={{ ...cell, fontWeight: 400 }}>
              <Text variant="strong">{glyphs(change.string)}</Text>
              {change.strings > 1 && <Text variant="tiny" tone="soft">{` ${change.strings} together`}</Text>}
            </th>
            <td style={cell}>
              <ShiftStepper
                name={`string ${index + 1}, ${glyphs(change.string)}`}
                value={change.semitones}
                onChange={(to) => onChange(index, to)}
                testID={`shift-${index}`}
              />
            </td>
            <td style={cell}>
              <Text variant="strong">{glyphs(change.to)}</Text>
            </td>
            <td style={cell}>
              <Text variant="small">{change.gaugeIn === null ? "not known" : gaugeWords(change.gaugeIn, units)}</Text>
            </td>
            <td style={cell}>
              <Text variant="small">{pullWords(change.beforeLb, units)}</Text>
            </td>
            <td style={cell}>
              <Text variant="small">{pullWords(change.afterLb, units)}</Text>
            </td>
            <td style={cell}>
              <VerdictLine change={change} />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const head: CSSProperties = {
  textAlign: "left",
  font: `500 13px/18px ${fonts.text}`,
  color: colors.inkSoft,
  padding: "8px 12px 8px 0",
  borderBottom: `1.5px solid ${colors.ink}`,
};
const cell: CSSProperties = { textAlign: "left", padding: "2px 12px 2px 0", verticalAlign: "middle" };
