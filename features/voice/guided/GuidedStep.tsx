import { useEffect, useRef } from "react";
import { useWindowDimensions, View } from "react-native";
import { LevelMeter } from "@/features/span/LevelMeter";
import { Button } from "@/features/ui/Button";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { useHeard } from "../listening/useHeard";
import type { LiveSound } from "../recorder/liveSound";
import { enoughHoldS, holdNow, leastHoldS } from "./hearing/guidedHold";
import { GuidedLadder } from "./GuidedLadder";
import type { GuidedEvent, GuidedState } from "./guidedSteps";
import { StopSigns } from "./StopSigns";
import { againIsSmaller, enoughWords, soFarWords, stepWords } from "./guidedWords";

export type OnTheWay = Exclude<GuidedState, { step: "before" | "paused" | "done" | "failed" | "turn" }>;

export interface GuidedStepProps {
  state: OnTheWay;
  live: LiveSound;
  onTell: (event: GuidedEvent) => void;
}

const aroundLadder = 56 + 96 + 220;

/** One note of the way: what to do, the ladder, how long it is held, and the two ways out. */
export function GuidedStep({ state, live, onTell }: GuidedStepProps) {
  const layout = useLayout();
  const phone = layout === "phone";
  const wide = layout === "wide";
  const { height } = useWindowDimensions();
  const { run, step } = state;
  const { title, text } = stepWords(state);
  return (
    <Screen
      title={run.end === "low" ? "Going down" : "Going up"}
      subtitle={soFarWords(run)}
      back="/voice"
      closes
      hideBar
      wide
    >
      <View style={{ flexDirection: "row", gap: 48, flexGrow: 1 }}>
        <View style={{ flexGrow: 1, flexBasis: 0, maxWidth: 760 }}>
          <View style={{ gap: 2, paddingTop: 8, minHeight: 88 }} testID={`guided-${step}`}>
            <Text
              variant="title"
              tone={step === "held" ? "lagoon" : "ink"}
              style={{ fontSize: 26, lineHeight: 32 }}
              testID="guided-title"
            >
              {title}
            </Text>
            <Text tone="soft">{text}</Text>
          </View>
          <GuidedLadder
            run={run}
            live={live}
            listening={step === "listening"}
            height={Math.max(200, Math.min(520, height - aroundLadder - (phone ? 0 : 60)))}
          />
          <View style={{ gap: 14, paddingTop: 16, marginTop: "auto", width: "100%", maxWidth: 600 }}>
            <HoldRow live={live} state={state} />
            <LevelRow live={live} on={step === "listening"} />
            <Ways state={state} onTell={onTell} />
          </View>
        </View>
        {wide && (
          <View style={{ width: 380 }}>
            <StopSigns />
          </View>
        )}
      </View>
    </Screen>
  );
}

/** How long the note is held: a mark where it counts, the end where the next one comes. */
function HoldRow({ live, state }: { live: LiveSound; state: GuidedStepProps["state"] }) {
  const now = useHeard(live, () =>
    state.step === "listening" ? Math.round(10 * (holdNow(live.frames)?.heldS ?? 0)) / 10 : 0,
  );
  const held = state.step === "held" ? state.note.heldS : now;
  const share = Math.min(1, held / enoughHoldS);
  return (
    <View style={{ flexDirection: "row", alignItems: "center", gap: 12 }}>
      <Text variant="small" tone="soft" style={{ width: 44 }}>
        Held
      </Text>
      <View
        role="img"
        aria-label={`Held ${held.toFixed(1)} seconds; from ${leastHoldS} seconds it counts`}
        style={{ flexGrow: 1, flexShrink: 1, height: 12, borderRadius: 6, borderWidth: 1, borderColor: mixtures.rungC }}
      >
        <View
          style={{
            position: "absolute",
            ...{ top: -1, bottom: -1, left: -1, borderRadius: 6 },
            width: `${100 * share}%`,
            backgroundColor: held >= leastHoldS ? colors.lagoon : colors.inkSoft,
          }}
        />
        <View
          style={{
            position: "absolute",
            ...{ top: -6, bottom: -6, width: 2, borderRadius: 1 },
            left: `${(100 * leastHoldS) / enoughHoldS}%`,
            backgroundColor: colors.ink,
          }}
        />
      </View>
      <Text variant="small" style={{ fontWeight: "600", width: 64, textAlign: "right" }}>
        {`${held.toFixed(1)} s`}
      </Text>
    </View>
  );
}

function LevelRow({ live, on }: { live: LiveSound; on: boolean }) {
  const level = useHeard(live, () => (on ? (live.peak >= 0.99 ? 0 : Math.round(live.levelDb)) : -120));
  // Its room stays, so that nothing jumps when the tone ends.
  return (
    <View style={{ opacity: on ? 1 : 0 }} aria-hidden={!on}>
      <LevelMeter levelDb={level} />
    </View>
  );
}

function Ways({ state, onTell }: Pick<GuidedStepProps, "state" | "onTell">) {
  const { run, step } = state;
  const missed = step === "missed";
  const first = useRef<View>(null);
  useEffect(() => {
    // Whoever works by keyboard can try again at once.
    if (missed) (first.current as unknown as HTMLElement | null)?.querySelector("button")?.focus();
  }, [missed]);
  return (
    <View style={{ gap: 10 }} ref={first}>
      {step === "listening" && run.target !== null && (
        <Button
          kind="text"
          icon="play"
          label="Hear the tone again"
          onPress={() => onTell({ kind: "again" })}
          testID="guided-tone-again"
        />
      )}
      {missed && (
        <Button
          icon="again"
          label={againIsSmaller(run) ? "Try half the step" : "Try once more"}
          onPress={() => onTell({ kind: "again" })}
          testID="guided-again"
        />
      )}
      <View style={{ flexDirection: "row", gap: 10 }}>
        {run.held.length > 0 && (
          <Button
            kind="secondary"
            label={enoughWords(run.end)}
            onPress={() => onTell({ kind: "enough" })}
            style={{ flexGrow: 1 }}
            testID="guided-enough"
          />
        )}
        <Button
          kind={run.held.length > 0 ? "text" : "secondary"}
          icon="stop"
          label="Stop here"
          onPress={() => onTell({ kind: "finish" })}
          style={run.held.length > 0 ? null : { flexGrow: 1 }}
          testID="guided-stop"
        />
      </View>
    </View>
  );
}
