import { Pressable, View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { useRadioKeys } from "@/features/ui/useRadioKeys";
import { webProps } from "@/features/ui/webStyle";
import type { Metre } from "@/shared/songs/backing/metre";
import { stepKinds, type Step } from "@/shared/ways/hand/strokePattern";
import { StepSign } from "./StepSign";
import { countOf, sayCount, stepWords } from "./patternWords";

export interface PatternGridProps {
  steps: readonly Step[];
  metre: Metre;
  onChange: (steps: Step[]) => void;
}

/** A bar eighth by eighth: what the hand does on each. On the phone the eighths go down the page, on wide screens along it. */
export function PatternGrid({ steps, metre, onChange }: PatternGridProps) {
  const upright = useLayout() === "phone";
  const line = upright ? "row" : "column";
  return (
    <View role="group" aria-label="The bar, eighth by eighth" testID="pattern-grid">
      <View style={{ flexDirection: upright ? "column" : "row", flexWrap: upright ? "nowrap" : "wrap", rowGap: 16 }}>
        <View aria-hidden style={{ flexDirection: line }}>
          <View style={{ width: upright ? 30 : 52, height: upright ? 20 : 26 }} />
          {stepKinds.map((kind) => (
            <View
              key={kind}
              style={{
                width: upright ? 54 : 52,
                height: upright ? 20 : 48,
                justifyContent: "center",
                alignItems: upright ? "center" : "flex-start",
              }}
            >
              <Text variant="tiny" tone="soft">
                {stepWords[kind]}
              </Text>
            </View>
          ))}
        </View>
        {steps.map((step, index) => (
          <Eighth
            key={index}
            step={step}
            count={countOf(index, metre)}
            before={index > 0 ? countOf(index - 1, metre) : ""}
            line={line}
            onStep={(next) => onChange(steps.with(index, next) as Step[])}
          />
        ))}
      </View>
    </View>
  );
}

interface EighthProps {
  step: Step;
  count: string;
  /** the whole count before it */
  before: string;
  line: "row" | "column";
  onStep: (step: Step) => void;
}

function Eighth({ step, count, before, line, onStep }: EighthProps) {
  const keys = useRadioKeys(stepKinds, step, onStep);
  const upright = line === "row";
  return (
    <View
      role="radiogroup"
      aria-label={`On ${sayCount(count, before)}`}
      style={{ flexDirection: line, alignItems: "center" }}
    >
      <Text
        variant="mono"
        aria-hidden
        style={{ width: upright ? 30 : 48, height: 26, textAlign: upright ? "left" : "center", fontSize: 15 }}
      >
        {count}
      </Text>
      {stepKinds.map((kind, index) => {
        const on = kind === step;
        return (
          <Pressable
            key={kind}
            role="radio"
            aria-checked={on}
            aria-label={stepWords[kind]}
            onPress={() => onStep(kind)}
            {...webProps(keys(index))}
            style={{
              width: upright ? 54 : 48,
              height: 48,
              alignItems: "center",
              justifyContent: "center",
              borderWidth: on ? 2 : 1,
              borderColor: on ? colors.plum : colors.line,
              backgroundColor: on ? colors.plum : "transparent",
              borderRadius: on ? 10 : 0,
            }}
          >
            <StepSign step={kind} color={on ? colors.onPlum : colors.inkSoft} />
          </Pressable>
        );
      })}
    </View>
  );
}
