import { useState } from "react";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { SignedIn } from "../SignedIn";
import { AboutYou } from "./AboutYou";
import { EraseAccount } from "./EraseAccount";
import { TakeAlong } from "./TakeAlong";

const day = new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "long", year: "numeric" });

/** What the account knows of its owner, and the ways out of it. */
export function DataPage() {
  const [eraseAt, setEraseAt] = useState<string | null>(null);
  if (eraseAt !== null)
    return (
      <EmptyState
        testID="erasure-asked"
        title="Your account will be erased"
        text={`On ${day.format(new Date(eraseAt))} it goes, with everything in it, for good. You are signed out everywhere. If you change your mind, sign in before that day.`}
        action={<LinkButton kind="secondary" label="Sign in and keep it" href="/account/sign-in" />}
      />
    );
  return (
    <SignedIn here="/account/data">
      {() => (
        <>
          <AboutYou />
          <TakeAlong />
          <EraseAccount onErased={setEraseAt} />
        </>
      )}
    </SignedIn>
  );
}
