import { useMemo } from "react";
import { View } from "react-native";
import { ChordGrid } from "@/features/ui/ChordGrid";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { gridWidth } from "@/features/ui/chordGridGeometry";
import { webStyle } from "@/features/ui/webStyle";
import { fretName } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";
import { parseChord } from "@/shared/music/chord";
import { glyphs } from "@/shared/music/pitch";
import { findShapes } from "@/shared/ways/findShapes";
import type { Shape } from "@/shared/ways/way";
import { KnownTick } from "./KnownTick";
import { ticksOn } from "./shapeTicks";
import { useWishes } from "./useWishes";

/** Chords that players learn first, by kind. */
const learned = [
  ["Major", "C D E F G A B Bb Eb Ab"],
  ["Minor", "Am Bm Cm Dm Em F#m Gm"],
  ["Sevenths", "A7 B7 C7 D7 E7 G7"],
] as const;
/** Shapes offered of each chord, within so many frets. */
const offered = { shapes: 2, maxFret: 7 };

/** The usual shapes of an instrument, to be ticked by who knows them. */
export function KnownShapes({ instrument }: { instrument: Instrument }) {
  const [wishes, keep, error] = useWishes();
  const { known, onKnown } = ticksOn(instrument, wishes, keep);
  const groups = useMemo(() => groupsOf(instrument), [instrument]);
  const names = instrument.strings.map(({ note }) => note);
  const fretNames = instrument.fretMap
    ? Array.from({ length: instrument.frets + 1 }, (_, fret) => fretName(instrument, fret))
    : undefined;
  return (
    <View style={{ gap: 20 }}>
      <Text tone="soft">
        Tick what your fingers know. Ways made of these shapes move up, and the others say which shape is new. A shape
        without open strings counts everywhere on the neck.
      </Text>
      {error && (
        <Notice
          kind="error"
          title="This is not saved"
        >{`${error.message} What you ticked before is safe; try again.`}</Notice>
      )}
      <Text variant="label" aria-live="polite" testID="known-count">
        {known.length === 0 ? "None ticked yet." : `${known.length} ${known.length === 1 ? "shape" : "shapes"} ticked.`}
      </Text>
      {groups.map(([title, shapes]) => (
        <View key={title} style={{ gap: 8 }}>
          <Heading level={2}>{title}</Heading>
          {shapes.length === 0 && (
            <Text variant="small" tone="soft">
              This instrument has no shape for these chords.
            </Text>
          )}
          <View
            style={webStyle({
              display: "grid",
              gridTemplateColumns: `repeat(auto-fill, minmax(${Math.max(104, gridWidth(names.length) + 8)}px, 1fr))`,
              rowGap: 14,
            })}
          >
            {shapes.map(({ name, shape }) => (
              <View key={`${name} ${shape.frets.join()}`} style={{ alignItems: "center" }}>
                <ChordGrid
                  name={glyphs(name)}
                  shape={shape}
                  strings={names.length}
                  leftHanded={instrument.leftHanded}
                  stringNames={names}
                  fretNames={fretNames}
                />
                <KnownTick name={name} frets={shape.frets} known={known} onKnown={onKnown} />
              </View>
            ))}
          </View>
        </View>
      ))}
    </View>
  );
}

function groupsOf(instrument: Instrument): [title: string, shapes: { name: string; shape: Shape }[]][] {
  return learned.map(([title, names]) => [
    title,
    names.split(" ").flatMap((name) => {
      const chord = parseChord(name);
      if (!chord) return [];
      const shapes = findShapes(chord, instrument, { maxFret: offered.maxFret }).slice(0, offered.shapes);
      return shapes.map((shape) => ({ name, shape }));
    }),
  ]);
}
