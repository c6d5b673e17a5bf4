import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Choice } from "@/features/ui/Choice";
import { Fretboard, type MarkedPlace } from "@/features/ui/notes/Fretboard";
import { SmallKeyboard } from "@/features/ui/notes/SmallKeyboard";
import { Heading } from "@/features/ui/Heading";
import { Icon } from "@/features/ui/Icon";
import { LiveText } from "@/features/ui/LiveText";
import { colors } from "@/features/ui/theme";
import type { CoachQuestion, Verdict } from "@/shared/coach/coachQuestion";
import type { Instrument } from "@/shared/instruments/instrument";
import { pitchClass } from "@/shared/music/pitch";

export interface QuestionPaneProps {
  question: CoachQuestion;
  /** as it is tuned for the way */
  instrument: Instrument;
  onAnother: () => void;
}

/** Middle C: keys to press, not to sing. */
const keysFrom = 60;

/** One question: answered on keys, on the neck or among choices, as often as one likes, with what the answer was. */
export function QuestionPane({ question, instrument, onAnother }: QuestionPaneProps) {
  const [verdict, setVerdict] = useState<Verdict | null>(null);
  const [option, setOption] = useState<string | null>(null);
  const [place, setPlace] = useState<MarkedPlace | null>(null);
  // The neck is long: what the answer was stands over it, where it is seen.
  const answer = (
    <View style={{ flexDirection: "row", gap: 8, alignItems: "flex-start", minHeight: 44 }} testID="verdict">
      {verdict && (
        <Icon name={verdict.right ? "check" : "close"} size={20} color={verdict.right ? colors.lagoon : colors.brick} />
      )}
      <View style={{ flexShrink: 1, flexGrow: 1 }}>
        <LiveText variant="body" tone={verdict === null ? "soft" : "ink"} style={{ lineHeight: 21 }}>
          {verdict === null ? "" : `${verdict.right ? "Right." : "Not yet."} ${verdict.words}`}
        </LiveText>
      </View>
    </View>
  );
  return (
    <View
      testID="question"
      style={{ gap: 10, borderTopWidth: 1.5, borderColor: colors.ink, paddingTop: 14, marginTop: 6 }}
    >
      <Heading level={3}>{question.ask}</Heading>
      {question.kind === "neck" && answer}
      {question.kind === "keyboard" && (
        <SmallKeyboard
          label="Keys for your answer"
          from={keysFrom}
          octaves={1}
          testID="answer-keys"
          onNote={(midi) => setVerdict(question.check(pitchClass(midi)))}
        />
      )}
      {question.kind === "choices" && (
        <Choice
          label={question.ask}
          hideLabel
          testID="answer-choices"
          options={question.options.map((value) => ({ value, label: value }))}
          value={option}
          onChange={(value) => {
            setOption(value);
            setVerdict(question.check(value));
          }}
        />
      )}
      {question.kind === "neck" && (
        <Fretboard
          instrument={instrument}
          only={question}
          whole={question.whole}
          marked={place}
          testID="answer-neck"
          onPlace={(pressed) => {
            const found = question.check(pressed);
            setPlace({ string: pressed.string, fret: pressed.fret, right: found.right });
            setVerdict(found);
          }}
        />
      )}
      {question.kind !== "neck" && answer}
      {verdict?.right === true && (
        <Button kind="text" small icon="again" label="Ask another one" onPress={onAnother} testID="another" flush />
      )}
    </View>
  );
}
