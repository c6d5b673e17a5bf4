import { useQuery } from "@tanstack/react-query";
import type { Href } from "expo-router";
import { useState } from "react";
import { View } from "react-native";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import { keptTokens } from "@/features/api/keptTokens";
import { useSession } from "@/features/api/SessionProvider";
import { useTokenOverSignIn } from "@/features/api/useTokenOverSignIn";
import { Card } from "@/features/ui/Card";
import { EmptyState } from "@/features/ui/EmptyState";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState } from "@/features/ui/QueryState";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { InviteLook } from "@/shared/contract/studio/invite";
import type { Studio } from "@/shared/contract/studio/studio";
import { listWords } from "@/shared/music/listWords";
import { WhatIsSeen } from "../consent/WhatIsSeen";
import { Joined } from "./Joined";
import { JoinForm, type JoinFormProps } from "./JoinForm";

/** An invitation, as whoever has its link sees it: the studio, its teachers, and what they would see; then joining. */
export function InvitePage({ countries }: Pick<JoinFormProps, "countries">) {
  const token = useTokenOverSignIn(keptTokens.invite);
  const [joined, setJoined] = useState<Studio | null>(null);
  const query = useQuery({
    queryKey: ["invite", token],
    queryFn: () => http.open<InviteLook>("/invites/look", { token }),
    enabled: token !== "" && joined === null,
    retry: false,
  });
  if (joined) return <Joined studio={joined} />;
  const over = query.error instanceof ApiError && query.error.code === "link-not-valid";
  if (token === "" || over)
    return (
      <EmptyState
        testID="link-not-valid"
        title="This invitation does not work"
        text="It is used, taken back, older than seven days, or its address is not complete. Ask your teacher for a new one. If you have joined already, you find the studio in your account."
        action={<LinkButton label="To the studio" href={"/studio" as Href} />}
      />
    );
  return (
    <QueryState
      query={query}
      title="The invitation could not be opened"
      skeleton={<Skeleton words="Opening the invitation" />}
    >
      {(look) => (
        <Invitation
          look={look}
          token={token}
          countries={countries}
          onJoined={(studio) => {
            keptTokens.invite.clear();
            setJoined(studio);
          }}
        />
      )}
    </QueryState>
  );
}

interface InvitationProps extends Omit<JoinFormProps, "look"> {
  look: InviteLook;
}

function Invitation(props: InvitationProps) {
  const { look } = props;
  const wide = useLayout() === "wide";
  const column = wide ? ({ flexGrow: 1, flexBasis: 0, minWidth: 0, gap: 16 } as const) : ({ gap: 16 } as const);
  const pupil = look.role === "pupil";
  const others = look.teachers.filter((name) => name !== look.teacher);
  return (
    <View style={{ gap: 24, flexDirection: wide ? "row" : "column" }}>
      <View style={column}>
        <View style={{ gap: 6 }}>
          <Heading level={2} size={26}>
            {look.studio}
          </Heading>
          <Text testID="who-invites">
            {pupil
              ? `${look.teacher} invites you as a pupil: you get songs in your own key, and may hand in what you sang.`
              : `${look.teacher} invites you to teach there too: you see what the pupils agreed to show, give songs and answer takes.`}
          </Text>
        </View>
        {pupil && (
          <Card style={{ gap: 12 }}>
            <Heading level={2}>What a teacher sees if you agree</Heading>
            <WhatIsSeen sees={look.sees} />
            <Text variant="small" tone="soft">
              {others.length === 0
                ? `Only ${look.teacher} teaches there at present.`
                : `At present ${listWords([look.teacher, ...others])} teach there.`}
            </Text>
          </Card>
        )}
      </View>
      <View style={column}>
        <Entry {...props} />
      </View>
    </View>
  );
}

function Entry(props: InvitationProps) {
  const { status, account } = useSession();
  const next = "?next=%2Finvite";
  if (status === "unknown") return <Skeleton words="Looking whether you are signed in" />;
  if (!account)
    return (
      <Card style={{ gap: 12 }} testID="invite-entry">
        <Heading level={2}>To join you need an account</Heading>
        <Text>You come back here with it. Any account will do, whichever address the invitation went to.</Text>
        <LinkButton label="Make an account" href={`/account/sign-up${next}` as Href} testID="invite-sign-up" />
        <LinkButton kind="secondary" label="Sign in" href={`/account/sign-in${next}` as Href} testID="invite-sign-in" />
      </Card>
    );
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>Join</Heading>
      <Text variant="small" tone="soft" style={{ overflowWrap: "anywhere" } as object}>
        {`You are signed in as ${account.email}.`}
      </Text>
      <JoinForm {...props} />
    </Card>
  );
}
