import type { ReactNode } from "react";
import { Pressable, View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Icon } from "@/features/ui/Icon";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { AfterSinging } from "./AfterSinging";
import { BandHeading } from "../BandHeading";
import { causeWords, isInterruption } from "./failureWords";
import { NoteDots } from "./NoteDots";
import { bandWords, certaintyWords } from "../noteWords";
import type { HeardTake } from "../recorder/recorder";
import { inTune } from "@/shared/voice/shownTake";
import { timeOnNotes } from "../timeOnNotes";
import { VoiceLadder } from "../VoiceLadder";
import { reachesFarther } from "../profile/VoicePicture";
import { listWords } from "@/shared/music/listWords";

export interface TakeResultProps {
  take: HeardTake;
  onAgain: () => void;
  /** keeps the take and goes on to the songs */
  onSongs: () => void;
  onFelt: (warmedUp: boolean | null, effort: number | null) => void;
  /** the take as it was sung */
  trail: ReactNode;
}

/** What a take says: notes, how sure, why, what next. On a wide page the ladder stands left of the words. */
export function TakeResult({ take, onAgain, onSongs, onFelt, trail }: TakeResultProps) {
  const wide = useLayout() === "wide";
  const { report } = take;
  if (!report.range || !report.comfort) return null;
  const voice = {
    range: inTune(report.range, report.tuningCents),
    comfort: inTune(report.comfort, report.tuningCents),
  };
  const heading = <BandHeading label="Your comfortable notes" band={voice.comfort} />;
  const ladder = <VoiceLadder voice={voice} times={timeOnNotes(report.notes, report.tuningCents)} ends="held" />;
  const words = (
    <ResultWords take={take} onAgain={onAgain} onSongs={onSongs} onFelt={onFelt} trail={wide ? null : trail} />
  );
  if (!wide) {
    return (
      <View style={{ gap: 14 }}>
        {heading}
        {ladder}
        {words}
      </View>
    );
  }
  return (
    <View style={{ flexDirection: "row", gap: 64, alignItems: "flex-start" }}>
      <View style={{ gap: 28, width: 460 }}>
        {ladder}
        {trail}
      </View>
      <View style={{ gap: 20, flexGrow: 1, flexBasis: 0, maxWidth: 560 }}>
        {heading}
        {words}
      </View>
    </View>
  );
}

function ResultWords({ take, onAgain, onSongs, onFelt, trail }: TakeResultProps) {
  const { report, stoppedBy, processed } = take;
  const [first = "", ...others] = report.reasons;
  return (
    <View style={{ borderTopWidth: 1, borderColor: colors.line, paddingTop: 14, gap: 12 }}>
      {isInterruption(stoppedBy) && (
        <Notice kind="caution" testID="take-broken-off">
          {`${causeWords(stoppedBy, report.durationS)} What you sang until then is kept.`}
        </Notice>
      )}
      <View style={{ flexDirection: "row", justifyContent: "space-between", gap: 12, alignItems: "center" }}>
        <Text variant="small" style={{ fontWeight: "600", flexShrink: 1 }} testID="take-clear">
          {first.replace(/\.$/, "")}
        </Text>
        <NoteDots words={first} />
      </View>
      <NextStep words={report.nextStep} onPress={report.advice === "go-on" ? onSongs : onAgain} />
      <Why take={take} certainty={report.certainty} reasons={others} />
      {processed.length > 0 && (
        <Notice kind="caution" testID="take-processed">
          {`This browser kept ${listWords(processed)} on, which can swallow soft notes. Your range may be a little wider than shown.`}
        </Notice>
      )}
      {trail}
      <AfterSinging warmedUp={take.warmedUp} effort={take.effort} onChange={onFelt} />
    </View>
  );
}

function NextStep({ words, onPress }: { words: string; onPress: () => void }) {
  return (
    <Pressable
      role="button"
      onPress={onPress}
      testID="take-next"
      style={{ flexDirection: "row", justifyContent: "space-between", alignItems: "center", gap: 12, minHeight: 48 }}
    >
      <Text variant="strong" tone="plum" style={{ flexShrink: 1 }}>
        {`Next: ${words.charAt(0).toLowerCase()}${words.slice(1).replace(/\.$/, "")}`}
      </Text>
      <Icon name="forward" color={colors.plum} />
    </Pressable>
  );
}

function Why({ take, certainty, reasons }: { take: HeardTake; certainty: number; reasons: readonly string[] }) {
  const { range, estimate, tuningCents } = take.report;
  return (
    <View role="region" aria-label="How sure this is" style={{ gap: 4 }}>
      <Heading level={3}>{certaintyWords(certainty)}</Heading>
      {range && <Text variant="small">{`You held ${bandWords(inTune(range, tuningCents))}.`}</Text>}
      {range && estimate && reachesFarther(estimate, range) && (
        <Text variant="small" testID="take-estimate">
          {`Your voice probably reaches about ${bandWords(inTune(estimate, tuningCents))} (estimate).`}
        </Text>
      )}
      {reasons.map((reason) => (
        <Text key={reason} variant="small" tone="soft">
          {reason}
        </Text>
      ))}
    </View>
  );
}
