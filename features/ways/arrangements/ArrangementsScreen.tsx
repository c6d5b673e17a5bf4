import { useQuery } from "@tanstack/react-query";
import { useMemo, useRef, useState, type ReactNode } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import type { Instrument } from "@/shared/instruments/instrument";
import type { Way } from "@/shared/ways/way";
import { shortWay } from "../wayWords";
import { ArrangementCard } from "./ArrangementCard";
import type { ArrangedFor } from "./arrangementDraft";
import { keptEntry, proposedEntry, type ArrangementEntry } from "./arrangementEntry";
import { arrangementQueries } from "./arrangementQueries";
import { CompareTable } from "./CompareTable";
import type { HearingDesk } from "./hearingDesk";

export interface ArrangementsScreenProps {
  on: Omit<ArrangedFor, "way"> & { way: Way };
  sequence: readonly string[];
  /** sounding key, with glyphs, and the instrument in words */
  sign: string;
  instrumentWords: string;
  /** all that can be chosen */
  instruments: readonly Instrument[];
  desk: HearingDesk;
}

/** The arrangements of one way: those that are kept, those that are proposed, and any of them side by side. */
export function ArrangementsScreen({
  on,
  sequence,
  sign,
  instrumentWords,
  instruments,
  desk,
}: ArrangementsScreenProps) {
  const { song, tonic, shift, instrument, way } = on;
  const layout = useLayout();
  const kept = useQuery(arrangementQueries.ofSong(song.id));
  const proposed = useQuery(arrangementQueries.proposed({ chords: way.chords, sequence, instrument, capo: way.capo }));
  const [compared, setCompared] = useState<readonly string[]>([]);
  const beside = useRef<HTMLDivElement>(null);
  const proposals = useMemo(
    () => (proposed.data ?? []).map((proposal) => proposedEntry(proposal, on)),
    [proposed.data, on],
  );
  const mine = (kept.data ?? []).map((each) => ({ each, entry: keptEntry(each, song, sequence, instruments) }));
  const strange = mine.filter(({ entry }) => entry === null);
  const entries = [...mine.flatMap(({ entry }) => (entry ? [entry] : [])), ...proposals];
  const together = entries.filter(({ id }) => compared.includes(id));
  const turn = (id: string) =>
    setCompared(compared.includes(id) ? compared.filter((each) => each !== id) : [...compared, id]);
  const cards = (those: readonly ArrangementEntry[]) => (
    <Cards columns={layout === "wide" ? 3 : layout === "middle" ? 2 : 1}>
      {those.map((entry) => (
        <ArrangementCard
          key={entry.id}
          entry={entry}
          where={whereElse(entry, on)}
          desk={desk}
          compared={compared.includes(entry.id)}
          onCompare={() => turn(entry.id)}
        />
      ))}
    </Cards>
  );
  return (
    <Screen
      title={`Arrangements in ${sign}`}
      subtitle={`${instrumentWords}. ${shortWay(way)}.`}
      crumb={{
        label: `${song.title} / Ways`,
        href: { pathname: "/songs/[id]/ways", params: { id: song.id, key: tonic, shift: String(shift) } },
      }}
      wide
      footer={
        together.length > 1 ? (
          <Button
            label={`Side by side: ${together.length}`}
            icon="down"
            onPress={() => beside.current?.scrollIntoView({ block: "start" })}
            testID="to-compared"
          />
        ) : undefined
      }
    >
      <View style={{ gap: 24 }}>
        {kept.error && (
          <Notice kind="error" title="What you kept could not be read">
            {`${kept.error.message} Nothing of yours was lost.`}
          </Notice>
        )}
        {entries.some((entry) => entry.kept) && (
          <Section title="Kept">{cards(entries.filter((entry) => entry.kept))}</Section>
        )}
        {strange.length > 0 && (
          <Notice kind="caution" title="Not on your instruments as they are now">
            {`${strange.map(({ each }) => `“${each.name}”`).join(", ")}: the instrument is gone or has other strings. The shapes are kept.`}
          </Notice>
        )}
        <Section title="Proposed">
          <Text tone="soft">
            The same chords with other shapes. Take one up to change it chord by chord, to give it a right hand, and to
            keep it.
          </Text>
          <QueryState
            query={proposed}
            title="The arrangements could not be worked out"
            skeleton={<Skeleton bars={[{ height: 220 }, { height: 220 }]} words="Working out arrangements" />}
          >
            {() =>
              proposals.length === 0 ? (
                <Text>None of the chords can be played here. Try another way or another instrument.</Text>
              ) : (
                cards(proposals)
              )
            }
          </QueryState>
        </Section>
        {together.length > 1 && (
          <div ref={beside} style={{ scrollMarginTop: 72 }}>
            <Section title="Side by side">
              <CompareTable entries={together} desk={desk} />
            </Section>
          </div>
        )}
      </View>
    </Screen>
  );
}

function Section({ title, children }: { title: string; children: ReactNode }) {
  return (
    <View style={{ gap: 12 }}>
      <Heading level={2}>{title}</Heading>
      {children}
    </View>
  );
}

function Cards({ columns, children }: { columns: number; children: ReactNode }) {
  return (
    <View style={webStyle({ display: "grid", gridTemplateColumns: `repeat(${columns}, minmax(0, 1fr))`, gap: 16 })}>
      {children}
    </View>
  );
}

/** Key, instrument and way of a kept arrangement, where they are not those of the page. */
function whereElse({ kept, on }: ArrangementEntry, here: ArrangedFor): string | null {
  const same =
    on.shift === here.shift &&
    on.instrument.id === here.instrument.id &&
    on.way.retune === here.way.retune &&
    on.way.capo === here.way.capo;
  return !kept || same ? null : `${on.instrument.name}, sounding ${on.tonic}. ${shortWay(on.way)}.`;
}
