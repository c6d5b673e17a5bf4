import type { Href } from "expo-router";
import { useEffect, useMemo, useState } from "react";
import { View } from "react-native";
import { newId } from "@/features/api/newId";
import { AskedTwice } from "@/features/ui/AskedTwice";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Field } from "@/features/ui/Field";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { Arrangement } from "@/shared/contract/arrangement";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { placeWords } from "@/shared/ways/arrangements/arrangementWords";
import { weighArrangement } from "@/shared/ways/arrangements/weighArrangement";
import type { Shape } from "@/shared/ways/way";
import { shortWay } from "../wayWords";
import {
  arrangementOf,
  arrangementPlan,
  effortWords,
  metreFor,
  sameDraft,
  tunedStrings,
  withShape,
} from "./arrangementDraft";
import type { ArrangementEntry } from "./arrangementEntry";
import { arrangementsPath, draftPlace, keptPath, sheetPath } from "./arrangementPaths";
import { useKeepArrangement, useRemoveArrangement } from "./arrangementQueries";
import { ChordStrip } from "./ChordStrip";
import { RightHandCard } from "./hand/RightHandCard";
import { HearButton } from "./HearButton";
import type { HearingDesk } from "./hearingDesk";
import { ChordOnNeck } from "./neck/ChordOnNeck";
import { useArrangementDraft } from "./useArrangementDraft";

export interface ArrangementEditorProps {
  /** what it begins with, and where it is played */
  entry: ArrangementEntry;
  /** the chords as they are played, as written, with repeats */
  sequence: readonly string[];
  instrumentWords: string;
  /** what is kept; null for a proposal */
  kept: Arrangement | null;
  /** the chord that is open on the neck at first, as written */
  firstOpen?: string | undefined;
  desk: HearingDesk;
  /** to another page, in place of this one where it no longer stands for anything */
  onGo: (path: Href, replace: boolean) => void;
}

/** One arrangement: its shapes chord by chord on the neck, its right hand, its sound; kept, copied and deleted. */
export function ArrangementEditor(props: ArrangementEditorProps) {
  const { entry, sequence, instrumentWords, kept, firstOpen, desk, onGo } = props;
  const { on } = entry;
  const { song, instrument, way } = on;
  const phone = useLayout() === "phone";
  const { id, draft, change, forget } = useArrangementDraft(draftPlace(entry), () => ({
    id: kept?.id ?? newId(),
    draft: entry.draft,
  }));
  const [open, setOpen] = useState(() => {
    const asked = draft.chords.find(({ written }) => written === firstOpen);
    return (asked ?? draft.chords.find(({ shape }) => shape) ?? draft.chords[0])?.written ?? "";
  });
  const [nameless, setNameless] = useState(false);
  const keep = useKeepArrangement();
  const copy = useKeepArrangement();
  const remove = useRemoveArrangement();
  const weight = useMemo(
    () => weighArrangement({ chords: draft.chords, sequence, instrument, capo: way.capo }),
    [draft.chords, sequence, instrument, way.capo],
  );
  const { chords, pattern } = draft;
  const { stop } = desk;
  // What is heard is what stands here: a change silences it.
  useEffect(() => stop, [chords, pattern, stop]);
  const chord = chords.find(({ written }) => written === open);
  const changed = kept === null || !sameDraft(draft, entry.draft);
  const list = arrangementsPath({ songId: song.id, ...on, instrumentId: instrument.id });
  const save = () => {
    if (draft.name.trim() === "") {
      setNameless(true);
      return;
    }
    const item = arrangementOf(draft, on, id, kept?.createdAt ?? new Date().toISOString());
    keep.mutate(item, {
      onSuccess: (there) => {
        forget();
        if (!kept) onGo(keptPath(there), true);
      },
    });
  };
  const duplicate = () => {
    const twin = { ...draft, name: `${draft.name.trim().slice(0, 74)}, copy` };
    copy.mutate(arrangementOf(twin, on, newId(), new Date().toISOString()), {
      onSuccess: (there) => onGo(keptPath(there), false),
    });
  };
  const tuned = tunedStrings(instrument, way.retune);
  const buttons = (
    <View style={{ flexDirection: "row", gap: 8 }}>
      <HearButton
        desk={desk}
        id={id}
        plan={() => arrangementPlan({ chords, pattern }, on)}
        label={draft.name}
        grow={phone}
      />
      <Button
        label={kept ? (changed ? "Keep the changes" : "It is kept") : "Keep it"}
        disabled={!changed}
        busy={keep.isPending}
        onPress={save}
        testID="keep-arrangement"
        style={phone ? { flexGrow: 1 } : null}
      />
    </View>
  );
  return (
    <Screen
      title={draft.name.trim() === "" ? "Arrangement" : draft.name}
      subtitle={`Sounds in ${glyphs(keySign({ tonic: on.tonic, mode: song.writtenKey?.mode ?? "major" }))} on ${instrumentWords}. ${shortWay(way)}.`}
      crumb={{ label: `${song.title} / Arrangements`, href: list }}
      wide
      footer={buttons}
    >
      <View style={{ gap: 16 }}>
        {(keep.error ?? copy.error) && (
          <Notice kind="error" title="This is not saved">
            {`${(keep.error ?? copy.error)!.message} Your changes are still here; try again.`}
          </Notice>
        )}
        {desk.lights}
        <ChordStrip chords={draft.chords} on={on} open={open} onOpen={setOpen} />
        <LiveText variant="body" testID="arrangement-weight">
          {`${effortWords(weight)} ${placeWords(weight, tuned)}`}
        </LiveText>
        {chord && (
          <ChordOnNeck
            chord={chord}
            on={on}
            onShape={(shape: Shape) => change({ chords: withShape(draft, open, shape).chords })}
          />
        )}
        <RightHandCard pattern={draft.pattern} metre={metreFor(song)} onChange={(pattern) => change({ pattern })} />
        <Card style={{ gap: 14 }}>
          <Field
            label="Name"
            value={draft.name}
            onChangeText={(name) => {
              setNameless(false);
              change({ name });
            }}
            error={nameless ? "Give the arrangement a name." : undefined}
            testID="arrangement-name"
          />
          {kept ? (
            <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8, alignItems: "flex-start" }}>
              <LinkButton
                kind="text"
                small
                icon="file"
                label="See it on the sheet"
                href={sheetPath(kept)}
                testID="arrangement-sheet"
              />
              <Button
                kind="text"
                small
                icon="plus"
                label="Duplicate"
                busy={copy.isPending}
                onPress={duplicate}
                testID="duplicate-arrangement"
              />
              <AskedTwice
                label="Delete"
                question={`Delete “${kept.name}”?`}
                text="Its shapes and its pattern go. The song stays as it is. This cannot be undone."
                failed="It is not deleted."
                busy={remove.isPending}
                error={remove.error}
                testID="remove-arrangement"
                onRemove={() =>
                  remove.mutate(kept.id, {
                    onSuccess: () => {
                      forget();
                      onGo(list, true);
                    },
                  })
                }
              />
            </View>
          ) : (
            <Text variant="small" tone="soft">
              Once it is kept, it can stand on the sheet, be copied, and be compared with others.
            </Text>
          )}
        </Card>
      </View>
    </Screen>
  );
}
