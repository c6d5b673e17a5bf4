import { View } from "react-native";
import { ChordGrid } from "@/features/ui/ChordGrid";
import { Text } from "@/features/ui/Text";
import { fretName } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";
import { parseChord } from "@/shared/music/chord";
import { glyphs } from "@/shared/music/pitch";
import { insteadOf } from "@/shared/ways/insteadOf";
import type { WayChord } from "@/shared/ways/way";

export interface PlayedGridProps {
  chord: Pick<WayChord, "played" | "sounding" | "shape">;
  instrument: Instrument;
  capo: number;
  /** notes of the strings as tuned */
  tuned: readonly string[];
  /** something is retuned or clamped: what is heard stands under the grid */
  moved: boolean;
  /** how many lines the names of the grids beside it take */
  lines?: number;
}

/** One chord of a song under the fingers, or what to play where the instrument has no shape. */
export function PlayedGrid({ chord, instrument, capo, tuned, moved, lines = 1 }: PlayedGridProps) {
  if (chord.shape)
    return (
      <View style={{ alignItems: "center" }}>
        <ChordGrid
          name={glyphs(chord.played)}
          shape={chord.shape}
          strings={instrument.strings.length}
          capo={capo}
          leftHanded={instrument.leftHanded}
          nameHeight={lines}
          stringNames={tuned}
          {...(instrument.fretMap && capo === 0 ? { fretNames: fretNames(instrument) } : null)}
          {...(moved ? { sounds: glyphs(chord.sounding) } : null)}
        />
      </View>
    );
  return (
    <View style={{ alignItems: "center", gap: 6 }}>
      <Text variant="monoBold" style={{ fontSize: 14, lineHeight: 18 }}>
        {glyphs(chord.played)}
      </Text>
      {parseChord(chord.played) && (
        <Text variant="tiny" tone="brick" style={{ textAlign: "center" }}>
          {`No shape here: ${insteadOf(chord.played, instrument, capo)}`}
        </Text>
      )}
    </View>
  );
}

/** What players call the frets, from the nut: "6½" stands between 6 and 7 on a diatonic fretboard. */
function fretNames(instrument: Instrument): string[] {
  return Array.from({ length: instrument.frets + 1 }, (_, fret) => fretName(instrument, fret));
}
