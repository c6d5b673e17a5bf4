import { useEffect, useState } from "react";
import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import { glyphs } from "@/shared/music/pitch";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { placeWords } from "./backingWords";

export interface BeatLightsProps {
  plan: BackingPlan;
  /** time of the plan that is heard now; null while it is silent */
  heard: () => number | null;
  playing: boolean;
}

/** The beat to be seen: a light for each beat of the bar, the chord that sounds and the one that comes. */
export function BeatLights({ plan, heard, playing }: BeatLightsProps) {
  const index = useBeat(plan, heard, playing);
  const beat = index === null ? null : plan.beats[index]!;
  const chordIndex = beat === null ? -1 : plan.chords.findLastIndex(({ at }) => at <= beat.at + 1e-6);
  const now = plan.chords[chordIndex]?.name ?? null;
  const next = plan.chords[chordIndex + 1]?.name ?? null;
  const barS = (plan.metre.quarters * 60) / plan.tempo;
  return (
    <View style={{ gap: 10 }} testID="beat-lights">
      <View
        role="img"
        aria-label={`${plan.metre.beats} beats in a bar`}
        style={{ flexDirection: "row", gap: 8, flexWrap: "wrap" }}
      >
        {Array.from({ length: plan.metre.beats }, (_, k) => {
          const on = beat?.beat === k;
          const strong = plan.metre.strong.includes(k);
          return (
            <View
              key={k}
              style={{
                width: strong ? 28 : 20,
                height: strong ? 28 : 20,
                borderRadius: 14,
                alignSelf: "center",
                borderWidth: 2,
                borderColor: on ? colors.plum : mixtures.rungC,
                backgroundColor: on ? colors.plum : "transparent",
              }}
            />
          );
        })}
      </View>
      <View style={{ flexDirection: "row", gap: 12, alignItems: "baseline", minHeight: 32, flexWrap: "wrap" }}>
        <Text variant="title">{now === null ? "" : glyphs(now)}</Text>
        {next !== null && playing && <Text tone="soft">{`then ${glyphs(next)}`}</Text>}
        <Text variant="small" tone="soft">
          {beat === null ? `${plan.metre.name} at ${Math.round(plan.tempo)}` : placeWords(plan.parts, beat, barS)}
        </Text>
      </View>
    </View>
  );
}

/** The beat that is heard, looked up with every frame, told when it changes. */
function useBeat(plan: BackingPlan, heard: () => number | null, playing: boolean): number | null {
  const [beat, setBeat] = useState<number | null>(null);
  useEffect(() => {
    if (!playing) {
      setBeat(null);
      return;
    }
    let frame = 0;
    const look = () => {
      const at = heard();
      const found = at === null ? -1 : plan.beats.findLastIndex((each) => each.at <= at + 1e-6);
      setBeat(found < 0 ? null : found);
      frame = requestAnimationFrame(look);
    };
    look();
    return () => cancelAnimationFrame(frame);
  }, [plan, heard, playing]);
  return beat;
}
