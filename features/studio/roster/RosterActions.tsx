import type { Href } from "expo-router";
import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Dialog } from "@/features/ui/Dialog";
import { LinkButton } from "@/features/ui/LinkButton";
import { useLayout } from "@/features/ui/useLayout";
import type { Studio } from "@/shared/contract/studio/studio";
import { plural } from "@/shared/music/countWords";

/** What a teacher does most: give a song, and hear what came in. */
export function RosterActions({ studio }: { studio: Studio }) {
  const phone = useLayout() === "phone";
  const waiting = studio.counts?.waiting ?? 0;
  const none = (studio.counts?.pupils ?? 0) === 0;
  const grow = phone ? { flexGrow: 1 } : null;
  if (none) return null;
  return (
    <View style={{ flexDirection: "row", gap: 12, flexWrap: "wrap" }}>
      <LinkButton
        kind={waiting > 0 ? "secondary" : "primary"}
        label="Assign a song"
        href={`/studio/${studio.id}/assign` as Href}
        testID="to-assign"
        style={grow}
      />
      {waiting > 0 && (
        <LinkButton
          label={`Hear ${plural(waiting, "take")}`}
          href={`/studio/${studio.id}/assignments` as Href}
          testID="to-takes"
          style={grow}
        />
      )}
    </View>
  );
}

const links: readonly [string, string, string][] = [
  ["Assignments", "assignments", "to-assignments"],
  ["One key for all", "key", "to-key"],
  ["Groups", "groups", "to-groups"],
  ["Invite", "invite", "to-invite"],
  ["Settings", "settings", "to-settings"],
];

/** The other pages of a studio: in one line, on the phone behind a button. */
export function StudioLinks({ studioId }: { studioId: string }) {
  const phone = useLayout() === "phone";
  const [open, setOpen] = useState(false);
  if (!phone) return <Links studioId={studioId} />;
  return (
    <>
      <Button
        kind="text"
        small
        icon="more"
        label="More of this studio"
        expanded={open}
        onPress={() => setOpen(true)}
        testID="studio-more"
      />
      {open && (
        <Dialog title="This studio" onClose={() => setOpen(false)}>
          <Links studioId={studioId} stacked />
        </Dialog>
      )}
    </>
  );
}

function Links({ studioId, stacked = false }: { studioId: string; stacked?: boolean }) {
  return (
    <View
      role="navigation"
      aria-label="Of this studio"
      style={
        stacked
          ? { alignItems: "flex-start" }
          : { flexDirection: "row", flexWrap: "wrap", columnGap: 4, marginHorizontal: -8 }
      }
    >
      {links.map(([label, page, testID]) => (
        <LinkButton
          key={page}
          kind="text"
          small
          label={label}
          href={`/studio/${studioId}/${page}` as Href}
          testID={testID}
        />
      ))}
    </View>
  );
}
