import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { gaugeWords } from "@/shared/instruments/units";
import { glyphs } from "@/shared/music/pitch";
import type { RetuneRowsProps } from "./retuneRowsProps";
import { pullWords } from "./retuneWords";
import { ShiftStepper } from "./ShiftStepper";
import { VerdictLine } from "./VerdictLine";

/** The strings on the phone, a card each. */
export function RetuneCards({ plan, units, onChange }: RetuneRowsProps) {
  return (
    <View role="list" style={{ gap: 10 }}>
      {plan.changes.map((change, index) => (
        <View key={index} role="listitem" testID={`retune-string-${index}`}>
          <Card style={{ gap: 4, paddingVertical: 10 }}>
            {/* On the narrowest phones the stepper goes beneath: "E2 to F2" is read in one line. */}
            <View
              style={{
                flexDirection: "row",
                flexWrap: "wrap",
                justifyContent: "space-between",
                alignItems: "center",
                columnGap: 8,
              }}
            >
              <Heading level={3} size={16} style={{ flexShrink: 0 }}>
                {change.semitones === 0 ? glyphs(change.string) : `${glyphs(change.string)} to ${glyphs(change.to)}`}
              </Heading>
              <ShiftStepper
                name={`string ${index + 1}, ${glyphs(change.string)}`}
                value={change.semitones}
                onChange={(to) => onChange(index, to)}
                testID={`shift-${index}`}
              />
            </View>
            <Text variant="small">
              {change.beforeLb === null
                ? "Gauge not known: judged by semitones"
                : `${gaugeWords(change.gaugeIn!, units)}: ${pullWords(change.beforeLb, units)}${
                    change.semitones === 0 ? "" : ` to ${pullWords(change.afterLb, units)}`
                  }`}
            </Text>
            <VerdictLine change={change} />
          </Card>
        </View>
      ))}
    </View>
  );
}
