import { useMutation, useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import { useMailedToken } from "@/features/api/useMailedToken";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { EmptyState } from "@/features/ui/EmptyState";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import type { GuardianLook } from "@/shared/contract/studio/consent";
import { listWords } from "@/shared/music/listWords";
import { plural } from "@/shared/music/countWords";
import { WhatIsSeen } from "../consent/WhatIsSeen";

type Word = "confirm" | "withdraw";

/** What a parent or guardian reads by the link from their mail, and decides without an account. */
export function GuardianPage() {
  const token = useMailedToken();
  const query = useQuery({
    queryKey: ["guardian-look", token],
    queryFn: () => http.open<GuardianLook>("/guardian/look", { token }),
    enabled: token !== "",
    retry: false,
    // The link is spent by the answer, and would then say nothing.
    staleTime: Infinity,
  });
  const over = query.error instanceof ApiError && query.error.code === "link-not-valid";
  if (token === "" || over)
    return (
      <EmptyState
        testID="link-not-valid"
        title="This link does not work"
        text="It is used up, older than 14 days, or not complete. To take back a word that you gave, use the link in the mail that came after it."
      />
    );
  return (
    <QueryState query={query} title="This could not be opened" skeleton={<Skeleton words="Opening the question" />}>
      {(look) => <Question look={look} token={token} />}
    </QueryState>
  );
}

/** What an answer did. The link that asks says no only where nothing was agreed; the kept one takes all of it back. */
function doneWords(word: Word, { pupil, link, studios }: GuardianLook): { title: string; text: string } {
  if (word === "confirm")
    return {
      title: "You agreed",
      text: `${pupil} can share with the teachers from now on. ${
        link === "ask"
          ? "A mail brings you a link by which you can take your word back at any time."
          : "The link that brought you here stays good: by it you can take your word back at any time."
      }`,
    };
  if (link === "keep")
    return {
      title: "Nothing is shared",
      text: `From this moment the teachers see nothing of ${pupil} but the name. Recordings that were handed in are deleted.`,
    };
  const [agreed, refused] = [true, false].map((yes) =>
    listWords(studios.filter(({ confirmed }) => confirmed === yes).map(({ name }) => name)),
  );
  const stays = agreed ? ` What you agreed to before stays as it is: ${agreed}.` : "";
  return {
    title: "You did not agree",
    text: `In ${refused} the teachers see nothing of ${pupil} but the name.${stays}`,
  };
}

function askedWords({ pupil, confirmed, studios }: GuardianLook): string {
  if (confirmed) return `You agreed that ${pupil} shares with the teachers what is listed here.`;
  const asks = `${pupil} would like to share with the teachers what is listed here, and gave your address as that of a parent or guardian.`;
  return studios.some((studio) => studio.confirmed)
    ? `${asks} To some of it you agreed before; of the rest nothing is shared until you agree.`
    : `${asks} Nothing is shared until you agree.`;
}

function Question({ look, token }: { look: GuardianLook; token: string }) {
  const answer = useMutation({ mutationFn: (word: Word) => http.open(`/guardian/${word}`, { token }) });
  if (answer.isSuccess) return <EmptyState testID="guardian-done" {...doneWords(answer.variables, look)} />;
  const takesBack = look.link === "keep" && look.studios.some(({ confirmed }) => confirmed);
  return (
    <View style={{ gap: 16, maxWidth: 640 }}>
      <Text>{askedWords(look)}</Text>
      {look.studios.map(({ name, teachers, recordingsKeptDays, confirmed }) => (
        <Card key={name} style={{ gap: 4 }}>
          <Heading level={2}>{name}</Heading>
          <Text variant="small" tone="soft">
            {`With ${listWords(teachers)}. Recordings are deleted after ${plural(recordingsKeptDays, "day")}.${confirmed ? " You agreed." : ""}`}
          </Text>
        </Card>
      ))}
      <Card style={{ gap: 12 }}>
        <Heading level={2}>What the teachers see and hear</Heading>
        <Text variant="small" tone="soft">{`As it is said to ${look.pupil}:`}</Text>
        <WhatIsSeen sees={look.sees} />
      </Card>
      {answer.error && (
        <Notice kind="error" title="Your answer did not arrive">
          {`${answer.error.message} Nothing was changed.`}
        </Notice>
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
        {!look.confirmed && (
          <Button
            label="I agree"
            busy={answer.isPending && answer.variables === "confirm"}
            onPress={() => answer.mutate("confirm")}
            testID="guardian-confirm"
          />
        )}
        {(takesBack || !look.confirmed) && (
          <Button
            kind="secondary"
            label={takesBack ? "Take my word back" : "I do not agree"}
            busy={answer.isPending && answer.variables === "withdraw"}
            onPress={() => answer.mutate("withdraw")}
            testID="guardian-withdraw"
          />
        )}
      </View>
      <Text variant="small" tone="soft" testID="guardian-reach">
        {takesBack
          ? "Taking your word back holds for every studio, at once, and recordings that were handed in are deleted."
          : look.link === "keep"
            ? "You can change your mind at any time by this link."
            : look.studios.some(({ confirmed }) => confirmed)
              ? "To take back what you agreed to before, use the link in the mail that came after it."
              : "You can take a yes back at any time, by a link that comes in a mail after it."}
      </Text>
    </View>
  );
}
