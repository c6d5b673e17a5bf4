import { memo, useMemo, useState, type CSSProperties } from "react";
import { useWindowDimensions, View } from "react-native";
import type { Scale } from "@/features/span/ladderGeometry";
import { SpanScale } from "@/features/span/SpanScale";
import { stripX } from "@/features/span/VoiceStrip";
import { Text } from "@/features/ui/Text";
import { colors, fonts, sizes } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { useLayout } from "@/features/ui/useLayout";
import { useShownRows } from "@/features/ui/useShownRows";
import type { Way } from "@/shared/ways/way";
import { Tick } from "../PupilTicks";
import { bandsWidth, rosterScale } from "../roster/rosterScale";
import { PartBand, PartFit, PartKey, PartNote, PartWay, type PartCellProps } from "./AssignCells";
import type { PupilPart } from "./pupilParts";

export interface AssignTableProps {
  parts: readonly PupilPart[];
  ways: ReadonlyMap<string, readonly Way[] | null | undefined>;
  onDraft: PartCellProps["onDraft"];
}

const nothing = () => undefined;

/** Every pupil with key and way as proposed; what is changed here is what is given. */
export function AssignTable(props: AssignTableProps) {
  const wide = useLayout() === "wide";
  const scale = useMemo(
    () => rosterScale(props.parts.map(({ row }) => ({ voice: row.voice, open: [] }))),
    [props.parts],
  );
  return wide ? <Wide {...props} scale={scale} /> : <Narrow {...props} scale={scale} />;
}

/** px: tick, pupil, key, fit, note; band and way share the rest. */
const columns = { tick: 40, pupil: 140, key: 140, fit: 190, note: 84 } as const;
const taken = Object.values(columns).reduce((sum, each) => sum + each, 0);

function Wide({ parts, ways, onDraft, scale }: AssignTableProps & { scale: Scale }) {
  const keys = useMemo(() => parts.map(({ row }) => row.memberId), [parts]);
  const { frame, rows, before, after, measure } = useShownRows(keys, 57, nothing);
  const room = Math.min(sizes.content, useWindowDimensions().width - sizes.rail - 2 * sizes.gutterWide);
  const width = bandsWidth(scale, Math.max(200, Math.min(440, room - taken - 250)));
  return (
    <div ref={frame}>
      <table style={table} aria-rowcount={parts.length + 1} data-testid="assign-table">
        <caption style={unseen}>The pupils, each with the key and the way that they get</caption>
        <colgroup>
          {[columns.tick, columns.pupil, width + 12, columns.key, columns.fit, null, columns.note].map((each, k) => (
            <col key={k} style={each === null ? {} : { width: each }} />
          ))}
        </colgroup>
        <thead>
          <tr aria-rowindex={1}>
            <th scope="col" style={th}>
              <span style={unseen}>Chosen</span>
            </th>
            <th scope="col" style={th}>
              Pupil
            </th>
            <th scope="col" style={th}>
              <span style={unseen}>The song in the voice</span>
              <SpanScale full scale={scale} width={width} x={(midi) => stripX(midi, scale, width)} />
            </th>
            <th scope="col" style={th}>
              Key
            </th>
            <th scope="col" style={th}>
              How it lies
            </th>
            <th scope="col" style={th}>
              Way
            </th>
            <th scope="col" style={th}>
              <span style={unseen}>Note</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {before > 0 && (
            <tr aria-hidden style={{ height: before }}>
              <td />
            </tr>
          )}
          {rows.map(({ index, key }) => {
            const part = parts[index];
            return (
              part && (
                <tr key={key} ref={measure} data-index={index} aria-rowindex={index + 2} data-testid="assign-row">
                  <Cells part={part} ways={ways.get(part.row.memberId)} onDraft={onDraft} scale={scale} width={width} />
                </tr>
              )
            );
          })}
          {after > 0 && (
            <tr aria-hidden style={{ height: after }}>
              <td />
            </tr>
          )}
        </tbody>
      </table>
    </div>
  );
}

interface CellsProps extends PartCellProps {
  scale: Scale;
  width: number;
}

