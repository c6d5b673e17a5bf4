import { useId } from "react";
import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { Chip } from "@/features/ui/Chip";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { StrokeLine } from "@/features/ui/StrokeLine";
import { Text } from "@/features/ui/Text";
import { placeWords } from "@/shared/ways/arrangements/arrangementWords";
import { sheetStrokes } from "@/shared/sheets/sheetStrokes";
import { ArrangedGrids } from "./ArrangedGrids";
import { arrangementPlan, effortWords, metreFor, tunedStrings } from "./arrangementDraft";
import type { ArrangementEntry } from "./arrangementEntry";
import { HearButton } from "./HearButton";
import type { HearingDesk } from "./hearingDesk";

export interface ArrangementCardProps {
  entry: ArrangementEntry;
  /** key and instrument, where they are not those of the page */
  where: string | null;
  desk: HearingDesk;
  compared: boolean;
  onCompare: () => void;
}

/** One arrangement of a list: what it asks, where it lies, its shapes, its sound, and the way to change it. */
export function ArrangementCard({ entry, where, desk, compared, onCompare }: ArrangementCardProps) {
  const id = useId();
  const { draft, on, weight, kept, href } = entry;
  const heard = desk.heard === entry.id;
  return (
    <View role="group" aria-labelledby={`${id}-title`} style={{ display: "flex" }} testID={`arrangement-${entry.id}`}>
      <Card selected={compared} style={{ flexGrow: 1, gap: 10 }}>
        <View nativeID={`${id}-title`}>
          <Heading level={3}>{draft.name}</Heading>
        </View>
        <Text variant="small" tone="soft">
          {[where, effortWords(weight), placeWords(weight, tunedStrings(on.instrument, on.way.retune))]
            .filter((words) => words !== null)
            .join(" ")}
        </Text>
        <ArrangedGrids chords={draft.chords} on={on} />
        {kept && <StrokeLine strokes={sheetStrokes(draft.pattern, metreFor(on.song))} width={200} />}
        {heard && desk.lights}
        <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", gap: 8, marginTop: "auto" }}>
          <HearButton desk={desk} id={entry.id} plan={() => arrangementPlan(draft, on)} label={draft.name} small />
          <LinkButton
            kind="secondary"
            small
            label={kept ? "Open" : "Take it up"}
            accessibleName={`${kept ? "Open" : "Take it up"}: ${draft.name}`}
            href={href}
            testID={`open-${entry.id}`}
          />
          <Chip label="Compare" selected={compared} onPress={onCompare} testID={`compare-${entry.id}`} />
        </View>
      </Card>
    </View>
  );
}
