import { View } from "react-native";
import { gridWidth, nameLines } from "@/features/ui/chordGridGeometry";
import { webStyle } from "@/features/ui/webStyle";
import { glyphs } from "@/shared/music/pitch";
import type { ArrangedChord } from "@/shared/ways/arrangements/arrangement";
import { PlayedGrid } from "../PlayedGrid";
import { tunedStrings, type ArrangedFor } from "./arrangementDraft";

export interface ArrangedGridsProps {
  chords: readonly ArrangedChord[];
  on: Pick<ArrangedFor, "instrument" | "way">;
}

/** The shapes of one arrangement, as many beside each other as there is room for. */
export function ArrangedGrids({ chords, on: { instrument, way } }: ArrangedGridsProps) {
  const column = Math.max(80, gridWidth(instrument.strings.length) + 8);
  const lines = Math.max(1, ...chords.map(({ played }) => nameLines(glyphs(played)).length));
  const tuned = tunedStrings(instrument, way.retune);
  const moved = way.retune !== 0 || way.capo !== 0;
  return (
    <View
      style={webStyle({
        display: "grid",
        gridTemplateColumns: `repeat(auto-fill, minmax(${column}px, 1fr))`,
        rowGap: 10,
      })}
    >
      {chords.map((chord) => (
        <PlayedGrid key={chord.written} {...{ chord, instrument, tuned, moved, lines }} capo={way.capo} />
      ))}
    </View>
  );
}
