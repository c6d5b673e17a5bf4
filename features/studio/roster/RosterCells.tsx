import { Link } from "expo-router";
import { memo, type CSSProperties, type ReactNode } from "react";
import { SpanBar } from "@/features/span/SpanBar";
import type { Scale } from "@/features/span/ladderGeometry";
import { setSigns } from "@/features/ui/textSigns";
import { BlankCell } from "@/features/ui/table/BlankCell";
import { cell } from "@/features/ui/table/tableStyles";
import { colors, fonts } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import type { RosterRow } from "@/shared/contract/studio/roster";
import { glyphs } from "@/shared/music/pitch";
import { plural } from "@/shared/music/countWords";
import { dayOf, dueWords } from "../dayWords";
import { partPath } from "../partWords";
import { EffortBars } from "./EffortBars";
import { assignedSpan, bandWords, pictureVoice, silence, tuningWords } from "./rosterWords";

export interface RosterCellsProps {
  row: RosterRow;
  scale: Scale;
  /** of the band's picture, px */
  width: number;
  now: Date;
}

/** What stands in a pupil's row of the table. Drawn once, however often the table is scrolled. */
export const RosterCells = memo(function RosterCells({ row, scale, width, now }: RosterCellsProps) {
  const silent = silence(row);
  return (
    <>
      <th scope="row" style={{ ...td, textAlign: "left", font: `600 15px/18px ${fonts.text}` }}>
        {row.name}
      </th>
      {silent !== null ? (
        <td colSpan={5} style={{ ...td, color: colors.inkSoft }}>
          {silent}
        </td>
      ) : (
        <>
          <td style={{ ...td, lineHeight: "16px" }}>
            {row.instrument ? (
              <>
                <span style={clip}>{row.instrument.name}</span>
                <span style={{ ...clip, font: `400 12px/14px ${fonts.text}`, color: colors.inkSoft }}>
                  {setSigns(tuningWords(row.instrument))}
                </span>
              </>
            ) : (
              <BlankCell words="no instrument yet" />
            )}
          </td>
          <td style={{ ...td, padding: 0, lineHeight: 0 }}>
            <Band row={row} scale={scale} width={width} />
          </td>
          <td style={td}>
            <Assigned row={row} now={now} />
          </td>
          <td style={td}>
            {row.lastTake ? (
              <span style={{ display: "flex", gap: 10, alignItems: "center", whiteSpace: "nowrap" }}>
                <EffortBars effort={row.lastTake.effort} />
                {dayOf(row.lastTake.at, now)}
              </span>
            ) : (
              <BlankCell words="no take yet" />
            )}
          </td>
          <td style={{ ...td, padding: 0, font: `500 13px/16px ${fonts.text}` }}>
            <LookAfter row={row} />
          </td>
        </>
      )}
    </>
  );
});

/** The voice with the newest song in it; words where no voice is known. */
export function Band({ row, scale, width }: Pick<RosterCellsProps, "row" | "scale" | "width">) {
  const voice = pictureVoice(row);
  if (!voice)
    return (
      <span style={{ font: `400 13px/40px ${fonts.text}`, color: colors.inkSoft, paddingLeft: 12 }}>
        no voice measured yet
      </span>
    );
  return <SpanBar tall voice={voice} span={assignedSpan(row)} scale={scale} width={width} words={bandWords(row)} />;
}

/** The newest open song in the pupil's key, and how many more there are. */
export function Assigned({ row, now }: Pick<RosterCellsProps, "row" | "now">) {
  const [newest] = row.open;
  if (!newest) return <BlankCell words="nothing assigned" />;
  const more = row.openCount - 1;
  return (
    <Link
      href={partPath(newest.partId)}
      style={webStyle({ display: "grid", gridTemplateColumns: "38px 1fr", color: colors.ink })}
    >
      <span style={{ font: `700 18px/20px ${fonts.display}` }}>{setSigns(glyphs(newest.tonic))}</span>
      <span style={{ minWidth: 0 }}>
        <span style={{ ...clip, font: `400 14px/18px ${fonts.text}` }}>{newest.title}</span>
        {(newest.dueOn !== null || more > 0) && (
          <span style={{ ...clip, font: `400 12px/14px ${fonts.text}`, color: colors.inkSoft }}>
            {[newest.dueOn && dueWords(newest.dueOn, now), more > 0 && `${more} more`].filter(Boolean).join(" · ")}
          </span>
        )}
      </span>
    </Link>
  );
}

/** What a teacher should know: takes that wait, and warnings. */
export function LookAfter({ row }: { row: RosterRow }) {
  const strained = row.lastTake?.effort === 5;
  const words: ReactNode[] = [];
  if (row.waiting > 0)
    words.push(
      <span key="waiting" style={{ color: colors.plum, display: "block" }}>
        {plural(row.waiting, "take")} to hear
      </span>,
    );
  for (const warning of row.warnings)
    words.push(
      <span key={warning} style={{ color: strained ? colors.brick : colors.honeyText, display: "block" }}>
        {setSigns(warning)}
      </span>,
    );
  return <>{words}</>;
}

const td: CSSProperties = { ...cell, height: 39 };
const clip: CSSProperties = { display: "block", overflow: "hidden", textOverflow: "ellipsis", whiteSpace: "nowrap" };
