import { useMutation, useQuery } from "@tanstack/react-query";
import type { Href } from "expo-router";
import { useDeferredValue, useMemo, type ReactNode } from "react";
import { View } from "react-native";
import { fileStem } from "@/features/api/fileStem";
import { http } from "@/features/api/httpClient";
import { saveFile } from "@/features/api/saveFile";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Skeleton } from "@/features/ui/Skeleton";
import { useLayout } from "@/features/ui/useLayout";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { Studio } from "@/shared/contract/studio/studio";
import { plural } from "@/shared/music/countWords";
import { studioQueries } from "../studioQueries";
import { StudioLinks } from "./RosterActions";
import { RosterControls } from "./RosterControls";
import { RosterList } from "./RosterList";
import { rosterScale } from "./rosterScale";
import { RosterTable } from "./RosterTable";
import { pupilsOf, shownPupils, type RosterView } from "./rosterView";

export interface RosterScreenProps {
  studio: Studio;
  view: RosterView;
  onView: (change: Partial<RosterView>) => void;
  now: Date;
  /** over the table: one key for all */
  children?: ReactNode;
}

const rows = [{ height: 52 }, ...Array.from({ length: 8 }, () => ({ height: 30 }))];

/** The roster of a studio: everybody's voice on one scale, what they play, what they work on, and how it went. */
export function RosterScreen({ studio, view, onView, now, children }: RosterScreenProps) {
  return (
    <QueryState
      query={useQuery(studioQueries.roster(studio.id))}
      title="The roster could not be opened"
      skeleton={<Skeleton bars={rows} words="Fetching the roster" />}
    >
      {(roster) => (
        <Roster studio={studio} roster={roster} view={view} onView={onView} now={now}>
          {children}
        </Roster>
      )}
    </QueryState>
  );
}

function Roster({ studio, roster, view, onView, now, children }: RosterScreenProps & { roster: readonly RosterRow[] }) {
  const layout = useLayout();
  const [wide, phone] = [layout === "wide", layout === "phone"];
  const groups = useQuery(studioQueries.groups(studio.id)).data ?? [];
  const pupils = useMemo(() => pupilsOf(roster), [roster]);
  const scale = useMemo(() => rosterScale(pupils), [pupils]);
  const wanted = useDeferredValue(view);
  const shown = useMemo(() => shownPupils(pupils, wanted), [pupils, wanted]);
  if (pupils.length === 0)
    return (
      <View style={{ gap: 16 }}>
        <StudioLinks studioId={studio.id} />
        <EmptyState
          testID="no-pupils"
          title="Nobody is here yet"
          text="Invite your pupils by e-mail. Whoever joins and agrees stands here with voice, instrument, songs and takes."
          action={
            <LinkButton label="Invite pupils" href={`/studio/${studio.id}/invite` as Href} testID="invite-first" />
          }
        />
      </View>
    );
  return (
    <View style={{ gap: 16 }}>
      {!phone && (
        <View style={{ marginVertical: -12 }}>
          <StudioLinks studioId={studio.id} />
        </View>
      )}
      {children}
      <RosterControls view={view} onView={onView} groups={groups} />
      <View style={{ gap: wide ? 4 : 0 }}>
        <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", justifyContent: "space-between" }}>
          <LiveText variant="small" tone="soft" testID="pupils-shown">
            {shown.length === pupils.length
              ? plural(pupils.length, "pupil")
              : `${shown.length} of ${plural(pupils.length, "pupil")}`}
          </LiveText>
          {phone ? <StudioLinks studioId={studio.id} /> : <CsvButton studio={studio} />}
        </View>
        {shown.length === 0 ? (
          <EmptyState
            title="Nobody fits this"
            text="No pupil is found by these words and choices."
            action={
              <Button
                kind="secondary"
                small
                label="Show everybody"
                onPress={() => onView({ q: "", filter: "all", group: null })}
              />
            }
          />
        ) : wide ? (
          <RosterTable rows={shown} scale={scale} now={now} sort={wanted.sort} onSort={(sort) => onView({ sort })} />
        ) : (
          <RosterList rows={shown} scale={scale} now={now} />
        )}
        {phone && <CsvButton studio={studio} />}
      </View>
    </View>
  );
}

/** The roster as a table for a spreadsheet. */
function CsvButton({ studio }: { studio: Studio }) {
  const save = useMutation({
    mutationFn: async () =>
      saveFile({ name: `${fileStem(studio.name)}.csv`, blob: await http.download(`/studios/${studio.id}/roster.csv`) }),
  });
  return (
    <View style={{ alignItems: "flex-end" }}>
      <Button
        kind="text"
        small
        label="Save as CSV"
        busy={save.isPending}
        onPress={() => save.mutate()}
        testID="roster-csv"
      />
      {save.error && (
        <Notice kind="error" title="The file could not be made">
          {save.error.message}
        </Notice>
      )}
    </View>
  );
}
