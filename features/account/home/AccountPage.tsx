import { View } from "react-native";
import { session as sessionStore } from "@/features/api/session";
import { useSession } from "@/features/api/SessionProvider";
import { Card } from "@/features/ui/Card";
import { ErrorState } from "@/features/ui/ErrorState";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import { UnitChoice } from "@/features/ui/UnitChoice";
import { useLayout } from "@/features/ui/useLayout";
import { AccountRows } from "./AccountRows";
import { ConfirmNotice } from "./ConfirmNotice";
import { MoveInNotice } from "./MoveInNotice";
import { SignedInCard } from "./SignedInCard";
import { ThemeChoice } from "./ThemeChoice";
import { VisitorCard } from "./VisitorCard";

function Person() {
  const session = useSession();
  if (session.account)
    return (
      <>
        <ConfirmNotice account={session.account} />
        <SignedInCard account={session.account} />
        <AccountRows account={session.account} />
      </>
    );
  if (session.status === "visitor") return <VisitorCard ended={session.ended} />;
  if (session.problem)
    return (
      <ErrorState
        title="Your account cannot be reached"
        text={`${session.problem.message} What is kept in it is safe.`}
        onRetry={() => void sessionStore.settled().catch(() => undefined)}
      />
    );
  return (
    <Skeleton
      bars={[{ height: 24, width: 160 }, { width: "60%" }, { height: 48, width: 120 }]}
      words="Looking whether you are signed in"
    />
  );
}

/** Account and settings. */
export function AccountPage() {
  const { status } = useSession();
  const wide = useLayout() === "wide";
  const column = wide ? ({ flexBasis: 0, flexGrow: 1, gap: 16 } as const) : ({ gap: 16 } as const);
  return (
    <View
      style={{
        maxWidth: wide ? 1080 : 560,
        width: "100%",
        gap: wide ? 32 : 16,
        flexDirection: wide ? "row" : "column",
      }}
    >
      <View style={column}>
        {status === "signed-in" && <MoveInNotice />}
        <Person />
      </View>
      <View style={column}>
        <Card style={{ gap: 12 }}>
          <Heading level={2}>Instruments</Heading>
          <Text variant="small" tone="soft">
            Tunings, strings and frets of what you play. The ways to play a key follow from them.
          </Text>
          <View style={{ alignSelf: "flex-start" }}>
            <LinkButton kind="secondary" small label="Your instruments" href="/instruments" testID="to-instruments" />
          </View>
        </Card>
        <Card style={{ gap: 12 }}>
          <Heading level={2}>Units</Heading>
          <UnitChoice />
          <Text variant="small" tone="soft">
            For scales, strings and their tension. The choice is kept on this device.
          </Text>
        </Card>
        <ThemeChoice />
      </View>
    </View>
  );
}