const Cells = memo(function Cells({ part, ways, onDraft, scale, width }: CellsProps) {
  const { row, draft } = part;
  return (
    <>
      <td style={td}>
        <Choose part={part} onDraft={onDraft} />
      </td>
      <th scope="row" style={{ ...td, textAlign: "left", font: `600 15px/18px ${fonts.text}` }}>
        {row.name}
      </th>
      <td style={{ ...td, lineHeight: 0 }}>
        <PartBand part={part} scale={scale} width={width} />
      </td>
      <td style={td}>{draft.chosen && <PartKey part={part} onDraft={onDraft} />}</td>
      <td style={td}>{draft.chosen && <PartFit part={part} />}</td>
      <td style={td}>{draft.chosen && <PartWay part={part} ways={ways} onDraft={onDraft} />}</td>
      <td style={td}>{draft.chosen && <PartNote part={part} onDraft={onDraft} />}</td>
    </>
  );
});

function Choose({ part: { row, draft }, onDraft }: Pick<PartCellProps, "part" | "onDraft">) {
  return (
    <label style={{ display: "flex", width: 40, height: 48, alignItems: "center" }}>
      <Tick
        label={`Give it to ${row.name}`}
        on={draft.chosen}
        onChange={(chosen) => onDraft(row.memberId, { chosen })}
        testID={`give-${row.memberId}`}
      />
    </label>
  );
}

function Narrow({ parts, ways, onDraft, scale }: AssignTableProps & { scale: Scale }) {
  const [width, setWidth] = useState(0);
  const keys = useMemo(() => parts.map(({ row }) => row.memberId), [parts]);
  const { frame, rows, before, after, measure } = useShownRows(keys, 220, nothing);
  return (
    <View onLayout={({ nativeEvent }) => setWidth(Math.min(560, Math.floor(nativeEvent.layout.width)))}>
      <div
        ref={frame}
        role="list"
        data-testid="assign-table"
        style={{ paddingTop: before, paddingBottom: after, borderTop: `1.5px solid ${colors.ink}` }}
      >
        {rows.map(({ index, key }) => {
          const part = parts[index];
          return (
            part && (
              <div
                key={key}
                ref={measure}
                data-index={index}
                data-testid="assign-row"
                role="listitem"
                style={{ borderBottom: `1px solid ${colors.line}`, padding: "8px 0" }}
              >
                <Card part={part} ways={ways.get(part.row.memberId)} onDraft={onDraft} scale={scale} width={width} />
              </div>
            )
          );
        })}
      </div>
    </View>
  );
}

const Card = memo(function Card({ part, ways, onDraft, scale, width }: CellsProps) {
  const { row, draft } = part;
  return (
    <View style={{ gap: 6 }}>
      <View style={{ flexDirection: "row", alignItems: "center", gap: 4 }}>
        <Choose part={part} onDraft={onDraft} />
        <Text variant="strong" style={{ flexGrow: 1, flexShrink: 1 }}>
          {row.name}
        </Text>
        {draft.chosen && <PartNote part={part} onDraft={onDraft} />}
      </View>
      {draft.chosen && (
        <>
          {width > 0 && <PartBand part={part} scale={scale} width={width} />}
          <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 16, minHeight: 48 }}>
            <PartKey part={part} onDraft={onDraft} />
            <PartFit part={part} />
          </View>
          <View style={{ minHeight: 48, alignItems: "flex-start" }}>
            <PartWay part={part} ways={ways} onDraft={onDraft} />
          </View>
        </>
      )}
    </View>
  );
});

const table: CSSProperties = {
  width: "100%",
  tableLayout: "fixed",
  borderCollapse: "separate",
  borderSpacing: 0,
  font: `400 14px/18px ${fonts.text}`,
  color: colors.ink,
};
const th: CSSProperties = {
  position: "sticky",
  top: 0,
  zIndex: 2,
  background: colors.paper,
  borderBottom: `1px solid ${colors.ink}`,
  font: `500 12px/16px ${fonts.text}`,
  color: colors.inkSoft,
  textAlign: "left",
  verticalAlign: "bottom",
  padding: "0 12px 6px 0",
};
const td: CSSProperties = {
  borderBottom: `1px solid ${colors.line}`,
  padding: "0 12px 0 0",
  height: 56,
  verticalAlign: "middle",
  overflowWrap: "anywhere",
};
