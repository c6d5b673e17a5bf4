import { useState } from "react";
import { View } from "react-native";
import Svg, { Line, Path, Rect } from "react-native-svg";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors, mixtures } from "@/features/ui/theme";
import type { PhraseMeasures } from "@/shared/keys/takeMeasures";
import { glyphs, noteName } from "@/shared/music/pitch";
import type { PlannedNote } from "@/shared/songs/backing/backingPlan";
import { octavesOff, type SungPicture } from "./sungPicture";

export interface PhrasePictureProps {
  phrase: PhraseMeasures;
  /** the notes of this phrase */
  notes: readonly PlannedNote[];
  picture: SungPicture;
  spelling: "sharps" | "flats";
  start: number;
  end: number;
  height: number;
}

const barPx = 9;
/** Names of the lowest and highest note stand right of the picture. */
const namesPx = 34;

/** The notes of a phrase as wanted, and the singing on them. Where it was sung in another octave it is shown in the tune's. */
export function PhrasePicture({ phrase, notes, picture, spelling, start, end, height }: PhrasePictureProps) {
  const [whole, setWidth] = useState(0);
  const width = Math.max(0, whole - namesPx);
  const sung = picture.notes.filter((note) => note.end > start && note.start < end);
  const octaves = octavesOff(
    notes.map(({ midi }) => midi),
    sung.map(({ midi }) => midi),
  );
  const low = phrase.lowMidi - 2;
  const high = Math.max(phrase.highMidi + 2, low + 8);
  const y = (midi: number) => 8 + ((high - Math.min(high, Math.max(low, midi))) * (height - 16)) / (high - low);
  const x = (t: number) => (Math.min(1, Math.max(0, (t - start) / (end - start))) * width).toFixed(1);
  const first = notes[0]?.at ?? 0;
  const last = notes.at(-1);
  const length = last ? last.at + last.duration - first : 1;
  const name = (midi: number) => glyphs(noteName(midi, spelling));
  return (
    <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ height }}>
      {width > 0 && (
        <Svg
          width={whole}
          height={height}
          viewBox={`0 0 ${whole} ${height}`}
          role="img"
          aria-label={`The phrase runs from ${name(phrase.lowMidi)} to ${name(phrase.highMidi)}. ${sung.length} notes were sung in it.`}
        >
          <Line x1={0} x2={width} y1={y(low)} y2={y(low)} stroke={colors.line} />
          {notes.map(({ at, duration, midi }, k) => (
            <Rect
              key={k}
              x={((at - first) / length) * width}
              y={y(midi) - barPx / 2}
              width={Math.max(3, (duration / length) * width - 2)}
              height={barPx}
              rx={barPx / 2}
              fill={mixtures.tint}
              stroke={colors.lagoon}
              strokeWidth={1.25}
            />
          ))}
          <Path
            d={sung
              .map(
                (note) =>
                  `M${x(note.start)} ${y(note.midi - 12 * octaves)}L${x(note.end)} ${y(note.midi - 12 * octaves)}`,
              )
              .join("")}
            stroke={colors.plum}
            strokeWidth={3.5}
            strokeLinecap="round"
            fill="none"
          />
          {[phrase.highMidi, phrase.lowMidi].map((midi) => (
            <SvgLabel key={midi} x={whole} y={y(midi) + 4.5} size={13} family="display" weight="600" anchor="end">
              {name(midi)}
            </SvgLabel>
          ))}
        </Svg>
      )}
    </View>
  );
}
