import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import type { Instrument } from "@/shared/instruments/instrument";
import type { TuningPlan } from "@/shared/instruments/stringTuning";
import { stringName } from "./tunerWords";

/** Between tuning and checking: clamp the capo, and stop a short string by itself. */
export function CapoStep({ instrument, plan }: { instrument: Instrument; plan: TuningPlan }) {
  return (
    <Card style={{ gap: 10 }} testID="capo-step">
      <Heading level={2}>{`Now clamp the capo at fret ${plan.capo} and check each string`}</Heading>
      <Text>
        Set it close behind the fret, straight, and only as tight as every string rings clear. A capo that presses too
        hard pulls the strings sharp.
      </Text>
      {plan.strings.map(({ index, ownStop }) =>
        ownStop === null ? null : (
          <Text key={index}>
            {`The capo does not reach the short ${stringName(instrument, index)}: give it its own stop at fret ${ownStop}.`}
          </Text>
        ),
      )}
    </Card>
  );
}
