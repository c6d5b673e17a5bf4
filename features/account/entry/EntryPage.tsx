import { Redirect, type Href } from "expo-router";
import { View } from "react-native";
import { useSession } from "@/features/api/SessionProvider";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { RoomCard } from "../forms/RoomCard";
import { nextPath } from "./nextPath";
import { SecondStepForm } from "./SecondStepForm";
import { SignInForm } from "./SignInForm";
import { SignUpForm } from "./SignUpForm";
import { useEntry, type EntryKind } from "./useEntry";

interface EntryPageProps {
  kind: EntryKind;
  /** the address's `next`, not yet trusted */
  next: string | string[] | undefined;
}

/** Signing up or in; afterwards back to where the person came from, or to the songs. */
export function EntryPage({ kind, next }: EntryPageProps) {
  const session = useSession();
  const entry = useEntry(kind);
  const target = nextPath(next);
  const query = target === "/" ? "" : `?next=${encodeURIComponent(target)}`;
  if (session.status === "signed-in" && !entry.entering) {
    const settled = entry.progress.stayed.length === 0 && entry.progress.status !== "stopped";
    // The first page is for those who are not in yet.
    const inside = target === "/" ? "/songs?entered=yes" : target;
    return <Redirect href={(settled ? inside : "/account") as Href} />;
  }
  const up = kind === "sign-up";
  if (entry.asksCode) {
    const step = <SecondStepForm entry={entry} />;
    return (
      <View style={{ maxWidth: 480, width: "100%" }}>
        <RoomCard>{step}</RoomCard>
      </View>
    );
  }
  const form = up ? <SignUpForm entry={entry} /> : <SignInForm entry={entry} />;
  return (
    <View style={{ maxWidth: 480, width: "100%", gap: 20 }}>
      {session.ended && (
        <Notice kind="caution">Your session has ended. Sign in again to see your shelf; nothing is lost.</Notice>
      )}
      {entry.again !== null && (
        <Notice kind="caution" testID="password-again">
          {entry.again}
        </Notice>
      )}
      <Text variant="body">
        {up
          ? "With an account your voices, songs and keys are kept, and you find them on every device you sign in on."
          : "Sign in to find your voices, songs and keys."}
      </Text>
      <RoomCard>{form}</RoomCard>
      {up && (
        <Text variant="small" tone="soft">
          We send a link to this address to see that it is yours. If you have an account already and forgot its
          password, choose a new one by “Forgotten password” on the page to sign in.
        </Text>
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 4 }}>
        <Text variant="body">{up ? "You have an account already?" : "You have no account yet?"}</Text>
        <LinkButton
          kind="text"
          replace
          label={up ? "Sign in" : "Sign up"}
          href={`/account/${up ? "sign-in" : "sign-up"}${query}` as Href}
          testID="other-entry"
        />
      </View>
    </View>
  );
}
