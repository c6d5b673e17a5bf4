import { Pressable, View } from "react-native";
import { Icon } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webProps } from "@/features/ui/webStyle";
import type { Instrument } from "@/shared/instruments/instrument";
import type { TuningPlan } from "@/shared/instruments/stringTuning";
import { targetOf, type TunerState } from "./tunerState";
import { pitchWords, stringName } from "./tunerWords";

export interface StringStepsProps {
  instrument: Instrument;
  plan: TuningPlan;
  state: TunerState;
  onChoose: (index: number) => void;
}

/** The strings in the order to tune in: from, to, which one is asked for, which stand. Any can be chosen. */
export function StringSteps({ instrument, plan, state, onChoose }: StringStepsProps) {
  return (
    <View
      role="list"
      aria-label="Strings in the order to tune in"
      style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}
    >
      {plan.order.map((index) => {
        const string = plan.strings[index];
        if (!string) return null;
        const from = state.pass === "strings" ? string.fromMidi : string.toMidi;
        const to = targetOf(plan, state, index);
        const asked = state.pass !== "done" && index === state.asked;
        const stands = state.done.includes(index) || state.pass === "done";
        const [was, willBe] = [from, to].map((midi) => pitchWords(instrument, index, midi));
        const words = was === willBe ? String(willBe) : `${was} → ${willBe}`;
        const spoken = `${stringName(instrument, index)}, ${was === willBe ? words : `${was} to ${willBe}`}${stands ? ", in tune" : asked ? ", now" : ""}`;
        return (
          <View role="listitem" key={index}>
            <Pressable
              role="button"
              aria-label={spoken}
              testID={`string-${index}`}
              onPress={() => onChoose(index)}
              {...webProps({ "aria-pressed": asked })}
              style={{
                minHeight: 48,
                minWidth: 64,
                paddingHorizontal: 12,
                justifyContent: "center",
                borderRadius: 14,
                borderWidth: asked ? 2 : 1,
                borderColor: asked ? colors.plum : colors.inkSoft,
                backgroundColor: colors.card,
              }}
            >
              <View style={{ flexDirection: "row", alignItems: "center", gap: 6 }}>
                {stands && <Icon name="check" size={16} color={colors.lagoon} />}
                <Text variant={asked ? "monoBold" : "mono"} style={{ fontSize: 14, lineHeight: 20 }}>
                  {words}
                </Text>
              </View>
            </Pressable>
          </View>
        );
      })}
    </View>
  );
}
