import type { Href } from "expo-router";
import { useState, type ReactNode } from "react";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { ErrorState } from "@/features/ui/ErrorState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Skeleton } from "@/features/ui/Skeleton";
import { useLayout } from "@/features/ui/useLayout";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import type { Instrument } from "@/shared/instruments/instrument";
import type { Way } from "@/shared/ways/way";
import { differentWays } from "@/shared/ways/wayOrder";
import type { ShapeTicks, WayLinks } from "./WayCard";
import { WayList } from "./WayList";
import { takeLabel, takeLabelIn, wayKept } from "./wayWords";

/** What is asked of a search that runs on this device. */
interface WaySearch {
  data: Way[] | undefined;
  error: Error | null;
  refetch: () => unknown;
}

export interface WayPaneProps {
  songId: string;
  /** the key they lead into: in another key the choice starts anew */
  into: KeyName | null;
  hasChords: boolean;
  search: WaySearch;
  instrument: Instrument;
  /** the way kept with the decision, if it was made for this key and instrument */
  kept: Pick<Way, "retune" | "capo" | "shapeKey"> | null;
  saving: boolean;
  onUse: (way: Way) => void;
  /** the button names the key, where the page's head does not */
  named?: boolean;
  /** how many ways are shown at first; all unless told otherwise */
  most?: number;
  /** all ways in full, the different ones beside each other where there is room, with ticks for the shapes one knows */
  full?: boolean;
  ticks?: ShapeTicks | undefined;
  /** where the chosen way stands on paper */
  sheet?: (way: Way) => Href;
  /** to arrangements and to chords on the whole neck */
  links?: WayLinks | undefined;
  /** where the walk stands that explains a way */
  why?: (way: Way) => Href;
  /** where the ways stand, and where the button that takes one */
  children: (parts: { list: ReactNode; use: ReactNode }) => ReactNode;
}

/** The ways into one key, one of them chosen, and the button that keeps it. */
export function WayPane({
  songId,
  into,
  hasChords,
  search,
  instrument,
  kept,
  saving,
  onUse,
  named = false,
  most,
  full = false,
  ticks,
  sheet,
  links,
  why,
  children,
}: WayPaneProps) {
  const [chosen, setChosen] = useState<string | null>(null);
  const wide = useLayout() === "wide";
  const found = search.data;
  const keptWay = found ? wayKept(found, kept) : null;
  const shown = found ? shownOf(found, most) : [];
  const ways = keptWay && !shown.includes(keptWay) ? [...shown, keptWay] : shown;
  const at = Math.max(
    0,
    chosen?.startsWith(`${into?.tonic} `) !== true && keptWay
      ? ways.indexOf(keptWay)
      : ways.findIndex((way) => idOf(into, way) === chosen),
  );
  const way = ways[at];
  const isKept = way !== undefined && way === keptWay;
  if (!hasChords)
    return children({
      use: null,
      list: (
        <EmptyState
          testID="ways-need-chords"
          title="No chords yet"
          text="Ways are found for the chords of the song. Paste its chart, and the shapes for every key stand here."
          action={
            <LinkButton
              href={{ pathname: "/songs/[id]/edit", params: { id: songId } }}
              label="Give the chart"
              icon="edit"
              small
            />
          }
        />
      ),
    });
  if (search.error)
    return children({
      use: null,
      list: (
        <ErrorState
          title="The ways could not be found"
          text="The search did not run. The song is safe; try again."
          onRetry={() => void search.refetch()}
        />
      ),
    });
  if (!found)
    return children({
      use: null,
      list: <Skeleton bars={[{ height: 182 }, { height: 182 }, { height: 166 }]} words="Looking for ways to play it" />,
    });
  if (!way)
    return children({
      use: null,
      list: (
        <EmptyState
          title="No way on this instrument"
          text="None of the song's chords can be played on it in this key. Try another instrument or another key."
        />
      ),
    });
  const label = named && into ? takeLabelIn(glyphs(keySign(into)), way) : takeLabel(way);
  return children({
    list: (
      <WayList
        ways={ways}
        instrument={instrument}
        chosen={at}
        onChoose={(index) => setChosen(idOf(into, ways[index]))}
        columns={full && wide ? Math.min(3, ways.length) : 1}
        full={full}
        ticks={ticks}
        links={links}
        why={why}
      />
    ),
    use: (
      <>
        {sheet && <LinkButton kind="secondary" label="Make the sheet" href={sheet(way)} testID="to-sheet" />}
        <Button
          label={isKept ? label.replace("Use", "You use") : label}
          busy={saving}
          disabled={isKept}
          onPress={() => onUse(way)}
          testID="use-way"
        />
      </>
    ),
  });
}

/** The really different ones first: nothing changed, capo, retune, both; then all others, best first. */
function shownOf(found: readonly Way[], most: number | undefined): Way[] {
  if (most !== undefined) return differentWays(found, most);
  const kinds = new Set(found.map(({ kind }) => kind)).size;
  const different = differentWays(found, kinds);
  return [...different, ...found.filter((way) => !different.includes(way))];
}

function idOf(into: KeyName | null, way: Way | undefined): string | null {
  return way ? `${into?.tonic} ${way.retune},${way.capo},${way.shapeKey}` : null;
}
