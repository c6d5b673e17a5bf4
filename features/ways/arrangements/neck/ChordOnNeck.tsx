import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { NeckMap } from "@/features/ui/neck/NeckMap";
import { QueryState } from "@/features/ui/QueryState";
import { Segmented } from "@/features/ui/Segmented";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import { glyphs } from "@/shared/music/pitch";
import { chordDegrees } from "@/shared/ways/neck/chordDegrees";
import { parseChord } from "@/shared/music/chord";
import type { ArrangedChord } from "@/shared/ways/arrangements/arrangement";
import type { Shape } from "@/shared/ways/way";
import { tunedStrings, type ArrangedFor } from "../arrangementDraft";
import { arrangementQueries } from "../arrangementQueries";
import { ShapeChoice } from "./ShapeChoice";

export interface ChordOnNeckProps {
  chord: ArrangedChord;
  on: Pick<ArrangedFor, "instrument" | "way">;
  onShape: (shape: Shape) => void;
}

/** One chord on the whole neck with all its shapes, the easiest first, one of them chosen. */
export function ChordOnNeck({ chord, on: { instrument, way }, onShape }: ChordOnNeckProps) {
  const [labels, setLabels] = useState<"degrees" | "notes">("degrees");
  const query = useQuery(arrangementQueries.shapes(chord.played, instrument, way.capo));
  const tuned = tunedStrings(instrument, way.retune);
  const name = glyphs(chord.played);
  const heard = chord.sounding === chord.played ? "" : `, sounds ${glyphs(chord.sounding)}`;
  const tones = parseChord(chord.played);
  return (
    <Card style={{ gap: 14 }} testID="chord-on-neck">
      <View
        style={{
          flexDirection: "row",
          flexWrap: "wrap",
          justifyContent: "space-between",
          alignItems: "center",
          gap: 12,
        }}
      >
        <View style={{ flexShrink: 1 }}>
          <Heading level={2}>{`${name} on the neck${heard}`}</Heading>
          {tones && (
            <Text variant="small" tone="soft">
              {`Its tones: ${chordDegrees(tones)
                .map((degree) => degree.name)
                .join(" ")}. The root is plum.`}
            </Text>
          )}
        </View>
        <View style={{ minWidth: 220 }}>
          <Segmented
            label="What stands on the neck"
            value={labels}
            options={[
              { value: "degrees", label: "Degrees" },
              { value: "notes", label: "Notes" },
            ]}
            onChange={setLabels}
            testID="neck-labels"
          />
        </View>
      </View>
      <NeckMap
        played={chord.played}
        sounding={chord.sounding}
        instrument={instrument}
        capo={way.capo}
        tuned={tuned}
        labels={labels}
        frets={chord.shape?.frets}
        onPoint={({ string, fret }) => {
          const through = query.data?.find((shape) => shape.frets[string] === fret);
          if (through) onShape(through);
        }}
      />
      <QueryState
        query={query}
        title="The shapes could not be found"
        skeleton={<Skeleton bars={[{ height: 120 }]} words="Looking for shapes" />}
      >
        {(shapes) =>
          shapes.length === 0 ? (
            <Text tone="soft">{`${name} has no shape on this instrument.`}</Text>
          ) : (
            <ShapeChoice key={chord.written} chord={chord} shapes={shapes} on={{ instrument, way }} onShape={onShape} />
          )
        }
      </QueryState>
    </Card>
  );
}
