import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { IconButton } from "@/features/ui/IconButton";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { AfterSinging } from "../sing/AfterSinging";
import { causeWords } from "../sing/failureWords";
import { bandWords, noteWord, semitonesOf } from "../noteWords";
import { timeOnNotes } from "../timeOnNotes";
import { VoiceLadder } from "../VoiceLadder";
import { shownEnds, type GuidedFindings, type GuidedState } from "./guidedSteps";
import { takeOfHolds } from "./takeOfHolds";
import { semitoneWords } from "@/shared/music/moveWords";

export interface GuidedResultProps {
  state: GuidedState & { step: "done" };
  onFound: (change: Partial<GuidedFindings>) => void;
}

/** What can be held, apart from what the singer would use in a song: the second is the singer's to say. */
export function GuidedResult({ state, onFound }: GuidedResultProps) {
  const wide = useLayout() === "wide";
  const { run, findings, brokenOff } = state;
  const { singLow, singHigh, warmedUp, effort } = findings;
  const ends = shownEnds(run);
  const reach = { lowMidi: findings.lowMidi, highMidi: findings.highMidi };
  const sing = { lowMidi: singLow, highMidi: singHigh };
  const { notes, tuningCents } = takeOfHolds(run, findings, "");
  return (
    <View
      style={{
        flexDirection: wide ? "row" : "column",
        gap: wide ? 64 : 20,
        alignItems: wide ? "flex-start" : "stretch",
      }}
      testID="guided-result"
    >
      <VoiceLadder voice={{ range: reach, comfort: sing }} times={timeOnNotes(notes, tuningCents)} ends="held" />
      <View style={[{ gap: 20 }, wide ? { flexGrow: 1, flexBasis: 0, maxWidth: 560 } : null]}>
        {brokenOff && (
          <Notice kind="caution" title="The sound broke off">
            {`${causeWords(
              brokenOff,
              run.held.reduce((sum, { heldS }) => sum + heldS, 0),
            )} What you held until then is here.`}
          </Notice>
        )}
        <View style={{ gap: 4 }}>
          <Heading level={2}>You can hold</Heading>
          <Text variant="number" style={{ lineHeight: 52 }} testID="guided-reach">
            {bandWords(reach)}
          </Text>
          <Text tone="soft">
            {`${semitoneWords(semitonesOf(reach))}, each note held for itself. ${oneEndWords(ends)}`.trim()}
          </Text>
          {run.under16 && (
            <Text testID="guided-week">This is the range of this week. It will move; that is how voices grow.</Text>
          )}
        </View>
        <View style={{ gap: 10 }}>
          <Heading level={2}>You would sing with</Heading>
          <Text tone="soft">
            Holding a note and using it in a song are two things. Set the lowest and the highest note you would use for
            a whole song; a small reserve is proposed.
          </Text>
          <NoteStepper
            label="Lowest"
            midi={singLow}
            least={findings.lowMidi}
            most={singHigh}
            onChange={(midi) => onFound({ singLow: midi })}
            testID="guided-sing-low"
          />
          <NoteStepper
            label="Highest"
            midi={singHigh}
            least={singLow}
            most={findings.highMidi}
            onChange={(midi) => onFound({ singHigh: midi })}
            testID="guided-sing-high"
          />
        </View>
        <AfterSinging
          warmedUp={warmedUp}
          effort={effort}
          onChange={(warmed, felt) => onFound({ warmedUp: warmed, effort: felt })}
        />
        <Text variant="small" tone="soft">
          Give the ends of your voice a rest now. If you are hoarse afterwards, rest your voice, and go less far next
          time.
        </Text>
      </View>
    </View>
  );
}

function oneEndWords(ends: readonly string[]): string {
  if (ends.length === 2) return "";
  return ends[0] === "low" ? "Only the low end was looked for." : "Only the high end was looked for.";
}

interface NoteStepperProps {
  label: string;
  midi: number;
  least: number;
  most: number;
  onChange: (midi: number) => void;
  testID: string;
}

function NoteStepper({ label, midi, least, most, onChange, testID }: NoteStepperProps) {
  const step = (by: number) => {
    const next = midi + by;
    if (next >= least && next <= most) onChange(next);
  };
  return (
    <View
      role="group"
      aria-label={`${label} note for a song`}
      style={{
        ...{ flexDirection: "row", alignItems: "center", gap: 8, maxWidth: 360, paddingLeft: 16, paddingRight: 4 },
        ...{ borderWidth: 1, borderColor: colors.line, borderRadius: 14, backgroundColor: colors.card },
      }}
    >
      <Text style={{ flexGrow: 1 }}>{label}</Text>
      <IconButton
        icon="minus"
        label={`${label}: a semitone lower`}
        onPress={() => step(-1)}
        testID={`${testID}-down`}
      />
      <Text variant="title" style={{ minWidth: 56, textAlign: "center" }} aria-live="polite" testID={testID}>
        {noteWord(midi)}
      </Text>
      <IconButton icon="plus" label={`${label}: a semitone higher`} onPress={() => step(1)} testID={`${testID}-up`} />
    </View>
  );
}
