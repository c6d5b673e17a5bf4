import type { CSSProperties, ReactNode } from "react";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { StrokeLine } from "@/features/ui/StrokeLine";
import { glyphs } from "@/shared/music/pitch";
import { placeWords } from "@/shared/ways/arrangements/arrangementWords";
import { sheetStrokes } from "@/shared/sheets/sheetStrokes";
import { PlayedGrid } from "../PlayedGrid";
import { arrangementPlan, effortWords, metreFor, tunedStrings } from "./arrangementDraft";
import type { ArrangementEntry } from "./arrangementEntry";
import { HearButton } from "./HearButton";
import type { HearingDesk } from "./hearingDesk";

export interface CompareTableProps {
  /** two or more */
  entries: readonly ArrangementEntry[];
  desk: HearingDesk;
}

/** Arrangements side by side, chord by chord; scrolls sideways in its own box where there is no room. */
export function CompareTable({ entries, desk }: CompareTableProps) {
  const written = [...new Set(entries.flatMap(({ draft }) => draft.chords.map((chord) => chord.written)))];
  const row = (name: string, of: (entry: ArrangementEntry) => ReactNode, key = name) => (
    <tr key={key}>
      <th scope="row" style={{ ...cell, ...lead }}>
        {setSigns(name)}
      </th>
      {entries.map((entry) => (
        <td key={entry.id} style={cell}>
          {of(entry)}
        </td>
      ))}
    </tr>
  );
  return (
    <div
      data-testid="arrangements-compared"
      role="region"
      tabIndex={0}
      aria-label="Arrangements side by side, scrolls sideways"
      style={{ overflowX: "auto", border: `1px solid ${colors.line}`, borderRadius: 14, background: colors.card }}
    >
      <table style={{ borderCollapse: "collapse", minWidth: "100%" }}>
        <thead>
          <tr>
            <td style={{ ...cell, ...lead }} />
            {entries.map(({ id, draft }) => (
              <th key={id} scope="col" style={{ ...cell, font: `700 16px/20px ${fonts.display}`, minWidth: 200 }}>
                {setSigns(draft.name)}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {row("The hand", ({ weight }) => setSigns(effortWords(weight)))}
          {row("Where", ({ weight, on }) => setSigns(placeWords(weight, tunedStrings(on.instrument, on.way.retune))))}
          {written.map((name) =>
            row(
              `${glyphs(name)} in the chart`,
              ({ draft, on: { instrument, way } }) => {
                const chord = draft.chords.find((each) => each.written === name);
                return chord ? (
                  <div style={{ width: "fit-content" }}>
                    <PlayedGrid
                      chord={chord}
                      instrument={instrument}
                      capo={way.capo}
                      tuned={tunedStrings(instrument, way.retune)}
                      moved={way.retune !== 0 || way.capo !== 0}
                    />
                  </div>
                ) : (
                  "Not in it."
                );
              },
              `chord ${name}`,
            ),
          )}
          {row("Right hand", ({ draft, on }) => (
            <StrokeLine strokes={sheetStrokes(draft.pattern, metreFor(on.song))} width={190} />
          ))}
          {row("Sound", ({ id, draft, on }) => (
            <HearButton desk={desk} id={id} plan={() => arrangementPlan(draft, on)} label={draft.name} small />
          ))}
        </tbody>
      </table>
    </div>
  );
}

const cell: CSSProperties = {
  padding: "10px 14px",
  borderBottom: `1px solid ${colors.line}`,
  textAlign: "left",
  verticalAlign: "top",
  font: `400 14px/20px ${fonts.text}`,
  color: colors.ink,
};
const lead: CSSProperties = {
  position: "sticky",
  left: 0,
  background: colors.card,
  font: `600 14px/20px ${fonts.text}`,
  color: colors.inkSoft,
  minWidth: 64,
  zIndex: 1,
};
