import { useState } from "react";
import { Pressable, View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Chip } from "@/features/ui/Chip";
import { gridWidth } from "@/features/ui/chordGridGeometry";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useRadioKeys } from "@/features/ui/useRadioKeys";
import { webProps, webStyle } from "@/features/ui/webStyle";
import { glyphs } from "@/shared/music/pitch";
import type { ArrangedChord } from "@/shared/ways/arrangements/arrangement";
import type { Shape } from "@/shared/ways/way";
import { difficultyWord } from "../../wayWords";
import { PlayedGrid } from "../../PlayedGrid";
import { tunedStrings, type ArrangedFor } from "../arrangementDraft";
import { placeNames, placesOf, shapesAt, type Place } from "./shapePlaces";

export interface ShapeChoiceProps {
  chord: ArrangedChord;
  /** easiest first */
  shapes: readonly Shape[];
  on: Pick<ArrangedFor, "instrument" | "way">;
  onShape: (shape: Shape) => void;
}

const atFirst = 12;
const markOf = (shape: Pick<Shape, "frets"> | null) => shape?.frets.join() ?? "";

/** All shapes of a chord as a radio group, the easiest first; those of one part of the neck where that is wanted. */
export function ShapeChoice({ chord, shapes, on: { instrument, way }, onShape }: ShapeChoiceProps) {
  const [place, setPlace] = useState<Place>("all");
  const [most, setMost] = useState(atFirst);
  const chosen = markOf(chord.shape);
  const here = shapesAt(shapes, place);
  const shown = here.filter((shape, index) => index < most || markOf(shape) === chosen);
  const marks = shown.map(markOf);
  const byMark = (mark: string) => shown.find((shape) => markOf(shape) === mark);
  const keys = useRadioKeys(marks, marks.includes(chosen) ? chosen : null, (mark) => {
    const shape = byMark(mark);
    if (shape) onShape(shape);
  });
  const column = Math.max(92, gridWidth(instrument.strings.length) + 20);
  const tuned = tunedStrings(instrument, way.retune);
  const places = placesOf(shapes);
  return (
    <View style={{ gap: 8 }}>
      <Heading level={3}>
        {shapes.length === 1 ? "Its one shape" : `Its ${shapes.length} shapes, the easiest first`}
      </Heading>
      {places.length > 2 && (
        <View
          role="group"
          aria-label="Part of the neck"
          style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8 }}
        >
          {places.map((each) => (
            <Chip key={each} label={placeNames[each]} selected={each === place} onPress={() => setPlace(each)} />
          ))}
        </View>
      )}
      <View
        role="radiogroup"
        aria-label={`Shapes of ${glyphs(chord.played)}`}
        testID="shapes"
        style={webStyle({
          display: "grid",
          gridTemplateColumns: `repeat(auto-fill, minmax(${column}px, 1fr))`,
          gap: 8,
        })}
      >
        {shown.map((shape, index) => {
          const isOn = markOf(shape) === chosen;
          return (
            <Pressable
              key={markOf(shape)}
              role="radio"
              aria-checked={isOn}
              onPress={() => onShape(shape)}
              {...webProps(keys(index))}
              style={{
                alignItems: "center",
                paddingVertical: isOn ? 7 : 8,
                borderRadius: 10,
                borderWidth: isOn ? 2 : 1,
                borderColor: isOn ? colors.plum : colors.line,
              }}
            >
              <PlayedGrid
                chord={{ ...chord, shape }}
                instrument={instrument}
                capo={way.capo}
                tuned={tuned}
                moved={false}
              />
              <Text variant="tiny" tone="soft" style={{ marginTop: 2 }}>
                {difficultyWord(1 - shape.ease)}
              </Text>
            </Pressable>
          );
        })}
      </View>
      {here.length > shown.length && (
        <Button
          kind="text"
          small
          icon="down"
          label={`Show ${Math.min(24, here.length - shown.length)} more`}
          onPress={() => setMost(most + 24)}
          style={{ alignSelf: "flex-start" }}
        />
      )}
    </View>
  );
}
