import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { Invite } from "@/shared/contract/studio/invite";
import { dayOf } from "../dayWords";
import { useStudioChange } from "../studioQueries";

const rank: Record<Invite["state"], number> = { open: 0, expired: 1, accepted: 2, revoked: 3 };

interface InviteRowsProps {
  studioId: string;
  invites: readonly Invite[];
  /** those who are to teach are invited by the owner only */
  owner: boolean;
  now: Date;
}

/** Those who were invited: open invitations first, each can be sent again or taken back. */
export function InviteRows({ studioId, invites, owner, now }: InviteRowsProps) {
  const shown = [...invites].sort((a, b) => rank[a.state] - rank[b.state] || b.sentAt.localeCompare(a.sentAt));
  if (shown.length === 0)
    return (
      <Text tone="soft" testID="no-invites">
        Nobody yet.
      </Text>
    );
  return (
    <View role="list" testID="invites">
      {shown.map((invite) => (
        <View
          key={invite.id}
          role="listitem"
          style={{ borderTopWidth: 1, borderColor: colors.line, paddingVertical: 8 }}
        >
          <InviteRow studioId={studioId} invite={invite} mayChange={owner || invite.role === "pupil"} now={now} />
        </View>
      ))}
    </View>
  );
}

function stateOf({ state, expiresAt, sentAt, role }: Invite, now: Date): string {
  const as = role === "co-teacher" ? "as teacher, " : "";
  if (state === "open") return `${as}sent ${dayOf(sentAt, now)}, good until ${dayOf(expiresAt, now)}`;
  if (state === "expired") return `${as}not used, ended ${dayOf(expiresAt, now)}`;
  return state === "accepted" ? `${as}joined` : `${as}taken back`;
}

interface InviteRowProps {
  studioId: string;
  invite: Invite;
  mayChange: boolean;
  now: Date;
}

function InviteRow({ studioId, invite, mayChange, now }: InviteRowProps) {
  const path = `/studios/${studioId}/invites/${invite.id}`;
  const again = useStudioChange(() => http.post(`${path}/resend`));
  const revoke = useStudioChange(() => http.delete(path));
  const error = again.error ?? revoke.error;
  return (
    <View style={{ gap: 2 }}>
      <Text variant="strong" style={{ overflowWrap: "anywhere" } as object}>
        {invite.email}
      </Text>
      <Text variant="small" tone={invite.state === "accepted" ? "lagoon" : "soft"}>
        {stateOf(invite, now)}
      </Text>
      {mayChange && (invite.state === "open" || invite.state === "expired") && (
        <View style={{ flexDirection: "row", flexWrap: "wrap", marginLeft: -8, columnGap: 4 }}>
          <Button
            kind="text"
            small
            label={again.isSuccess ? "Sent again" : "Send again"}
            accessibleName={`${again.isSuccess ? "Sent again" : "Send again"}: ${invite.email}`}
            busy={again.isPending}
            onPress={() => again.mutate()}
            testID="resend"
          />
          <Button
            kind="text"
            small
            label="Take back"
            accessibleName={`Take back: ${invite.email}`}
            busy={revoke.isPending}
            onPress={() => revoke.mutate()}
            testID="revoke"
          />
        </View>
      )}
      {error && <Notice kind="error">{error.message}</Notice>}
    </View>
  );
}
