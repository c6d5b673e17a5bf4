import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { View } from "react-native";
import { useSession } from "@/features/api/SessionProvider";
import { AskedTwice } from "@/features/ui/AskedTwice";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { Form } from "@/features/ui/Form";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { SheetLink, SheetLinkRequest } from "@/shared/contract/sheetLink";
import { linkQueries, useMakeLink, useRevokeLink } from "./linkQueries";
import { linkState } from "./linkWords";

export interface ShareLinksProps {
  songId: string;
  /** what the link opens with */
  view: SheetLinkRequest["view"];
}

const terms = [
  { value: "7", label: "7 days" },
  { value: "30", label: "30 days" },
  { value: "90", label: "90 days" },
] as const;

/** Read-only links to this sheet: make one, see which there are, end them. */
export function ShareLinks({ songId, view }: ShareLinksProps) {
  const { status } = useSession();
  const signedIn = status === "signed-in";
  const links = useQuery(linkQueries.ofSong(signedIn ? songId : null));
  if (!signedIn)
    return (
      <View style={{ gap: 10 }} testID="share-needs-account">
        <Text variant="small">
          A link shows the song from your account to others. Without an account the song lies on this device only, where
          nobody else can reach it. Printing and PDF need no account.
        </Text>
        <LinkButton href="/account/sign-up" label="Make an account" kind="secondary" small />
      </View>
    );
  return (
    <View style={{ gap: 16 }}>
      <Maker songId={songId} view={view} />
      <QueryState query={links} title="The links could not be listed">
        {(all) => (all.length === 0 ? null : <Links links={all} />)}
      </QueryState>
    </View>
  );
}

function Maker({ songId, view }: ShareLinksProps) {
  const [label, setLabel] = useState("");
  const [term, setTerm] = useState<(typeof terms)[number]["value"]>("30");
  const [copied, setCopied] = useState<"yes" | "no" | null>(null);
  const make = useMakeLink();
  const address = make.data ? `${window.location.origin}/shared/${make.data.token}` : null;
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(address ?? "");
      setCopied("yes");
    } catch {
      setCopied("no");
    }
  };
  return (
    <Form
      label="A new link"
      gap={12}
      onSubmit={() => {
        setCopied(null);
        const days = Number(term) as SheetLinkRequest["days"];
        make.mutate({ songId, label: label.trim(), days, view }, { onSuccess: () => setLabel("") });
      }}
    >
      <Text variant="small" tone="soft">
        Whoever has the link sees title and chart of this song as they are on the day, and nothing else of yours. They
        can move it to their own instrument, and change nothing.
      </Text>
      <Field
        label="For whom (only you see this)"
        value={label}
        onChangeText={setLabel}
        error={label.trim().length > 60 ? "At most 60 characters." : undefined}
        testID="link-label"
      />
      <Segmented label="How long it works" options={terms} value={term} onChange={setTerm} testID="link-term" />
      <Button
        submit
        kind="secondary"
        small
        label="Make a link"
        busy={make.isPending}
        onPress={() => undefined}
        testID="make-link"
      />
      {make.error && (
        <Notice kind="error" title="No link was made">
          {make.error.message}
        </Notice>
      )}
      {address !== null && (
        <Notice
          kind="good"
          title="The link is made"
          action={<Button kind="text" small label="Copy the link" onPress={() => void copy()} testID="copy-link" />}
        >
          <Text variant="small" selectable testID="link-address" style={{ wordBreak: "break-all" } as object}>
            {address}
          </Text>
          <Text variant="tiny" tone="soft">
            {copied === "yes"
              ? "Copied."
              : copied === "no"
                ? "This browser did not copy it. Select it and copy it by hand."
                : "It is shown only now. Copy it before you leave the page."}
          </Text>
        </Notice>
      )}
    </Form>
  );
}

function Links({ links }: { links: readonly SheetLink[] }) {
  const now = new Date().toISOString();
  return (
    <View testID="links">
      {links.map((link) => (
        <LinkRow key={link.id} link={link} {...linkState(link, now)} />
      ))}
    </View>
  );
}

function LinkRow({ link, live, words }: { link: SheetLink; live: boolean; words: string }) {
  const revoke = useRevokeLink();
  const name = link.label === "" ? "Link without a name" : link.label;
  return (
    <View
      style={{
        flexDirection: "row",
        flexWrap: "wrap",
        alignItems: "center",
        justifyContent: "space-between",
        gap: 8,
        borderTopWidth: 1,
        borderColor: colors.line,
        minHeight: 56,
        paddingVertical: 4,
      }}
    >
      <View style={{ flexShrink: 1 }}>
        <Text variant="label">{name}</Text>
        <Text variant="tiny" tone="soft">
          {words}
        </Text>
      </View>
      {live && (
        <AskedTwice
          label="End"
          accessibleName={`End the link: ${name}`}
          question={`End “${name}”?`}
          text="Whoever has it no longer gets in, and this address does not come back. You can make another link."
          failed="The link still works."
          icon={null}
          confirmLabel="End it"
          onRemove={() => revoke.mutate(link)}
          busy={revoke.isPending}
          error={revoke.error}
          testID="end-link"
        />
      )}
    </View>
  );
}
