import { useState } from "react";
import { View } from "react-native";
import Svg, { Circle, G, Line, Path, Rect } from "react-native-svg";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { tonicPitchClass } from "@/shared/music/keyName";
import { glyphs, noteName, pitchClass, type Spelling } from "@/shared/music/pitch";
import type { MelodyNote } from "@/shared/songs/melody";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors, mixtures } from "@/features/ui/theme";
import { webProps } from "@/features/ui/webStyle";
import { ground, Hatch, useDrawingId } from "./Hatch";
import { isNatural, ladderWords, sideOf, zoneOf, type Scale } from "./ladderGeometry";

export interface NoteLineProps {
  notes: readonly MelodyNote[];
  home: string;
  voice: SingingVoice | null;
  /** first and last chosen note */
  chosen: { from: number; to: number } | null;
  /** a press on a note; the same can be done in the list of notes */
  onPress?: (index: number) => void;
  spelling?: Spelling;
  testID?: string;
}

const namesWide = 34;
const rung = 12;
const pad = 10;
/** px a quarter note, where the tune is too long for the width; it then scrolls. */
const leastBeat = 16;

/** A tune from left to right over the rungs of the ladder, with the bands of the voice behind it. */
export function NoteLine({ notes, home, voice, chosen, onPress, spelling = "common", testID }: NoteLineProps) {
  const [room, setRoom] = useState(0);
  const id = useDrawingId();
  if (notes.length === 0) return null;
  const pitches = notes.map(({ midi }) => Math.round(midi));
  const scale = { low: Math.min(...pitches) - 2, high: Math.max(...pitches) + 2 };
  const height = (scale.high - scale.low) * rung + 2 * pad;
  const y = (midi: number) => pad + (scale.high - midi) * rung;
  const total = Math.max(...notes.map(({ start, duration }) => start + duration));
  const beat = Math.max(leastBeat, (room - namesWide - 8) / total);
  const width = Math.max(room - namesWide, total * beat + 8);
  const homeClass = tonicPitchClass(home);
  const nearest = (x: number): number => {
    const at = x / beat;
    const index = notes.findLastIndex(({ start }) => start <= at);
    return Math.max(0, index);
  };
  return (
    <View
      testID={testID}
      onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout.width)}
      style={{ flexDirection: "row", height: height + 2 }}
    >
      <Svg width={namesWide} height={height} aria-hidden style={{ flexShrink: 0 }}>
        {rungsOf(scale).map((midi) => (
          <SvgLabel
            key={midi}
            x={namesWide - 8}
            y={y(midi) + 4.2}
            size={12}
            family="display"
            weight="600"
            anchor="end"
            fill={midi % 12 === 0 ? colors.ink : colors.inkSoft}
          >
            {glyphs(noteName(midi, spelling))}
          </SvgLabel>
        ))}
      </Svg>
      {room > 0 && (
        <View
          style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0, overflow: "scroll" }}
          {...webProps({
            tabIndex: width > room - namesWide ? 0 : undefined,
            role: "group",
            "aria-label": "Picture of the tune",
            onClick: (event: { nativeEvent: { offsetX: number } }) => onPress?.(nearest(event.nativeEvent.offsetX)),
          })}
        >
          <Svg
            width={width}
            height={height}
            viewBox={`0 0 ${width} ${height}`}
            role="img"
            aria-label={`${notes.length} notes in time. ${ladderWords(voice, [], spelling)}`}
          >
            <Hatch id={`${id}h`} pitch={6} line={2.4} />
            <Hatch id={`${id}b`} pitch={6} line={1} lineOpacity={0.35} under="none" />
            {voice && <Stripes id={id} voice={voice} scale={scale} y={y} width={width} height={height} />}
            {rungsOf(scale).map((midi) => (
              <Line
                key={midi}
                x1={0}
                x2={width}
                y1={y(midi)}
                y2={y(midi)}
                stroke={midi % 12 === 0 ? mixtures.rungC : colors.line}
                strokeWidth={1}
              />
            ))}
            {notes.map((note, index) => (
              <NoteBar
                key={index}
                id={id}
                x={note.start * beat + 2}
                y={y(Math.round(note.midi))}
                long={Math.max(7, note.duration * beat - 2)}
                midi={Math.round(note.midi)}
                voice={voice}
                home={pitchClass(note.midi) === homeClass}
                chosen={chosen !== null && index >= chosen.from && index <= chosen.to}
              />
            ))}
          </Svg>
        </View>
      )}
    </View>
  );
}

interface NoteBarProps {
  id: string;
  x: number;
  y: number;
  long: number;
  midi: number;
  voice: SingingVoice | null;
  home: boolean;
  chosen: boolean;
}

function NoteBar({ id, x, y, long, midi, voice, home, chosen }: NoteBarProps) {
  const zone = voice && zoneOf(midi, voice);
  const beyond = zone === "beyond";
  const outlined = zone === "reach" || beyond;
  const shade = beyond ? colors.brick : zone === "reach" ? colors.honey : zone === null ? colors.ink : colors.lagoon;
  const up = voice === null || sideOf(midi, voice) === "above";
  return (
    <G>
      {chosen && (
        <Rect
          x={x - 3.5}
          y={y - 8.5}
          width={long + 7}
          height={17}
          rx={8}
          fill="none"
          stroke={colors.plum}
          strokeWidth={2}
        />
      )}
      <Rect
        x={x}
        y={y - 5}
        width={long}
        height={10}
        rx={5}
        fill={beyond ? ground : zone === "reach" ? `url(#${id}h)` : shade}
        stroke={outlined ? shade : "none"}
        strokeWidth={1.5}
        {...(beyond ? { strokeDasharray: "0.1 3.2", strokeLinecap: "round" as const } : null)}
      />
      {home && <Circle cx={x + 5} cy={y} r={2.2} fill={outlined ? shade : ground} />}
      {beyond && <Path d={up ? `M${x} ${y - 8}h8l-4 -6z` : `M${x} ${y + 8}h8l-4 6z`} fill={colors.brick} />}
    </G>
  );
}

interface StripesProps {
  id: string;
  voice: SingingVoice;
  scale: Scale;
  y: (midi: number) => number;
  width: number;
  height: number;
}

function Stripes({ id, voice, y, width, height }: StripesProps) {
  const clamp = (at: number) => Math.max(0, Math.min(height, at));
  const edge = (midi: number, side: -1 | 1) => clamp(y(Math.round(midi)) - (side * rung) / 2);
  const [top, softTop] = [edge(voice.range.highMidi, 1), edge(voice.comfort.highMidi, 1)];
  const [softFoot, foot] = [edge(voice.comfort.lowMidi, -1), edge(voice.range.lowMidi, -1)];
  return (
    <G>
      <Rect x={0} y={top} width={width} height={softTop - top} fill={`url(#${id}b)`} />
      <Rect x={0} y={softTop} width={width} height={Math.max(0, softFoot - softTop)} fill={mixtures.band} />
      <Rect x={0} y={softFoot} width={width} height={foot - softFoot} fill={`url(#${id}b)`} />
    </G>
  );
}

function rungsOf(scale: Scale): number[] {
  return Array.from({ length: scale.high - scale.low + 1 }, (_, k) => scale.high - k).filter(isNatural);
}
