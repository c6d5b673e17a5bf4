import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { belongingsInWords } from "../belongingsInWords";
import { belongingsQueries } from "../belongingsQueries";

/** What a visitor has on this device, and the way to keep it. */
export function VisitorCard({ ended }: { ended: boolean }) {
  const { data, error } = useQuery(belongingsQueries.counts());
  const words = data && belongingsInWords(data);
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>{words ? "On this device" : "Without an account"}</Heading>
      {ended && (
        <Notice kind="caution">Your session has ended. Sign in again to see your shelf; nothing is lost.</Notice>
      )}
      {error ? (
        <Notice kind="caution">{error.message}</Notice>
      ) : (
        <Text variant="body" testID="on-this-device">
          {words
            ? `You have ${words} here. They stay in this browser only, until you sign up; then they move into your account.`
            : "Larkspan works without one: what you sing and write stays in this browser. With an account it is kept, and you find it on every device you sign in on."}
        </Text>
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
        <LinkButton
          small
          label={words ? "Sign up to keep it" : "Sign up"}
          href="/account/sign-up?next=%2Faccount"
          testID="to-sign-up"
        />
        <LinkButton
          small
          kind="secondary"
          label="Sign in"
          href="/account/sign-in?next=%2Faccount"
          testID="to-sign-in"
        />
      </View>
    </Card>
  );
}
