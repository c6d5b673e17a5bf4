import { useLocalSearchParams } from "expo-router";
import { EntryPage } from "@/features/account/entry/EntryPage";
import { Screen } from "@/features/ui/Screen";

export default function SignUpRoute() {
  const { next } = useLocalSearchParams<{ next?: string }>();
  return (
    <Screen title="Sign up" back="/account">
      <EntryPage key="sign-up" kind="sign-up" next={next} />
    </Screen>
  );
}
