import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { View } from "react-native";
import { newId } from "@/features/api/newId";
import { AskedTwice } from "@/features/ui/AskedTwice";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { useUnits } from "@/features/ui/useUnits";
import type { OwnInstrument } from "@/shared/contract/instrument";
import { instrumentQueries, useRemoveInstrument, useSaveInstruments } from "../instrumentQueries";
import { instrumentOf, offeredInstruments } from "../myInstruments";
import { InstrumentEditor } from "./InstrumentEditor";
import { draftOf, isOther } from "./instrumentDraft";

export interface OwnInstrumentPageProps {
  id: string;
  /** after it was kept or removed */
  onDone: () => void;
  /** to another instrument's page */
  onOpen: (id: string) => void;
}

/** An instrument of one's own: seen, heard, changed, copied and removed. */
export function OwnInstrumentPage({ id, onDone, onOpen }: OwnInstrumentPageProps) {
  const query = useQuery(instrumentQueries.all());
  const own = query.data?.find((each) => each.id === id);
  if (own && query.data) return <Present key={id} own={own} owned={query.data} onDone={onDone} onOpen={onOpen} />;
  const missing = query.data !== undefined;
  return (
    <Screen
      title={missing ? "No such instrument" : "Instrument"}
      crumb={{ label: "Instruments", href: "/instruments" }}
      wide
    >
      {missing ? (
        <EmptyState
          testID="no-such-instrument"
          title="This instrument is not among yours"
          text="It may have been deleted, or it belongs to somebody else. Nothing of yours was changed."
          action={<LinkButton href="/instruments" label="To your instruments" small />}
        />
      ) : (
        <QueryState query={query} title="The instrument could not be opened">
          {() => null}
        </QueryState>
      )}
    </Screen>
  );
}

interface PresentProps extends Omit<OwnInstrumentPageProps, "id"> {
  own: OwnInstrument;
  owned: readonly OwnInstrument[];
}

function Present({ own, owned, onDone, onOpen }: PresentProps) {
  const [units] = useUnits();
  const [afresh, setAfresh] = useState(0);
  const copy = useSaveInstruments();
  const remove = useRemoveInstrument();
  const offered = offeredInstruments(owned).find((each) => each.own === own);
  const duplicate = () => {
    const name = `${own.name.slice(0, 74)}, copy`;
    const twin = { ...own, id: newId(), presetId: null, name, favourite: false };
    copy.mutate([twin], { onSuccess: () => onOpen(twin.id) });
  };
  return (
    <InstrumentEditor
      key={afresh}
      title={own.name}
      place={own.id}
      begin={() => ({ id: own.id, draft: draftOf(instrumentOf(own), own.photo ?? null, units) })}
      finish={(read, id) => {
        const next = { ...read, id, favourite: own.favourite };
        return { ...next, presetId: isOther(own, next) ? null : own.presetId };
      }}
      onKept={onDone}
      onAfresh={() => setAfresh(afresh + 1)}
    >
      <View style={{ marginTop: 28, gap: 12 }}>
        {copy.error && <Notice kind="error">{`${copy.error.message} There is no copy yet.`}</Notice>}
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
          <LinkButton
            kind="secondary"
            small
            label="Strings and retune"
            href={{ pathname: "/instruments/retune", params: { instrument: offered?.instrument.id ?? own.id } }}
            testID="to-retune"
          />
          <Button
            kind="secondary"
            small
            label="Make a copy"
            busy={copy.isPending}
            onPress={duplicate}
            testID="copy-instrument"
          />
        </View>
        <AskedTwice
          label="Delete the instrument"
          question={`Delete “${own.name}”?`}
          text="Songs whose key was decided on it keep the key and look for ways on another one. This cannot be undone."
          failed="It is not deleted."
          testID="remove-instrument"
          busy={remove.isPending}
          error={remove.error}
          // The page of what is gone goes too: its own callback would not be heard any more.
          onRemove={() => void remove.mutateAsync(own.id).then(onDone, () => undefined)}
        />
      </View>
    </InstrumentEditor>
  );
}
