import Svg, { Circle, G, Line } from "react-native-svg";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import { fretName, fretPosition, fretSemitones } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";
import { isWound } from "@/shared/instruments/tension";
import { glyphs } from "@/shared/music/pitch";
import { neckWords } from "./neckWords";

export interface NeckPictureProps {
  instrument: Omit<Instrument, "id">;
  /** the string that sounds */
  sounding?: number | null;
}

const width = 340;
const names = 34;
const stringGap = 20;
const top = 14;
/** Fret names closer than this stand on one another. */
const nameGap = 15;

/** The whole neck from the side of the player's eyes: frets where they stand, strings as thick as they are, bass at the foot. */
export function NeckPicture({ instrument, sounding = null }: NeckPictureProps) {
  const { strings, frets, scaleMm, leftHanded } = instrument;
  const last = fretSemitones(instrument, frets) ?? frets;
  const along = (semitones: number) =>
    (fretPosition(scaleMm, semitones) / fretPosition(scaleMm, last)) * (width - names - 8);
  const x = (semitones: number) => (leftHanded ? width - names - along(semitones) : names + along(semitones));
  const foot = top + (strings.length - 1) * stringGap;
  const y = (index: number) => foot - index * stringGap;
  const all = Array.from({ length: frets }, (_, k) => ({ fret: k + 1, at: fretSemitones(instrument, k + 1) ?? k + 1 }));
  let lastNamed = -Infinity;
  return (
    <Svg
      width="100%"
      viewBox={`0 0 ${width} ${foot + 30}`}
      role="img"
      aria-label={neckWords(instrument)}
      style={webStyle({ maxWidth: 680, height: "auto", display: "block" })}
      testID="neck"
    >
      {all.map(({ fret, at }) => {
        const here = along(at);
        const named = here - lastNamed >= nameGap;
        if (named) lastNamed = here;
        return (
          <G key={fret}>
            <Line
              x1={x(at)}
              x2={x(at)}
              y1={top - 7}
              y2={foot + 7}
              stroke={colors.inkSoft}
              strokeOpacity={0.6}
              strokeWidth={1}
            />
            {named && (
              <SvgLabel x={x(at)} y={foot + 24} size={10} family="display" weight="600" anchor="middle">
                {fretName(instrument, fret)}
              </SvgLabel>
            )}
          </G>
        );
      })}
      <Line x1={x(0)} x2={x(0)} y1={top - 8} y2={foot + 8} stroke={colors.ink} strokeWidth={4} strokeLinecap="round" />
      {strings.map((string, index) => {
        const from = string.startsAtFret ? (fretSemitones(instrument, string.startsAtFret) ?? 0) : 0;
        const on = sounding === index;
        const count = string.inCourse ?? 1;
        return (
          <G key={index}>
            {Array.from({ length: count }, (_, k) => (
              <Line
                key={k}
                x1={x(from)}
                x2={leftHanded ? 4 : width - 4}
                y1={y(index) + (k - (count - 1) / 2) * 4}
                y2={y(index) + (k - (count - 1) / 2) * 4}
                stroke={on ? colors.plum : colors.ink}
                strokeWidth={(on ? 1.5 : 0) + thickness(string.gaugeIn)}
                {...(isWound(string.material) ? { strokeDasharray: "2.4 0.8" } : null)}
              />
            ))}
            {from > 0 && <Circle cx={x(from)} cy={y(index)} r={3.5} fill={colors.ink} />}
            <SvgLabel
              x={leftHanded ? width - names + 8 : names - 8}
              y={y(index) + 4}
              size={11}
              family="display"
              weight="600"
              anchor={leftHanded ? "start" : "end"}
              fill={on ? colors.plum : colors.ink}
            >
              {glyphs(string.note)}
            </SvgLabel>
          </G>
        );
      })}
    </Svg>
  );
}

/** px; a string of unknown gauge in a middling line. */
function thickness(gaugeIn: number | null): number {
  return gaugeIn === null ? 1.4 : Math.min(3.2, 0.8 + gaugeIn * 45);
}
