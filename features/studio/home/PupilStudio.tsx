import type { Href } from "expo-router";
import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { Studio } from "@/shared/contract/studio/studio";
import { listWords } from "@/shared/music/listWords";
import { dayInWords, daysUntil, distanceInDays } from "../dayWords";
import { GivenToMe } from "./StudioHome";

/** A studio as its pupil sees it: what was given, who teaches, and what they may see. */
export function PupilStudio({ studio, now }: { studio: Studio; now: Date }) {
  const wide = useLayout() === "wide";
  const { event, me, teachers } = studio;
  const column = wide ? ({ flexGrow: 1, flexBasis: 0, minWidth: 0, gap: 16 } as const) : ({ gap: 16 } as const);
  return (
    <View style={{ flexDirection: wide ? "row" : "column", gap: wide ? 32 : 24 }}>
      <View style={column}>
        <GivenToMe studioId={studio.id} now={now} />
      </View>
      <View style={column}>
        <Card style={{ gap: 10 }}>
          <Heading level={2}>{`With ${listWords(teachers.map(({ name }) => name))}`}</Heading>
          {event && (
            <Text variant="body">
              {`${event.name} ${distanceInDays(daysUntil(event.date, now))}, ${dayInWords(event.date)}.`}
            </Text>
          )}
          <Text variant="body">{`You are ${me.name} here. Other pupils see nothing of you.`}</Text>
          <Text variant="body" testID="my-consent">
            {consentWords(studio)}
          </Text>
          <View style={{ alignSelf: "flex-start" }}>
            <LinkButton
              kind="secondary"
              small
              label="What your teachers see"
              href={"/account/sharing" as Href}
              testID="to-sharing"
            />
          </View>
        </Card>
      </View>
    </View>
  );
}

/** What holds at this moment, in a sentence. */
export function consentWords({ me: { consent } }: Pick<Studio, "me">): string {
  if (consent.shares) return "You agreed that your teachers see your voice, your instrument and what you hand in.";
  if (consent.waitsForGuardian)
    return "Your parent or guardian has not confirmed yet. Until then your teachers see only your name, and you hand in nothing.";
  return "Your teachers see only your name. To hand in takes, agree that they see your voice, your instrument and what you hand in.";
}
