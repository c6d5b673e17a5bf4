import { usePathname, type Href } from "expo-router";
import { View } from "react-native";
import { session } from "@/features/api/session";
import { useSession } from "@/features/api/SessionProvider";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";

function SignIn() {
  const path = usePathname();
  const href = `/account/sign-in?next=${encodeURIComponent(path)}` as Href;
  return <LinkButton href={href} label="Sign in" small testID="sign-in-again" />;
}

/** In the place of a song of somebody whose session ran out: it is in the account, not lost. */
export function SignedOutState() {
  return (
    <EmptyState
      testID="signed-out"
      title="You are signed out"
      text="Sign in to see your songs. What is in your account is safe."
      action={<SignIn />}
    />
  );
}

/** Over the shelf, which shows this device's songs only until one signs in again; nothing for everybody else. */
export function SignedOutNotice() {
  const { ended } = useSession();
  if (!ended) return null;
  return (
    <View style={{ marginBottom: 16 }}>
      <Notice
        kind="caution"
        testID="signed-out"
        title="You are signed out"
        action={
          <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8, marginTop: 8 }}>
            <SignIn />
            <Button kind="text" small label="Stay signed out" onPress={() => session.stayOut()} testID="stay-out" />
          </View>
        }
      >
        Sign in to see your songs. What is in your account is safe; here stand the songs of this device only.
      </Notice>
    </View>
  );
}
