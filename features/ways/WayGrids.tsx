import { View } from "react-native";
import { ChordGrid } from "@/features/ui/ChordGrid";
import { gridWidth, nameLines } from "@/features/ui/chordGridGeometry";
import { Text } from "@/features/ui/Text";
import { webStyle } from "@/features/ui/webStyle";
import { fretName } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";
import { parseChord } from "@/shared/music/chord";
import { glyphs } from "@/shared/music/pitch";
import { insteadOf } from "@/shared/ways/insteadOf";
import type { Way, WayChord } from "@/shared/ways/way";
import { KnownTick } from "./wishes/KnownTick";

export interface WayGridsProps {
  way: Way;
  instrument: Instrument;
  /** where the player may tell which shapes they know: called with the shape's mark */
  onKnown?: ((mark: string, known: boolean) => void) | undefined;
  /** marks of the shapes the player knows */
  known?: readonly string[];
}

/** The shapes of one way, as many beside each other as there is room for. */
export function WayGrids({ way, instrument, onKnown, known = [] }: WayGridsProps) {
  const moved = way.retune !== 0 || way.capo !== 0;
  const column = Math.max(80, gridWidth(instrument.strings.length) + 8);
  const lines = Math.max(1, ...way.chords.map(({ played }) => nameLines(glyphs(played)).length));
  return (
    <View
      style={webStyle({
        display: "grid",
        gridTemplateColumns: `repeat(auto-fill, minmax(${column}px, 1fr))`,
        rowGap: 10,
        marginTop: 6,
      })}
    >
      {way.chords.map((chord) => (
        <View key={chord.written} style={{ alignItems: "center" }}>
          <Grid chord={chord} way={way} instrument={instrument} moved={moved} lines={lines} />
          {onKnown && chord.shape && (
            <KnownTick name={chord.played} frets={chord.shape.frets} known={known} onKnown={onKnown} />
          )}
        </View>
      ))}
    </View>
  );
}

function Grid({
  chord,
  way,
  instrument,
  moved,
  lines,
}: {
  chord: WayChord;
  way: Way;
  instrument: Instrument;
  moved: boolean;
  /** how many lines the names of this card take */
  lines: number;
}) {
  const sounds = moved ? { sounds: glyphs(chord.sounding) } : null;
  if (chord.shape)
    return (
      <View style={{ alignItems: "center" }}>
        <ChordGrid
          name={glyphs(chord.played)}
          shape={chord.shape}
          strings={instrument.strings.length}
          capo={way.capo}
          leftHanded={instrument.leftHanded}
          nameHeight={lines}
          stringNames={instrument.strings.map(({ note }, index) => way.strings[index]?.to ?? note)}
          {...(instrument.fretMap && way.capo === 0 ? { fretNames: fretNames(instrument) } : null)}
          {...sounds}
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
          {`No shape here: ${insteadOf(chord.played, instrument, way.capo)}`}
        </Text>
      )}
    </View>
  );
}

/** What players call the frets, from the nut: "6½" stands between 6 and 7 on a diatonic fretboard. */
function fretNames(instrument: Instrument): string[] {
  return Array.from({ length: instrument.frets + 1 }, (_, fret) => fretName(instrument, fret));
}
