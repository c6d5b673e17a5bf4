import { useEffect, useRef, useState, type ReactNode, type RefObject } from "react";
import { View } from "react-native";
import { Field } from "@/features/ui/Field";
import { Segmented } from "@/features/ui/Segmented";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import { TuneFields } from "../melody/TuneFields";
import { caretRow } from "./chartBox";
import { ChartPreview } from "./ChartPreview";
import { KeyChooser } from "./KeyChooser";
import { pastedSong } from "./pastedSong";
import { PartList } from "./parts/PartList";
import { PlaceBar } from "./place/PlaceBar";
import { PlaceChords } from "./place/PlaceChords";
import type { Placing } from "./place/usePlacing";
import { RespellOffer } from "./RespellOffer";
import type { DraftErrors } from "./songDraft";
import { UnreadSigns } from "./UnreadSigns";
import type { ChartReading } from "./useChartReading";
import type { SongEdits } from "./useSongEdits";

/** What is done with the chart at the moment. */
export type EditMode = "type" | "place" | "parts";

export interface SongFormProps {
  edits: SongEdits;
  reading: ChartReading;
  errors: DraftErrors;
  mode: EditMode;
  onMode: (mode: EditMode) => void;
  placing: Placing;
  /** around the field of the chart */
  chartBox: RefObject<HTMLDivElement | null>;
  /** takes the caret to a place of the text, from 0 */
  onShow: (row: number, column: number, length: number) => void;
}

const previewHeight = 560;

/** Title, chart, parts, key and melody of a song. */
export function SongForm({ edits, reading, errors, mode, onMode, placing, chartBox, onShow }: SongFormProps) {
  const { draft, change } = edits;
  const { chart, finding } = reading;
  const layout = useLayout();
  const phone = layout === "phone";
  const wide = layout === "wide";
  const [row, setRow] = useState<number | null>(null);
  const [takenTitle, setTakenTitle] = useState<string | null>(null);
  useEffect(() => {
    const follow = () => {
      if (chartBox.current?.contains(document.activeElement)) setRow(caretRow(chartBox.current));
    };
    document.addEventListener("selectionchange", follow);
    return () => document.removeEventListener("selectionchange", follow);
  }, [chartBox]);
  const key = draft.key ?? finding?.key ?? null;
  const onChart = (value: string) => {
    const pasted = pastedSong(draft, value);
    change({ chart: value }, pasted ? undefined : "chart");
    if (!pasted) return;
    // A step of its own: Undo gives back what was pasted.
    change(pasted);
    setTakenTitle(pasted.title ?? null);
  };
  const onText = useRef((text: string) => change({ chart: text })).current;

  const text = (
    name: "title" | "beatsPerBar" | "tempo",
    label: string,
    more: Partial<React.ComponentProps<typeof Field>>,
  ) => (
    <View style={{ flexGrow: name === "title" ? 4 : 1, flexBasis: name === "title" ? 260 : 120, minWidth: 0 }}>
      <Field
        label={label}
        value={draft[name]}
        onChangeText={(value) => change({ [name]: value }, name)}
        error={errors[name]}
        testID={`song-${name}`}
        {...more}
      />
    </View>
  );
  const typing = (
    <div ref={chartBox}>
      <Field
        label="Chart, chords over lyrics"
        value={draft.chart}
        onChangeText={onChart}
        error={errors.chart}
        multiline
        mono
        rows={wide ? 22 : 12}
        hint="Paste or type it: a line of chords, under it the words. Name the parts, like Verse or Chorus, on lines of their own."
        testID="song-chart"
      />
    </div>
  );
  const chartColumn = (
    <View style={{ gap: 16, minWidth: 0 }}>
      <Segmented<EditMode>
        label="What to do with the chart"
        testID="edit-mode"
        value={wide && mode === "parts" ? "type" : mode}
        options={[
          { value: "type", label: "Type" },
          { value: "place", label: "Place chords" },
          ...(wide ? [] : [{ value: "parts" as const, label: "Parts" }]),
        ]}
        onChange={onMode}
      />
      {mode === "place" ? (
        <PlaceChords placing={placing} onDone={() => onMode("type")} />
      ) : mode === "parts" && !wide ? null : (
        typing
      )}
      {mode === "place" && !phone && (
        <Bar>
          <PlaceBar placing={placing} />
        </Bar>
      )}
      <RespellOffer text={draft.chart} writtenKey={key} onText={onText} />
      {(mode !== "parts" || wide) && (
        <UnreadSigns signs={chart.unread} onShow={(sign) => onShow(sign.line - 1, sign.column - 1, sign.text.length)} />
      )}
    </View>
  );
  const parts = (
    <PartList text={draft.chart} onText={onText} onShow={wide ? (at) => onShow(at, 0, 0) : () => undefined} />
  );
  const preview = <ChartPreview chart={chart} row={wide ? row : null} height={wide ? previewHeight : null} />;
  const tune = <TuneFields draft={draft} errors={errors} writtenKey={key} onChange={(changes) => change(changes)} />;
  const keyCard = <KeyChooser finding={finding} chosen={draft.key} onChoose={(chosen) => change({ key: chosen })} />;
  const facts = (
    <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
      {text("title", "Title", {
        autoComplete: "off",
        ...(draft.title !== "" && draft.title === takenTitle
          ? { hint: "Taken from what you pasted; Undo puts it back into the chart." }
          : null),
      })}
      {!phone && text("beatsPerBar", "Beats in a bar", { inputMode: "numeric" })}
      {!phone && text("tempo", "Beats a minute", { inputMode: "numeric", hint: "May stay empty" })}
    </View>
  );
  if (phone)
    return (
      <View style={{ gap: 20 }}>
        {mode === "type" && facts}
        {chartColumn}
        {mode === "parts" && parts}
        {mode === "type" && (
          <>
            {preview}
            <View style={{ flexDirection: "row", gap: 12 }}>
              {text("beatsPerBar", "Beats in a bar", { inputMode: "numeric" })}
              {text("tempo", "Beats a minute", { inputMode: "numeric", hint: "May stay empty" })}
            </View>
            {keyCard}
            {tune}
          </>
        )}
      </View>
    );
  return (
    <View style={{ gap: 24 }}>
      {facts}
      <Columns to={wide ? "minmax(0, 11fr) minmax(0, 10fr) 264px" : "minmax(0, 1fr) minmax(0, 1fr)"}>
        {chartColumn}
        {preview}
        {wide && (
          <View style={{ gap: 24 }}>
            {parts}
            {keyCard}
          </View>
        )}
      </Columns>
      {!wide && mode === "parts" && parts}
      {wide ? (
        <View style={{ maxWidth: 760 }}>{tune}</View>
      ) : (
        <Columns to="minmax(0, 1fr) minmax(0, 1fr)">
          {keyCard}
          {tune}
        </Columns>
      )}
    </View>
  );
}

function Columns({ to, children }: { to: string; children: ReactNode }) {
  return (
    <View
      style={webStyle({ display: "grid", gridTemplateColumns: to, columnGap: 32, rowGap: 24, alignItems: "start" })}
    >
      {children}
    </View>
  );
}

/** Stays in sight at the foot of the window while the words are scrolled. */
function Bar({ children }: { children: ReactNode }) {
  return (
    <View style={webStyle({ position: "sticky", bottom: 0, background: "var(--paper)", paddingBlock: 8, zIndex: 1 })}>
      {children}
    </View>
  );
}
