import { useState } from "react";
import { View } from "react-native";
import Svg, { Circle, G, Line, Rect } from "react-native-svg";
import { IconButton } from "@/features/ui/IconButton";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import { tonicPitchClass } from "@/shared/music/keyName";
import { glyphs, noteName, pitchClass } from "@/shared/music/pitch";
import type { MelodyNote } from "@/shared/songs/melody";
import { melodyPages, pageWords, placedWords } from "./melodyPages";

export interface MelodyPictureProps {
  notes: readonly MelodyNote[];
  /** home note, marked by a dot; "" where none is known */
  home: string;
  /** the note that sounds now; its part of the tune is shown */
  sounding: number | null;
}

const names = 36;
const pad = 12;
const line = 18;
/** px a quarter note at least, so that most syllables have room. */
const leastBeat = 24;

/** A tune on the rungs of the span from left to right, a part of it at a time, its words under it. */
export function MelodyPicture({ notes, home, sounding }: MelodyPictureProps) {
  const [room, setRoom] = useState(0);
  const [turned, setTurned] = useState(0);
  const width = Math.max(120, room);
  const end = notes.reduce((latest, note) => Math.max(latest, note.start + note.duration), 0);
  const fits = Math.max(4, 4 * Math.floor((width - names - pad) / leastBeat / 4));
  // A short tune takes the whole width.
  const beats = Math.min(fits, Math.max(8, Math.ceil(end)));
  const pages = melodyPages(notes, beats);
  const followed =
    sounding === null ? -1 : pages.findIndex((page) => page.notes.some(({ index }) => index === sounding));
  const number = Math.min(followed >= 0 ? followed : turned, pages.length - 1);
  const page = pages[number];
  if (!page) return null;
  const pitches = notes.map(({ midi }) => Math.round(midi));
  const low = pitches.reduce((a, b) => Math.min(a, b)) - 1;
  const high = pitches.reduce((a, b) => Math.max(a, b)) + 1;
  const rung = Math.max(4, Math.min(14, 220 / (high - low)));
  const foot = pad + (high - low) * rung;
  const worded = notes.some(({ lyric }) => lyric !== undefined);
  const height = foot + pad + (worded ? 2 * line : 0);
  const y = (midi: number) => pad + (high - midi) * rung;
  const beat = (width - names - pad) / beats;
  const x = (at: number) => names + (at - page.from) * beat;
  const homeClass = home === "" ? null : tonicPitchClass(home);
  const rungs = Array.from({ length: high - low + 1 }, (_, k) => high - k).filter((midi) =>
    rung >= 7 ? ![1, 3, 6, 8, 10].includes(midi % 12) : midi % 12 === 0 || midi % 12 === 7,
  );
  const turn = (by: number) => setTurned(Math.max(0, Math.min(pages.length - 1, number + by)));
  return (
    <View onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout.width)} style={{ gap: 4, alignSelf: "stretch" }}>
      <View role="img" aria-label={pageWords(page, number + 1, pages.length)} testID="melody-picture">
        <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden>
          {rungs.map((midi) => (
            <G key={midi}>
              <Line
                x1={names}
                x2={width}
                y1={y(midi)}
                y2={y(midi)}
                stroke={midi % 12 === 0 ? mixtures.rungC : colors.line}
                strokeWidth={1}
              />
              <SvgLabel
                x={names - 8}
                y={y(midi) + 4}
                size={12}
                family="display"
                weight="600"
                anchor="end"
                fill={midi % 12 === 0 ? colors.ink : colors.inkSoft}
              >
                {glyphs(noteName(midi))}
              </SvgLabel>
            </G>
          ))}
          {page.notes.map(({ note, index }) => {
            const on = index === sounding;
            const long = Math.max(5, Math.min(note.duration, page.to - note.start) * beat - 2);
            const tall = Math.min(10, rung + 2);
            return (
              <G key={index}>
                <Rect
                  x={x(note.start)}
                  y={y(note.midi) - tall / 2}
                  width={long}
                  height={tall}
                  rx={tall / 2}
                  fill={on ? colors.plum : colors.ink}
                />
                {on && (
                  <Rect
                    x={x(note.start) - 3}
                    y={y(note.midi) - tall / 2 - 3}
                    width={long + 6}
                    height={tall + 6}
                    rx={tall / 2 + 3}
                    fill="none"
                    stroke={colors.plum}
                    strokeWidth={1.5}
                  />
                )}
                {pitchClass(Math.round(note.midi)) === homeClass && (
                  <Circle
                    cx={x(note.start) + tall / 2}
                    cy={y(note.midi)}
                    r={Math.min(2.2, tall / 4)}
                    fill="var(--ground,var(--paper))"
                  />
                )}
              </G>
            );
          })}
          {placedWords(page, x, 6.4).map(({ x: at, row, text }, index) => (
            <SvgLabel key={index} x={at} y={foot + pad + 10 + row * line} size={12} fill={colors.ink}>
              {text}
            </SvgLabel>
          ))}
        </Svg>
      </View>
      {pages.length > 1 && (
        <View style={{ flexDirection: "row", alignItems: "center", gap: 4 }}>
          <IconButton icon="back" label="Earlier part of the tune" disabled={number === 0} onPress={() => turn(-1)} />
          <Text variant="small" tone="soft">{`Part ${number + 1} of ${pages.length}`}</Text>
          <IconButton
            icon="forward"
            label="Later part of the tune"
            disabled={number === pages.length - 1}
            onPress={() => turn(1)}
          />
        </View>
      )}
    </View>
  );
}
