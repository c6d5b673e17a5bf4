import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Icon } from "@/features/ui/Icon";
import { KeySign } from "@/features/ui/KeySign";
import { LinkButton } from "@/features/ui/LinkButton";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { Song } from "@/shared/contract/song";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { distanceWords } from "@/shared/music/moveWords";
import { glyphs } from "@/shared/music/pitch";
import type { Reconciliation } from "@/shared/songs/reconcileKeys";
import { clearChart, noteCapo, takeTransposed, type ChartChange } from "./chartChanges";
import { capitalized } from "@/shared/music/countWords";

export interface AnswerStepProps {
  song: Song;
  answer: Reconciliation;
  busy: boolean;
  onTake: (change: ChartChange) => void;
}

/** Step 4: both keys, what lies between them, and what can be done about it. */
export function AnswerStep({ song, answer, busy, onTake }: AnswerStepProps) {
  const { chart, recording, kind, nearest, words, moveTo, capo } = answer;
  const [first = "", ...more] = words;
  return (
    <View style={{ gap: 20 }} testID="answer">
      <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 20, rowGap: 8 }}>
        <Named label="The chart" of={chart} />
        <Icon name="forward" color={colors.inkSoft} />
        <Named label="The recording" of={recording} />
        <Text
          variant="strong"
          tone={kind === "same" || kind === "relative" ? "lagoon" : "ink"}
          testID="answer-distance"
        >
          {kind === "same"
            ? "They fit"
            : kind === "relative"
              ? "The same notes"
              : kind === "mode"
                ? "Same home note, other mode"
                : `${capitalized(distanceWords(nearest))} ${nearest < 0 ? "lower" : "higher"} (${nearest > 0 ? "+" : "−"}${Math.abs(nearest)})`}
        </Text>
      </View>
      <View style={{ gap: 8, maxWidth: 640 }} testID="answer-words">
        <Text variant="strong">{first}</Text>
        {more.map((sentence) => (
          <Text key={sentence}>{sentence}</Text>
        ))}
      </View>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 16 }}>
        {moveTo && (
          <Offer
            title={`Take the chart in ${glyphs(keySign(moveTo))}`}
            text="Every chord is moved, and the chart's written key with them. The tune goes along."
            label="Take it"
            busy={busy}
            testID="take-transposed"
            onPress={() => onTake(takeTransposed(song, moveTo, nearest))}
          />
        )}
        {capo !== null && (
          <Offer
            title={`Note capo ${capo}`}
            text="The chords stay as they are; a line at the head of the chart says where the capo goes."
            label="Note it"
            busy={busy}
            testID="take-capo"
            onPress={() => onTake(noteCapo(song, answer))}
          />
        )}
        {kind !== "same" && (
          <Offer
            title="Look for another chart"
            text="Clears this one, so that you can paste another. The one before stays in the song's earlier versions."
            label="Clear the chart"
            busy={busy}
            testID="take-none"
            onPress={() => onTake(clearChart(song))}
          />
        )}
      </View>
    </View>
  );
}

function Named({ label, of }: { label: string; of: KeyName }) {
  return (
    <View>
      <Text variant="small" tone="soft">
        {label}
      </Text>
      <KeySign of={of} size={36} />
    </View>
  );
}

interface OfferProps {
  title: string;
  text: string;
  label: string;
  busy: boolean;
  testID: string;
  onPress: () => void;
}

function Offer({ title, text, label, busy, testID, onPress }: OfferProps) {
  return (
    <Card style={{ flexGrow: 1, flexBasis: 260, gap: 8, justifyContent: "space-between" }}>
      <Heading level={3} size={16}>
        {title}
      </Heading>
      <Text variant="small" tone="soft" style={{ flexGrow: 1 }}>
        {text}
      </Text>
      <Button
        kind="secondary"
        small
        label={label}
        accessibleName={`${label}: ${title}`}
        busy={busy}
        onPress={onPress}
        testID={testID}
      />
    </Card>
  );
}

/** There is nothing yet to compare, or nothing to compare with. */
export function NoAnswer({ songId, missing }: { songId: string; missing: "home" | "chart" }) {
  return (
    <View style={{ gap: 12, alignItems: "flex-start" }}>
      <Text>
        {missing === "home"
          ? "The recording's home note is not known yet. Hum, sing, tap or name it in the step before."
          : "This song has no chart with a key yet, so there is nothing to compare the recording with."}
      </Text>
      {missing === "chart" && (
        <LinkButton
          kind="secondary"
          small
          label="Write the chart"
          href={{ pathname: "/songs/[id]/edit", params: { id: songId } }}
        />
      )}
    </View>
  );
}
