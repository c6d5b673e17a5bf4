import type { Href } from "expo-router";
import { SignedIn } from "@/features/account/SignedIn";
import { StudioHome } from "@/features/studio/home/StudioHome";
import { LinkButton } from "@/features/ui/LinkButton";
import { Screen } from "@/features/ui/Screen";

export default function StudioRoute() {
  return (
    <Screen
      title="Studio"
      wide
      actions={
        <LinkButton kind="secondary" label="Begin a studio" href={"/studio/new" as Href} testID="to-new-studio" />
      }
    >
      <SignedIn here="/studio" wide>
        {() => <StudioHome now={new Date()} />}
      </SignedIn>
    </Screen>
  );
}
