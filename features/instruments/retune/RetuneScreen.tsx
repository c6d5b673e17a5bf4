import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { tunePath } from "@/features/ui/tunePath";
import { UnitChoice } from "@/features/ui/UnitChoice";
import { useLayout } from "@/features/ui/useLayout";
import { useUnits } from "@/features/ui/useUnits";
import type { Instrument } from "@/shared/instruments/instrument";
import { planRetune, type RetunePlan } from "@/shared/instruments/retunePlan";
import { glyphs } from "@/shared/music/pitch";
import { InstrumentSelect } from "../InstrumentSelect";
import { instrumentQueries } from "../instrumentQueries";
import { chosenInstrument, instrumentWords } from "../myInstruments";
import { HearStrings } from "../sound/HearStrings";
import { RetuneCards } from "./RetuneCards";
import { RetuneTable } from "./RetuneTable";
import { lowestShift, highestShift, totalWords, type Shifts } from "./retuneWords";
import { ShiftStepper } from "./ShiftStepper";

export interface RetuneScreenProps {
  /** the favourite where it is unknown or null */
  instrumentId: string | null;
  /** semitones to begin with, for all strings */
  shift: number;
}

/** What a retune does to every string, in which order to turn, and what to beware of. */
export function RetuneScreen({ instrumentId, shift }: RetuneScreenProps) {
  const query = useQuery(instrumentQueries.all());
  const [chosen, setChosen] = useState(instrumentId);
  const owned = query.data ?? [];
  const instrument = chosenInstrument(owned, chosen);
  return (
    <Screen
      title="Strings and retune"
      subtitle={instrumentWords(instrument)}
      crumb={{ label: "Instruments", href: "/instruments" }}
      wide
    >
      <QueryState query={query} title="Your instruments could not be opened">
        {() => (
          <View style={{ gap: 20 }}>
            <View style={{ maxWidth: 480, gap: 12 }}>
              <InstrumentSelect owned={owned} value={instrument.id} onChange={setChosen} />
              <UnitChoice />
            </View>
            <Retune key={instrument.id} instrument={instrument} first={whole(shift)} />
          </View>
        )}
      </QueryState>
    </Screen>
  );
}

const whole = (shift: number) => (Number.isInteger(shift) ? Math.max(lowestShift, Math.min(highestShift, shift)) : 0);

function Retune({ instrument, first }: { instrument: Instrument; first: number }) {
  const [units] = useUnits();
  const phone = useLayout() === "phone";
  const [shifts, setShifts] = useState<Shifts>(() => instrument.strings.map(() => first));
  const plan = planRetune(instrument, shifts);
  const all = shifts.every((each) => each === shifts[0]) ? shifts[0]! : null;
  const change = (index: number, to: number) => setShifts(shifts.map((each, k) => (k === index ? to : each)));
  const Rows = phone ? RetuneCards : RetuneTable;
  return (
    <View style={{ gap: 20 }}>
      <View style={{ gap: 4 }}>
        <Heading level={2}>All strings</Heading>
        <ShiftStepper
          name="all strings"
          value={all}
          onChange={(to) => setShifts(shifts.map(() => to))}
          testID="shift-all"
        />
      </View>
      <View style={{ gap: 8 }}>
        <Heading level={2}>Each string</Heading>
        <Rows plan={plan} units={units} onChange={change} />
        <LiveText variant="strong" testID="total-tension">
          {totalWords(plan.total, units)}
        </LiveText>
      </View>
      <Cautions plan={plan} />
      <Order plan={plan} />
      {plan.safe && all !== null && (
        <TextLink href={tunePath(instrument.id, all)} testID="to-tuner">
          Tune string by string, with the microphone
        </TextLink>
      )}
      <View style={{ gap: 8 }}>
        <Heading level={2}>Hear it retuned</Heading>
        <HearStrings strings={instrument.strings.map((string, k) => ({ ...string, note: plan.changes[k]!.to }))} />
      </View>
      <Text variant="tiny" tone="soft">
        Unit weights: D’Addario, string tension chart 13934. Strength of steel: ASTM A228, weakest wire. Slack floor,
        semitone limits and the order are common practice.
      </Text>
    </View>
  );
}

function Cautions({ plan }: { plan: RetunePlan }) {
  if (plan.cautions.length === 0) return null;
  return (
    <Notice
      kind={plan.safe ? "caution" : "error"}
      title={plan.safe ? "Take care" : "Too far for these strings"}
      testID="retune-cautions"
    >
      {plan.cautions.map((caution) => (
        <Text key={caution} variant="small">
          {caution}
        </Text>
      ))}
    </Notice>
  );
}

function Order({ plan: { steps, reasons, safe } }: { plan: RetunePlan }) {
  if (!safe) return null;
  return (
    <View style={{ gap: 8 }}>
      <Heading level={2}>Order to tune in</Heading>
      {steps.length === 0 && (
        <Text variant="small" tone="soft">
          Nothing to turn yet.
        </Text>
      )}
      <View role="list" style={{ gap: 4 }} testID="retune-order">
        {steps.map(({ string, from, to, direction }, k) => (
          <View key={string} role="listitem">
            <Text>{`${k + 1}. String ${string + 1}: ${glyphs(from)} ${direction} to ${glyphs(to)}`}</Text>
          </View>
        ))}
      </View>
      {reasons.map((reason) => (
        <Text key={reason} variant="small" tone="soft">
          {reason}
        </Text>
      ))}
    </View>
  );
}
