import { useDeferredValue, useEffect, useMemo, useState } from "react";
import { Controller, useForm, useWatch } from "react-hook-form";
import { View } from "react-native";
import { Field } from "@/features/ui/Field";
import { Form } from "@/features/ui/Form";
import { Notice } from "@/features/ui/Notice";
import { useLayout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import { parseChart } from "@/shared/songs/chart";
import { findKey } from "@/shared/songs/findKey";
import { ChartPreview } from "./ChartPreview";
import { draftStore } from "./draftStore";
import { KeyChooser } from "./KeyChooser";
import { draftErrors, songFromDraft, type DraftErrors, type SongDraft, type SongOrigin } from "./songDraft";
import { TuneFields } from "../melody/TuneFields";
import { UnreadSigns } from "./UnreadSigns";

export interface SongFormProps {
  /** what stands in it at first */
  draft: SongDraft;
  /** the song being changed; null for a new one */
  songId: string | null;
  origin: () => SongOrigin;
  /** what kept the song from being saved; everything typed stays */
  problem: Error | null;
  onSave: (song: Song) => void;
  /** the sending button stands in the frame around the form */
  frame: (form: React.ReactNode, submit: () => void) => React.ReactNode;
}

/** Title, chart, key and melody of a song. Every letter is kept on this device until the song is saved. */
export function SongForm({ draft, songId, origin, problem, onSave, frame }: SongFormProps) {
  const { control, handleSubmit, setValue, setError, clearErrors, formState } = useForm<SongDraft>({
    defaultValues: draft,
  });
  const typed = { ...draft, ...useWatch({ control }) } as SongDraft;
  const chartText = useDeferredValue(typed.chart);
  const chart = useMemo(() => parseChart(chartText), [chartText]);
  const notes = typed.tune === "melody" ? typed.melody?.notes : undefined;
  const finding = useMemo(() => findKey({ chart, ...(notes ? { notes } : null) }), [chart, notes]);
  const wide = useLayout() !== "phone";
  const kept = JSON.stringify(typed);
  const untouched = useMemo(() => JSON.stringify(draft), [draft]);
  useEffect(() => {
    if (kept !== untouched) draftStore.save(songId, JSON.parse(kept) as SongDraft);
  }, [kept, untouched, songId]);

  const [refusals, setRefusals] = useState(0);
  useEffect(() => {
    if (refusals > 0) document.querySelector<HTMLElement>('form [aria-invalid="true"]')?.focus();
  }, [refusals]);

  const errors: DraftErrors = Object.fromEntries(
    Object.entries(formState.errors).map(([name, error]) => [name, error?.message]),
  );
  const change = (changes: Partial<SongDraft>) => {
    clearErrors(Object.keys(changes) as (keyof SongDraft)[]);
    for (const [name, value] of Object.entries(changes))
      setValue(name as keyof SongDraft, value as never, { shouldDirty: true });
  };
  const submit = handleSubmit((values) => {
    // The deferred chart may lag behind the last letter typed.
    const found = findKey({ chart: parseChart(values.chart), ...(notes ? { notes } : null) })?.key ?? null;
    const wrong = Object.entries(draftErrors(values, found)) as [keyof SongDraft, string][];
    for (const [name, message] of wrong) setError(name, { message });
    if (wrong.length > 0) setRefusals(refusals + 1);
    else onSave(songFromDraft(values, found, origin()));
  });

  const text = (
    name: "title" | "chart" | "beatsPerBar" | "tempo",
    label: string,
    more: Partial<React.ComponentProps<typeof Field>>,
  ) => (
    <Controller
      control={control}
      name={name}
      render={({ field }) => (
        <Field
          label={label}
          value={field.value}
          onBlur={field.onBlur}
          onChangeText={(value) => {
            clearErrors(name);
            field.onChange(value);
          }}
          error={errors[name]}
          testID={`song-${name}`}
          {...more}
        />
      )}
    />
  );
  const column = { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0, gap: 20 } as const;
  const wrong = Object.values(errors).filter((message) => message !== undefined);
  const form = (
    <Form label="Song" onSubmit={() => void submit()} gap={20}>
      {problem && (
        <Notice
          kind="error"
          title="The song is not saved yet"
        >{`${problem.message} Everything you typed is still here.`}</Notice>
      )}
      {wrong.length > 0 && (
        <Notice
          kind="error"
          title={wrong.length === 1 ? "One thing needs mending" : `${wrong.length} things need mending`}
        >
          {wrong.join(" ")}
        </Notice>
      )}
      <View style={{ flexDirection: wide ? "row" : "column", gap: wide ? 32 : 20, alignItems: "stretch" }}>
        <View style={wide ? column : { gap: 20 }}>
          {text("title", "Title", { autoComplete: "off" })}
          {text("chart", "Chart, chords over lyrics", {
            multiline: true,
            mono: true,
            rows: wide ? 16 : 10,
            hint: "Paste or type it: a line of chords, under it the words. Name the parts, like Verse or Chorus, on lines of their own.",
          })}
          <UnreadSigns signs={chart.unread} />
          {!wide && <ChartPreview chart={chart} />}
          <View style={{ flexDirection: "row", gap: 12 }}>
            <View style={{ flexGrow: 1, flexBasis: 0, minWidth: 0 }}>
              {text("beatsPerBar", "Beats in a bar", { inputMode: "numeric" })}
            </View>
            <View style={{ flexGrow: 1, flexBasis: 0, minWidth: 0 }}>
              {text("tempo", "Beats a minute", { inputMode: "numeric", hint: "May stay empty" })}
            </View>
          </View>
          {wide && (
            <TuneFields
              draft={typed}
              errors={errors}
              writtenKey={typed.key ?? finding?.key ?? null}
              onChange={change}
            />
          )}
        </View>
        <View style={wide ? column : { gap: 20 }}>
          <KeyChooser finding={finding} chosen={typed.key} onChoose={(key) => change({ key })} />
          {wide ? (
            <ChartPreview chart={chart} />
          ) : (
            <TuneFields
              draft={typed}
              errors={errors}
              writtenKey={typed.key ?? finding?.key ?? null}
              onChange={change}
            />
          )}
        </View>
      </View>
    </Form>
  );
  return frame(form, () => void submit());
}
