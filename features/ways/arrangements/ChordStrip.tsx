import { Pressable, View } from "react-native";
import { gridWidth, nameLines } from "@/features/ui/chordGridGeometry";
import { colors } from "@/features/ui/theme";
import { useRadioKeys } from "@/features/ui/useRadioKeys";
import { webProps, webStyle } from "@/features/ui/webStyle";
import { glyphs } from "@/shared/music/pitch";
import type { ArrangedChord } from "@/shared/ways/arrangements/arrangement";
import { PlayedGrid } from "../PlayedGrid";
import { tunedStrings, type ArrangedFor } from "./arrangementDraft";

export interface ChordStripProps {
  chords: readonly ArrangedChord[];
  on: Pick<ArrangedFor, "instrument" | "way">;
  /** as written: the chord that is open on the neck */
  open: string;
  onOpen: (written: string) => void;
}

/** The song's chords with their shapes; the one that is changed on the neck is chosen here. */
export function ChordStrip({ chords, on: { instrument, way }, open, onOpen }: ChordStripProps) {
  const keys = useRadioKeys(
    chords.map(({ written }) => written),
    open,
    onOpen,
  );
  const column = Math.max(92, gridWidth(instrument.strings.length) + 20);
  const lines = Math.max(1, ...chords.map(({ played }) => nameLines(glyphs(played)).length));
  const tuned = tunedStrings(instrument, way.retune);
  const moved = way.retune !== 0 || way.capo !== 0;
  return (
    <View
      role="radiogroup"
      aria-label="Chords of the song; the chosen one is open on the neck"
      testID="arranged-chords"
      style={webStyle({
        display: "grid",
        gridTemplateColumns: `repeat(auto-fill, minmax(${column}px, 1fr))`,
        gap: 8,
      })}
    >
      {chords.map((chord, index) => {
        const on = chord.written === open;
        return (
          <Pressable
            key={chord.written}
            role="radio"
            aria-checked={on}
            onPress={() => onOpen(chord.written)}
            testID={`arranged-${chord.written}`}
            {...webProps(keys(index))}
            style={{
              alignItems: "center",
              minHeight: 48,
              paddingVertical: on ? 7 : 8,
              borderRadius: 10,
              borderWidth: on ? 2 : 1,
              borderColor: on ? colors.plum : colors.line,
              backgroundColor: colors.card,
            }}
          >
            <PlayedGrid {...{ chord, instrument, tuned, moved, lines }} capo={way.capo} />
          </Pressable>
        );
      })}
    </View>
  );
}
