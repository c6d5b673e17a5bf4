import { useEffect, useMemo, useRef, type MouseEvent } from "react";
import Svg, { Circle, G, Line, Rect } from "react-native-svg";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { fretName } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";
import { parseChord } from "@/shared/music/chord";
import { glyphs } from "@/shared/music/pitch";
import { neckPositions, type NeckPosition } from "@/shared/ways/neck/neckPositions";
import { neckWords } from "@/shared/ways/neck/neckWords";
import { neckLayout, placeRadius, placeX, type NeckLayout } from "./neckGeometry";

export interface NeckMapProps {
  /** the shape's chord, ASCII */
  played: string;
  /** what is heard, ASCII */
  sounding: string;
  instrument: Instrument;
  capo?: number;
  /** notes of the strings as tuned; the instrument's own unless told otherwise */
  tuned?: readonly string[];
  labels: "degrees" | "notes";
  /** frets of the shape that stands out, counted from nut or capo; null on silent strings */
  frets?: readonly (number | null)[] | undefined;
  /** somebody pointed at a place; the keyboard has other ways to the same */
  onPoint?: (place: NeckPosition) => void;
}

/** Fret names closer than this stand on one another. */
const nameGap = 17;
/** A press so near to a place means it. */
const nearPx = 24;

/** All places of a chord on the whole neck, roots filled plum; scrolls sideways in its own box where there is no room. */
export function NeckMap({ played, sounding, instrument, capo = 0, tuned, labels, frets, onPoint }: NeckMapProps) {
  const wide = useLayout() === "wide";
  const box = useRef<HTMLDivElement>(null);
  const chord = useMemo(() => parseChord(played), [played]);
  const places = useMemo(
    () => (chord ? neckPositions(chord, parseChord(sounding)?.root ?? chord.root, instrument, capo) : []),
    [chord, sounding, instrument, capo],
  );
  const layout = useMemo(() => neckLayout(instrument, wide ? 1.5 : 1.12), [instrument, wide]);
  const names = (tuned ?? instrument.strings.map(({ note }) => note)).map(glyphs);
  const name = played === sounding ? glyphs(played) : `${glyphs(played)} shapes, sounding ${glyphs(sounding)},`;
  const words = neckWords(places, instrument, { name, capo, stringNames: names, labels });
  const mark = frets?.join();
  useEffect(() => {
    // The shape that stands out is brought into view, as far as the box scrolls.
    const stopped = (mark ?? "")
      .split(",")
      .map(Number)
      .filter((fret) => fret > 0);
    const around = stopped.length > 0 ? stopped.reduce((sum, fret) => sum + fret, 0) / stopped.length : 0;
    const room = box.current;
    if (room) room.scrollLeft = layout.space(Math.round(around) + capo) - room.clientWidth / 2;
  }, [mark, capo, layout]);
  const point = (event: MouseEvent<HTMLDivElement>) => {
    const drawing = event.currentTarget.getBoundingClientRect();
    const at = { x: event.clientX - drawing.left, y: event.clientY - drawing.top };
    const far = (place: NeckPosition) =>
      Math.hypot(placeX(layout, place, instrument, capo) - at.x, layout.y(place.string) - at.y);
    const nearest = [...places].sort((a, b) => far(a) - far(b))[0];
    if (nearest && far(nearest) <= nearPx) onPoint?.(nearest);
  };
  return (
    <div
      ref={box}
      role="region"
      aria-label="Neck, scrolls sideways"
      tabIndex={0}
      style={{ overflowX: "auto", overflowY: "hidden", position: "relative" }}
      data-testid="neck-map"
    >
      <div onClick={onPoint ? point : undefined} style={{ width: layout.width, cursor: onPoint ? "pointer" : "auto" }}>
        <Svg width={layout.width} height={layout.height} role="img" aria-label={words}>
          <Wood instrument={instrument} capo={capo} layout={layout} names={names} />
          {frets?.map(
            (fret, string) =>
              fret === null && (
                <Line
                  key={string}
                  x1={layout.space(0) - 5}
                  x2={layout.space(0) + 5}
                  y1={layout.y(string)}
                  y2={layout.y(string)}
                  stroke={colors.inkSoft}
                  strokeWidth={3}
                  strokeLinecap="round"
                />
              ),
          )}
          {places.map((place) => (
            <Place
              key={`${place.string} ${place.fret}`}
              x={placeX(layout, place, instrument, capo)}
              y={layout.y(place.string)}
              label={labels === "degrees" ? place.degree : place.note}
              root={place.root}
              chosen={frets?.[place.string] === place.fret}
            />
          ))}
        </Svg>
      </div>
    </div>
  );
}

