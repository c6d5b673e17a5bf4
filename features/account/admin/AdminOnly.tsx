import type { Href } from "expo-router";
import type { ReactNode } from "react";
import { View } from "react-native";
import { useSession } from "@/features/api/SessionProvider";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Skeleton } from "@/features/ui/Skeleton";

const pages = [
  { name: "people", label: "People", href: "/admin" },
  { name: "health", label: "Health", href: "/admin/health" },
  { name: "events", label: "Security events", href: "/admin/audit" },
] as const;

/** The pages of administrators, with the ways between them; anybody else is told that there is nothing for them here. */
export function AdminOnly({ here, children }: { here: (typeof pages)[number]["name"]; children: ReactNode }) {
  const { account, status, problem } = useSession();
  if (status === "unknown" && !problem) return <Skeleton words="Looking whether you are signed in" />;
  if (account?.role !== "admin")
    return (
      <EmptyState
        testID="not-yours"
        title="Nothing for you stands at this address"
        text="It is not yours to see. What you kept is safe."
        action={<LinkButton href="/" label="Go to the first page" small />}
      />
    );
  if (!account.secondFactor)
    return (
      <EmptyState
        testID="codes-first"
        title="Switch codes on first"
        text="Administrators need codes for signing in. Switch them on, then come back."
        action={<LinkButton href={"/account/security" as Href} label="To signing in" small />}
      />
    );
  return (
    <View style={{ gap: 20, width: "100%" }}>
      <View role="navigation" aria-label="Administration" style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
        {pages
          .filter(({ name }) => name !== here)
          .map(({ name, label, href }) => (
            <LinkButton key={name} kind="secondary" small label={label} href={href as Href} testID={`to-${name}`} />
          ))}
      </View>
      {children}
    </View>
  );
}
