import { useLocalSearchParams } from "expo-router";
import { EntryPage } from "@/features/account/entry/EntryPage";
import { Screen } from "@/features/ui/Screen";

export default function SignInRoute() {
  const { next } = useLocalSearchParams<{ next?: string }>();
  return (
    <Screen title="Sign in" back="/account">
      <EntryPage key="sign-in" kind="sign-in" next={next} />
    </Screen>
  );
}
