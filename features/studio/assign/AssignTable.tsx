import { memo, useMemo, type CSSProperties } from "react";
import { SpanScale } from "@/features/span/SpanScale";
import { stripX } from "@/features/span/VoiceStrip";
import { ShownRows } from "@/features/ui/table/ShownRows";
import { cell, stuckHead, table } from "@/features/ui/table/tableStyles";
import { useContentRoom } from "@/features/ui/table/useContentRoom";
import { useShownRows } from "@/features/ui/table/useShownRows";
import { fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { useLayout } from "@/features/ui/useLayout";
import { bandsWidth, rosterScale } from "../roster/rosterScale";
import { GiveTick, OneKey, PartBand, PartFit, PartKey, PartNote, PartWay } from "./AssignCells";
import { AssignList } from "./AssignList";
import type { AssignRowsProps, AssignTableProps, CellsProps } from "./assignRows";

/** Every pupil with key and way as proposed; what is changed here is what is given. */
export function AssignTable(props: AssignTableProps) {
  const wide = useLayout() === "wide";
  const scale = useMemo(
    () => rosterScale(props.parts.map(({ row }) => ({ voice: row.voice, open: [] }))),
    [props.parts],
  );
  return wide ? <Wide {...props} scale={scale} /> : <AssignList {...props} scale={scale} />;
}

/** px: tick, pupil, key, fit, note; band and way share the rest. */
const columns = { tick: 48, pupil: 140, key: 140, fit: 176, note: 84 } as const;
const taken = Object.values(columns).reduce((sum, each) => sum + each, 0);

function Wide({ parts, ways, onDraft, oneKey = false, scale }: AssignRowsProps) {
  const keys = useMemo(() => parts.map(({ row }) => row.memberId), [parts]);
  const { frame, ...shown } = useShownRows(keys, 57);
  const room = useContentRoom();
  const width = bandsWidth(scale, Math.max(200, Math.min(340, room - taken - 250)));
  return (
    <div ref={frame}>
      <table style={table} aria-rowcount={parts.length + 1} data-testid="assign-table">
        <caption style={unseen}>The pupils, each with the key and the way that they get</caption>
        <colgroup>
          {!oneKey && <col style={{ width: columns.tick }} />}
          {[columns.pupil, width + 12, columns.key, columns.fit, null].map((each, k) => (
            <col key={k} style={each === null ? {} : { width: each }} />
          ))}
          {!oneKey && <col style={{ width: columns.note }} />}
        </colgroup>
        <thead>
          <tr aria-rowindex={1}>
            {!oneKey && (
              <th scope="col" style={stuckHead}>
                <span style={unseen}>Chosen</span>
              </th>
            )}
            <th scope="col" style={stuckHead}>
              Pupil
            </th>
            <th scope="col" style={stuckHead}>
              <span style={unseen}>The song in the voice</span>
              <SpanScale full scale={scale} width={width} x={(midi) => stripX(midi, scale, width)} />
            </th>
            <th scope="col" style={stuckHead}>
              Key
            </th>
            <th scope="col" style={stuckHead}>
              How it lies
            </th>
            <th scope="col" style={stuckHead}>
              Way
            </th>
            {!oneKey && (
              <th scope="col" style={stuckHead}>
                <span style={unseen}>Note</span>
              </th>
            )}
          </tr>
        </thead>
        <ShownRows {...shown} testID="assign-row">
          {(index) => {
            const part = parts[index];
            return part ? (
              <Cells
                part={part}
                ways={ways.get(part.row.memberId)}
                onDraft={onDraft}
                oneKey={oneKey}
                scale={scale}
                width={width}
              />
            ) : null;
          }}
        </ShownRows>
      </table>
    </div>
  );
}

const Cells = memo(function Cells({ part, ways, onDraft, oneKey, scale, width }: CellsProps) {
  const { row, draft } = part;
  return (
    <>
      {!oneKey && (
        <td style={td}>
          <GiveTick part={part} onDraft={onDraft} />
        </td>
      )}
      <th scope="row" style={{ ...td, textAlign: "left", font: `600 15px/18px ${fonts.text}` }}>
        {row.name}
      </th>
      <td style={{ ...td, lineHeight: 0 }}>
        <PartBand part={part} scale={scale} width={width} />
      </td>
      <td style={td}>{oneKey ? <OneKey part={part} /> : draft.chosen && <PartKey part={part} onDraft={onDraft} />}</td>
      <td style={td}>{draft.chosen && <PartFit part={part} />}</td>
      <td style={td}>{draft.chosen && <PartWay part={part} ways={ways} onDraft={onDraft} />}</td>
      {!oneKey && <td style={td}>{draft.chosen && <PartNote part={part} onDraft={onDraft} />}</td>}
    </>
  );
});

const td: CSSProperties = { ...cell, height: 56 };
