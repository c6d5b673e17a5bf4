import { useQuery } from "@tanstack/react-query";
import type { Href } from "expo-router";
import { http } from "@/features/api/httpClient";
import { stopSharingWords } from "@/features/api/person/stopSharingWords";
import { AskedTwice } from "@/features/ui/AskedTwice";
import { Card } from "@/features/ui/Card";
import { EmptyState } from "@/features/ui/EmptyState";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Switch } from "@/features/ui/Switch";
import { Text } from "@/features/ui/Text";
import type { GuardianState } from "@/shared/contract/studio/consent";
import { whatTeachersSee } from "@/shared/contract/studio/whatTeachersSee";
import type { Studio } from "@/shared/contract/studio/studio";
import { listWords } from "@/shared/music/listWords";
import { dayOf } from "../dayWords";
import { consentWords } from "../home/PupilStudio";
import { LeaveStudio, NameCard } from "../settings/SettingsScreen";
import { studioQueries, useStudioChange } from "../studioQueries";
import { teaches } from "../StudioPage";
import { GuardianForm } from "./GuardianForm";
import { WhatIsSeen } from "./WhatIsSeen";

/** What one agreed to in each studio, to give and to take back; and how far a guardian is. */
export function SharingPage({ now }: { now: Date }) {
  const studios = useQuery(studioQueries.list());
  const guardian = useQuery(studioQueries.guardian());
  return (
    <QueryState query={studios} title="What you agreed to could not be opened">
      {(all) => {
        const joined = all.filter((studio) => !teaches(studio) || stands(studio));
        if (joined.length === 0)
          return (
            <EmptyState
              testID="nothing-shared"
              title="You share nothing"
              text="You are a pupil in no studio, so no teacher sees anything of you. What you sing stays on your device."
              action={<LinkButton kind="secondary" label="To the studio" href={"/studio" as Href} />}
            />
          );
        return (
          <>
            {joined.map((studio) => (
              <ConsentCard key={studio.id} studio={studio} now={now} />
            ))}
            {guardian.data?.needed === true && (
              <GuardianCard state={guardian.data} anyAgreed={joined.some(agreed)} now={now} />
            )}
            {joined.map((studio) => (
              <NameCard key={studio.id} studio={studio} />
            ))}
          </>
        );
      }}
    </QueryState>
  );
}

/** What one agreed to as a pupil holds on when one teaches there, until it is taken back. */
const stands = ({ me: { consent } }: Studio): boolean => consent.givenAt !== null && consent.withdrawnAt === null;

const agreed = ({ me: { consent } }: Studio): boolean => consent.shares || consent.waitsForGuardian;

const seen = "My teachers see what is listed below";

function ConsentCard({ studio, now }: { studio: Studio; now: Date }) {
  const { consent } = studio.me;
  const set = useStudioChange((agree: boolean) => http.put<Studio>(`/studios/${studio.id}/consent`, { agree }));
  const needsYear = set.error !== null && "code" in set.error && set.error.code === "birth-year-needed";
  return (
    <Card style={{ gap: 12 }} testID="consent">
      <Heading level={2}>{studio.name}</Heading>
      <Text variant="small" tone="soft">{`With ${listWords(studio.teachers.map(({ name }) => name))}`}</Text>
      <Text testID="consent-state">{consentWords(studio)}</Text>
      {agreed(studio) ? (
        <AskedTwice
          label={seen}
          opener={(ask) => (
            <Switch
              label={seen}
              hint={
                consent.shares && consent.givenAt !== null
                  ? `Agreed ${dayOf(consent.givenAt, now)}. Switched off, they see only your name from that moment.`
                  : "Switched off: they see only your name."
              }
              on
              onChange={ask}
              testID="consent-switch"
            />
          )}
          {...stopSharingWords}
          text={`From that moment they see only your name. Recordings you handed in to ${studio.name} and recorded answers are deleted for good.`}
          onRemove={() => set.mutate(false)}
          busy={set.isPending}
          error={set.error}
          testID="stop-sharing"
        />
      ) : (
        <Switch
          label={seen}
          hint="Switched off: they see only your name."
          on={false}
          onChange={() => set.mutate(true)}
          testID="consent-switch"
        />
      )}
      {set.error && !agreed(studio) && (
        <Notice
          kind={needsYear ? "caution" : "error"}
          title={needsYear ? "Tell the year of your birth first" : "Nothing was changed"}
          {...(needsYear
            ? { action: <LinkButton kind="text" small label="To your data" href={"/account/data" as Href} /> }
            : null)}
        >
          {needsYear ? "It decides whether a parent or guardian confirms too." : set.error.message}
        </Notice>
      )}
      <WhatIsSeen sees={whatTeachersSee(studio.recordingsKeptDays)} />
      <LeaveStudio studio={studio} />
    </Card>
  );
}

interface GuardianCardProps {
  state: GuardianState;
  anyAgreed: boolean;
  now: Date;
}

function guardianWords(state: GuardianState, now: Date): string {
  const { age, email, askedAt, confirmedAt, withdrawnAt, refusedAt } = state;
  if (email === null || askedAt === null)
    return `In your country one agrees alone from ${age} on. Nobody was asked yet.`;
  if (withdrawnAt !== null)
    return `${email} took their word back ${dayOf(withdrawnAt, now)}. Your teachers see only your name.`;
  if (refusedAt !== null)
    return `${email} did not agree ${dayOf(refusedAt, now)} to every studio above. Where it says that nobody has confirmed, your teachers see only your name.`;
  if (confirmedAt !== null) return `${email} confirmed ${dayOf(confirmedAt, now)}.`;
  return `${email} was asked ${dayOf(askedAt, now)} and has not answered yet.`;
}

function GuardianCard({ state, anyAgreed, now }: GuardianCardProps) {
  return (
    <Card style={{ gap: 12 }} testID="guardian">
      <Heading level={2}>Parent or guardian</Heading>
      <Text testID="guardian-state" style={{ overflowWrap: "anywhere" } as object}>
        {guardianWords(state, now)}
      </Text>
      {state.confirmedAt === null &&
        (anyAgreed ? (
          <GuardianForm asked={state.email} />
        ) : (
          <Text variant="small" tone="soft">
            Agree above first; then a parent or guardian can confirm it.
          </Text>
        ))}
    </Card>
  );
}
