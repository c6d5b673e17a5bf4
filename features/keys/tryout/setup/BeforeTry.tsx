import type { ReactNode } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { IconButton } from "@/features/ui/IconButton";
import { Notice } from "@/features/ui/Notice";
import { Segmented } from "@/features/ui/Segmented";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { BeatLights } from "../../backing/BeatLights";
import { headphoneWords, voiceWords } from "../../backing/backingWords";
import type { BackingPlayer } from "../../backing/useBacking";
import { lengthWords, tempoLimits, type TryWishes } from "./tryWishes";

export interface BeforeTryProps {
  /** the key, and the others to choose from */
  keys: ReactNode;
  wishes: TryWishes;
  onWish: (wishes: TryWishes) => void;
  plan: BackingPlan | null;
  backing: BackingPlayer;
  /** the tune is known, note by note */
  melody: boolean;
}

const onOff = [
  { value: "on", label: "On" },
  { value: "off", label: "Off" },
] as const;
const yesNo = [
  { value: "yes", label: "Yes" },
  { value: "no", label: "No" },
] as const;
const hands = [
  { value: "strum", label: "Strummed" },
  { value: "pluck-and-strum", label: "A plucked string, then strummed" },
  { value: "alternating-bass", label: "A bass that changes its note" },
] as const;
const tempoStep = 4;

/** What is played, how fast and for how long, and what to mind before singing. */
export function BeforeTry({ keys, wishes, onWish, plan, backing, melody }: BeforeTryProps) {
  const wide = useLayout() === "wide";
  const wish = (some: Partial<TryWishes>) => onWish({ ...wishes, ...some });
  const sounding = backing.playing === "playing";
  return (
    <View style={{ flexDirection: wide ? "row" : "column", gap: wide ? 48 : 16 }}>
      <View style={{ gap: 16, flexGrow: 1, flexBasis: wide ? 0 : "auto", maxWidth: 560 }}>
        {keys}
        <Row name="Backing">
          <Segmented
            label="Backing"
            options={onOff}
            value={wishes.backing ? "on" : "off"}
            onChange={(value) => wish({ backing: value === "on" })}
            testID="try-backing"
          />
        </Row>
        {wishes.backing ? (
          <>
            <Select label="How it is played" options={hands} value={wishes.hand} onChange={(hand) => wish({ hand })} />
            {melody && (
              <Row name="Tune played along, softly">
                <Segmented
                  label="Tune played along"
                  options={onOff}
                  value={wishes.guide ? "on" : "off"}
                  onChange={(value) => wish({ guide: value === "on" })}
                />
              </Row>
            )}
            <Row name="Headphones on">
              <Segmented
                label="Headphones"
                options={yesNo}
                value={wishes.headphones ? "yes" : "no"}
                onChange={(value) => wish({ headphones: value === "yes" })}
              />
            </Row>
          </>
        ) : (
          <Text variant="small" tone="soft">
            Only the count-in is heard. Then the beat is shown, and you may take your own time: the notes are found
            where you sing them. Sing the first note as high as the key has it.
          </Text>
        )}
      </View>
      <View style={{ gap: 16, flexGrow: 1, flexBasis: wide ? 0 : "auto", maxWidth: 560 }}>
        <Row name={plan && plan.metre.quarters !== plan.metre.beats ? "Tempo, quarter notes" : "Tempo, beats a minute"}>
          <View style={{ flexDirection: "row", alignItems: "center", gap: 8 }}>
            <IconButton
              icon="minus"
              label="Slower"
              disabled={wishes.tempo <= tempoLimits.low}
              onPress={() => wish({ tempo: Math.max(tempoLimits.low, wishes.tempo - tempoStep) })}
            />
            <Text variant="title" aria-live="polite" style={{ minWidth: 44, textAlign: "center" }} testID="try-tempo">
              {wishes.tempo}
            </Text>
            <IconButton
              icon="plus"
              label="Faster"
              disabled={wishes.tempo >= tempoLimits.high}
              onPress={() => wish({ tempo: Math.min(tempoLimits.high, wishes.tempo + tempoStep) })}
            />
          </View>
        </Row>
        <Row name="Count-in">
          <Segmented
            label="Count-in"
            options={[
              { value: "1", label: "1 bar" },
              { value: "2", label: "2 bars" },
            ]}
            value={wishes.countInBars === 1 ? "1" : "2"}
            onChange={(value) => wish({ countInBars: value === "1" ? 1 : 2 })}
          />
        </Row>
        {melody && (
          <Row name="How much of it">
            <Segmented
              label="How much of it"
              options={[
                { value: "once", label: "Tune once" },
                { value: "whole", label: "Whole song" },
              ]}
              value={wishes.length}
              onChange={(length) => wish({ length })}
            />
          </Row>
        )}
        {plan && (
          <View style={{ gap: 8 }}>
            {sounding && <BeatLights plan={plan} heard={backing.heard} playing />}
            <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", gap: 12 }}>
              {wishes.backing && backing.possible && (
                <Button
                  kind="secondary"
                  small
                  icon={sounding ? "stop" : "play"}
                  label={sounding ? "Stop" : "Hear the backing"}
                  onPress={() => (sounding ? backing.stop() : void backing.start())}
                  testID="try-hear"
                />
              )}
              <Text variant="small" tone="soft">
                {`${lengthWords(plan.durationS)} with the count-in. You can stop earlier.`}
              </Text>
            </View>
          </View>
        )}
        {wishes.backing && !wishes.headphones && (
          <Notice kind="caution" testID="try-headphones">
            {`${headphoneWords} Without headphones what is measured is coarser.`}
          </Notice>
        )}
        <Notice kind="caution">{voiceWords}</Notice>
        <Text variant="small" tone="soft">
          The sound stays on this device. Only the measured numbers are kept, and only when you keep the try.
        </Text>
      </View>
    </View>
  );
}

function Row({ name, children }: { name: string; children: ReactNode }) {
  return (
    <View
      style={{
        flexDirection: "row",
        flexWrap: "wrap",
        alignItems: "center",
        justifyContent: "space-between",
        columnGap: 16,
        rowGap: 6,
      }}
    >
      <Text variant="strong" style={{ flexShrink: 1 }}>
        {name}
      </Text>
      <View style={{ minWidth: 148 }}>{children}</View>
    </View>
  );
}