interface WoodProps {
  instrument: Instrument;
  capo: number;
  layout: NeckLayout;
  names: readonly string[];
}

/** Frets, strings, nut and capo; what lies behind the capo is faint. */
function Wood({ instrument, capo, layout, names }: WoodProps) {
  const { wire, space, y, top, foot, nameX, width } = layout;
  const { strings, frets, leftHanded } = instrument;
  const end = leftHanded ? 4 : width - 4;
  let last = -Infinity;
  const line = { stroke: colors.inkSoft, strokeWidth: 1 };
  return (
    <G>
      {Array.from({ length: frets }, (_, k) => k + 1).map((fret) => {
        const x = space(fret);
        const named = Math.abs(x - last) >= nameGap;
        if (named) last = x;
        return (
          <G key={fret}>
            <Line x1={wire(fret)} x2={wire(fret)} y1={top - 6} y2={foot + 6} {...line} strokeOpacity={0.55} />
            {named && (
              <SvgLabel x={x} y={foot + 32} size={12} family="display" weight="600" anchor="middle">
                {fretName(instrument, fret)}
              </SvgLabel>
            )}
          </G>
        );
      })}
      <Line
        x1={wire(0)}
        x2={wire(0)}
        y1={top - 8}
        y2={foot + 8}
        stroke={colors.ink}
        strokeWidth={4}
        strokeLinecap="round"
      />
      {strings.map(({ startsAtFret }, string) => {
        const begins = startsAtFret ?? 0;
        const clamped = capo > 0 ? begins + capo : begins;
        const edge = capo > 0 ? space(clamped) : wire(begins);
        return (
          <G key={string}>
            {capo > 0 && (
              <Line x1={wire(begins)} x2={edge} y1={y(string)} y2={y(string)} {...line} strokeOpacity={0.5} />
            )}
            <Line x1={edge} x2={end} y1={y(string)} y2={y(string)} stroke={colors.inkSoft} strokeWidth={1.5} />
            {begins > 0 && <Circle cx={wire(begins)} cy={y(string)} r={4} fill={colors.ink} />}
            <SvgLabel
              x={nameX}
              y={y(string) + 4.5}
              size={13}
              family="display"
              weight="600"
              anchor={leftHanded ? "start" : "end"}
              fill={colors.ink}
            >
              {(names[string] ?? "").replace(/-?\d+$/, "")}
            </SvgLabel>
          </G>
        );
      })}
      {capo > 0 && (
        <Rect x={space(capo) - 4} y={top - 14} width={8} height={foot - top + 28} rx={4} fill={colors.ink} />
      )}
    </G>
  );
}

interface PlaceProps {
  x: number;
  y: number;
  label: string;
  root: boolean;
  chosen: boolean;
}

/** A root is plum; places of the chosen shape are filled and ringed, the others only outlined. */
function Place({ x, y, label, root, chosen }: PlaceProps) {
  const filled = root || chosen;
  const fill = root ? colors.plum : chosen ? colors.ink : colors.card;
  return (
    <G>
      {chosen && <Circle cx={x} cy={y} r={placeRadius + 3.5} fill={colors.card} stroke={colors.ink} strokeWidth={2} />}
      <Circle cx={x} cy={y} r={placeRadius} fill={fill} stroke={filled ? fill : colors.inkSoft} strokeWidth={1.25} />
      <SvgLabel
        x={x}
        y={y + 4}
        size={label.length > 2 ? 9.5 : 11.5}
        weight="600"
        anchor="middle"
        fill={filled ? (root ? colors.onPlum : colors.paper) : colors.ink}
      >
        {label}
      </SvgLabel>
    </G>
  );
}
