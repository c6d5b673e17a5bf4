import { useQuery } from "@tanstack/react-query";
import type { Href } from "expo-router";
import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { EmptyState } from "@/features/ui/EmptyState";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import type { Studio } from "@/shared/contract/studio/studio";
import { GuardianForm } from "../consent/GuardianForm";
import { consentWords } from "../home/PupilStudio";
import { studioQueries } from "../studioQueries";
import { teaches } from "../StudioPage";

/** After joining: what holds now, and, for those under age, who confirms it. */
export function Joined({ studio }: { studio: Studio }) {
  const waits = studio.me.consent.waitsForGuardian;
  const guardian = useQuery({ ...studioQueries.guardian(), enabled: waits });
  return (
    <View style={{ gap: 16, maxWidth: 480 }}>
      <EmptyState
        testID="joined"
        title={`You are in “${studio.name}”`}
        text={teaches(studio) ? "You teach there now." : consentWords(studio)}
        action={
          <LinkButton
            kind={waits ? "secondary" : "primary"}
            label="To the studio"
            href={`/studio/${studio.id}` as Href}
            testID="to-joined"
          />
        }
      />
      {waits && (
        <Card style={{ gap: 12 }}>
          <Heading level={2}>Parent or guardian</Heading>
          <QueryState query={guardian} title="Whether somebody is asked already could not be opened">
            {({ email, withdrawnAt }) => (
              <GuardianForm
                asked={email}
                before={
                  email !== null &&
                  withdrawnAt === null && (
                    <Notice kind="good" title="They are asked already" testID="guardian-known">
                      {`A mail about this studio went to ${email}.`}
                    </Notice>
                  )
                }
              />
            )}
          </QueryState>
        </Card>
      )}
    </View>
  );
}
