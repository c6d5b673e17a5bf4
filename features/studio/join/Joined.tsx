import type { Href } from "expo-router";
import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { EmptyState } from "@/features/ui/EmptyState";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import type { Studio } from "@/shared/contract/studio/studio";
import { GuardianForm } from "../consent/GuardianForm";
import { consentWords } from "../home/PupilStudio";
import { teaches } from "../StudioPage";

/** After joining: what holds now, and, for those under age, who confirms it. */
export function Joined({ studio }: { studio: Studio }) {
  return (
    <View style={{ gap: 16, maxWidth: 560 }}>
      <EmptyState
        testID="joined"
        title={`You are in “${studio.name}”`}
        text={teaches(studio) ? "You teach there now." : consentWords(studio)}
        action={<LinkButton label="To the studio" href={`/studio/${studio.id}` as Href} testID="to-joined" />}
      />
      {studio.me.consent.waitsForGuardian && (
        <Card style={{ gap: 12 }}>
          <Heading level={2}>Parent or guardian</Heading>
          <GuardianForm asked={null} />
        </Card>
      )}
    </View>
  );
}
