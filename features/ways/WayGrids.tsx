import { Link, type Href } from "expo-router";
import { View } from "react-native";
import { gridWidth, nameLines } from "@/features/ui/chordGridGeometry";
import { webStyle } from "@/features/ui/webStyle";
import type { Instrument } from "@/shared/instruments/instrument";
import { glyphs } from "@/shared/music/pitch";
import type { Way, WayChord } from "@/shared/ways/way";
import { PlayedGrid } from "./PlayedGrid";
import { KnownTick } from "./wishes/KnownTick";

export interface WayGridsProps {
  way: Way;
  instrument: Instrument;
  /** where the player may tell which shapes they know: called with the shape's mark */
  onKnown?: ((mark: string, known: boolean) => void) | undefined;
  /** marks of the shapes the player knows */
  known?: readonly string[];
  /** where a chord is seen on the whole neck */
  onNeck?: ((chord: WayChord) => Href) | undefined;
}

/** The shapes of one way, as many beside each other as there is room for. */
export function WayGrids({ way, instrument, onKnown, known = [], onNeck }: WayGridsProps) {
  const moved = way.retune !== 0 || way.capo !== 0;
  const column = Math.max(80, gridWidth(instrument.strings.length) + 8);
  const lines = Math.max(1, ...way.chords.map(({ played }) => nameLines(glyphs(played)).length));
  const tuned = instrument.strings.map(({ note }, index) => way.strings[index]?.to ?? note);
  return (
    <View
      style={webStyle({
        display: "grid",
        gridTemplateColumns: `repeat(auto-fill, minmax(${column}px, 1fr))`,
        rowGap: 10,
        marginTop: 6,
      })}
    >
      {way.chords.map((chord) => {
        const grid = <PlayedGrid {...{ chord, instrument, tuned, moved, lines }} capo={way.capo} />;
        return (
          <View key={chord.written} style={{ alignItems: "center" }}>
            {onNeck && chord.shape ? (
              <Link
                href={onNeck(chord)}
                testID={`on-neck-${chord.written}`}
                style={webStyle({ display: "block", borderRadius: 10 })}
              >
                {grid}
              </Link>
            ) : (
              grid
            )}
            {onKnown && chord.shape && (
              <KnownTick name={chord.played} frets={chord.shape.frets} known={known} onKnown={onKnown} />
            )}
          </View>
        );
      })}
    </View>
  );
}
