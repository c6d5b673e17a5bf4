import { useState, type ReactNode } from "react";
import { Button } from "@/features/ui/Button";
import { Form } from "@/features/ui/Form";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { useLayout } from "@/features/ui/useLayout";
import type { OwnInstrument } from "@/shared/contract/instrument";
import { useSaveInstruments } from "../instrumentQueries";
import type { InstrumentDraft } from "./instrumentDraft";
import { InstrumentForm } from "./InstrumentForm";
import { readDraft } from "./readDraft";
import { useDraft } from "./useDraft";

export interface InstrumentEditorProps {
  title: string;
  /** where the draft is kept: "new", or the id of what is edited */
  place: string;
  begin: () => { draft: InstrumentDraft; id: string };
  /** the instrument to keep, from what was read of the draft */
  finish: (read: Omit<OwnInstrument, "id" | "presetId" | "favourite">, id: string) => OwnInstrument;
  onKept: (own: OwnInstrument) => void;
  onAfresh: () => void;
  /** what can be done with it besides, at the foot of the page */
  children?: ReactNode;
}

/** The page on which an instrument is made or changed. */
export function InstrumentEditor(props: InstrumentEditorProps) {
  const { title, place, begin, finish, onKept, onAfresh, children } = props;
  const { id, draft, restored, change, forget } = useDraft(place, begin);
  const save = useSaveInstruments();
  const phone = useLayout() === "phone";
  const [asked, setAsked] = useState(false);
  const read = readDraft(draft);
  const errors = asked && "errors" in read ? read.errors : {};
  const wrong = Object.keys(errors).length;
  const submit = () => {
    setAsked(true);
    if ("errors" in read) {
      requestAnimationFrame(() =>
        document.querySelector<HTMLElement>("main [aria-invalid], [role=main] [aria-invalid]")?.focus(),
      );
      return;
    }
    const own = finish({ ...read.instrument, ...(draft.photo === null ? null : { photo: draft.photo }) }, id);
    save.mutate([own], {
      onSuccess: () => {
        forget();
        onKept(own);
      },
    });
  };
  return (
    <Screen
      title={title}
      crumb={{ label: "Instruments", href: "/instruments" }}
      wide
      footer={
        <Button
          small={!phone}
          label="Keep the instrument"
          busy={save.isPending}
          onPress={submit}
          testID="keep-instrument"
        />
      }
    >
      <Form label="Instrument" onSubmit={submit} gap={20}>
        {restored && (
          <Notice
            kind="good"
            testID="draft-restored"
            title="Your draft is back"
            action={
              <Button
                kind="text"
                small
                label="Start afresh"
                onPress={() => {
                  forget();
                  onAfresh();
                }}
              />
            }
          >
            What you changed and did not keep stands here again.
          </Notice>
        )}
        {save.error && (
          <Notice
            kind="error"
            title="The instrument is not kept yet"
          >{`${save.error.message} Everything you typed is still here.`}</Notice>
        )}
        {wrong > 0 && (
          <Notice kind="error" testID="instrument-wrong">
            {wrong === 1
              ? "One field needs another look; it says why."
              : `${wrong} fields need another look; each says why.`}
          </Notice>
        )}
        <InstrumentForm draft={draft} errors={errors} onChange={change} />
      </Form>
      {children}
    </Screen>
  );
}
