import { memo, useEffect, useRef, useState } from "react";
import { View } from "react-native";
import Svg, { Circle, G, Line, Path } from "react-native-svg";
import { createTrailRun, type Trail } from "@/features/span/trailRun";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors, mixtures } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import { glyphs, noteName } from "@/shared/music/pitch";
import type { PlannedNote } from "@/shared/songs/backing/backingPlan";
import { nowX, roadPace, roadScale, roadY, type RoadPlace } from "./roadGeometry";
import type { HeardNow } from "./tryRecorder";

export interface TryRoadProps {
  notes: readonly PlannedNote[];
  voice: { lowMidi: number; highMidi: number } | null;
  spelling: "sharps" | "flats";
  width: number;
  height: number;
  /** what is sung now */
  heard: () => HeardNow;
  /** time of the plan now; null while it stands still */
  planNow: () => number | null;
  /** seconds of the take at which the plan's time 0 was; null while it is not known */
  startS: () => number | null;
}

/** Where people want no motion, the picture moves on only so often. */
const calmMs = 250;
const barPx = 14;

/** The notes to be sung come from the right; what is sung stands on them as it sounds. */
export function TryRoad({ notes, voice, spelling, width, height, heard, planNow, startS }: TryRoadProps) {
  const place: RoadPlace = { width, height, ...roadScale(notes, voice) };
  const pace = roadPace(place);
  const from = nowX(place);
  const layer = useRef<View>(null);
  const [run] = useState(createTrailRun);
  const [{ trail, now }, setDrawn] = useState<{ trail: Trail; now: number }>({
    trail: { notes: [], newest: null },
    now: 0,
  });
  useEffect(() => {
    const calm = window.matchMedia?.("(prefers-reduced-motion: reduce)").matches ?? false;
    let last = -Infinity;
    let frame = requestAnimationFrame(function draw(atMs) {
      frame = requestAnimationFrame(draw);
      if (calm && atMs - last < calmMs) return;
      last = atMs;
      const moment = heard();
      const element = layer.current as unknown as HTMLElement | null;
      const [at, began] = [planNow(), startS()];
      // Blocks of sound come late by the way they take: where both clocks are known, each note stands where it was sung.
      setDrawn({ trail: run(moment), now: at === null || began === null ? moment.now : at + began });
      if (element && at !== null) element.style.transform = `translateX(${from - at * pace}px)`;
    });
    return () => cancelAnimationFrame(frame);
  }, [heard, planNow, startS, run, from, pace]);
  const x = (t: number) => from + (t - now) * pace;
  const sung = trail.notes
    .map(
      ({ start, end, midi }) =>
        `M${x(start).toFixed(1)} ${roadY(place, midi).toFixed(1)}L${x(end).toFixed(1)} ${roadY(place, midi).toFixed(1)}`,
    )
    .join("");
  return (
    <View
      role="img"
      aria-label={roadWords(trail, notes.length > 0, spelling)}
      testID="try-road"
      style={{ width, height, overflow: "hidden" }}
    >
      <RoadLines {...place} spelling={spelling} />
      <View style={{ position: "absolute", left: 38, right: 0, top: 0, bottom: 0, overflow: "hidden" }}>
        <View
          ref={layer}
          style={[{ position: "absolute", left: -38, top: 0, height, width }, webStyle({ willChange: "transform" })]}
        >
          <WantedNotes notes={notes} {...place} />
        </View>
      </View>
      <View style={{ position: "absolute", left: 38, right: 0, top: 0, bottom: 0, overflow: "hidden" }}>
        <Svg
          width={width}
          height={height}
          viewBox={`0 0 ${width} ${height}`}
          aria-hidden
          style={{ position: "absolute", left: -38 }}
        >
          <Line x1={from} x2={from} y1={0} y2={height} stroke={colors.inkSoft} strokeDasharray="2 4" />
          <Path d={sung} stroke={colors.plum} strokeWidth={5} strokeLinecap="round" fill="none" />
          {trail.newest && (
            <Circle cx={x(trail.newest.t)} cy={roadY(place, trail.newest.midi)} r={6} fill={colors.plum} />
          )}
        </Svg>
      </View>
    </View>
  );
}

/** All notes of the tune, laid out once; the layer they lie on is moved. */
const WantedNotes = memo(function WantedNotes({ notes, ...place }: { notes: readonly PlannedNote[] } & RoadPlace) {
  const pace = roadPace(place);
  return notes.map(({ at, duration, midi }, index) => (
    <View
      key={index}
      style={{
        position: "absolute",
        left: at * pace,
        width: Math.max(6, duration * pace - 2),
        top: roadY(place, midi) - barPx / 2,
        height: barPx,
        borderRadius: barPx / 2,
        borderWidth: 1.5,
        borderColor: colors.lagoon,
        backgroundColor: mixtures.tint,
      }}
    />
  ));
});

const RoadLines = memo(function RoadLines({ spelling, ...place }: RoadPlace & { spelling: "sharps" | "flats" }) {
  const { width, height, low, high } = place;
  const naturals = Array.from({ length: high - low + 1 }, (_, k) => low + k).filter(
    (midi) => !noteName(midi).includes("#"),
  );
  const step = roadY(place, low) - roadY(place, low + 1);
  return (
    <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden style={{ position: "absolute" }}>
      {naturals.map((midi) => {
        const y = roadY(place, midi);
        const octave = midi % 12 === 0;
        const named = octave || step * 2 >= 14 || [0, 4, 7, 9].includes(midi % 12);
        return (
          <G key={midi}>
            <Line x1={38} x2={width} y1={y} y2={y} stroke={octave ? mixtures.rungC : colors.line} />
            {named && (
              <SvgLabel x={32} y={y + 4.5} size={13} family="display" weight="600" anchor="end">
                {glyphs(noteName(midi, spelling))}
              </SvgLabel>
            )}
          </G>
        );
      })}
    </Svg>
  );
});

function roadWords({ newest }: Trail, tune: boolean, spelling: "sharps" | "flats"): string {
  const now = newest ? `Now: ${glyphs(noteName(Math.round(newest.midi), spelling))}.` : "Nothing is sounding now.";
  return tune
    ? `The notes of the tune as they come, and your voice on them. ${now}`
    : `Your voice against note lines. ${now}`;
}
