import type { Href } from "expo-router";
import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { KeySign } from "@/features/ui/KeySign";
import { LinkButton } from "@/features/ui/LinkButton";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { Part } from "@/shared/contract/studio/assignment";
import { keyWords } from "@/shared/music/keyWords";
import { moveWords } from "@/shared/music/moveWords";
import { glyphs } from "@/shared/music/pitch";
import { dayOf, dueWords } from "../dayWords";
import { playedWords } from "./playedWords";

/** The key and the way of a part, what the teacher wrote to it, and, for the pupil, the ways on. */
export function KeyCard({ part, now }: { part: Part; now: Date }) {
  const { tonic, mode, shift, side, shares, note, partNote, dueOn, assignedAt, assignedBy } = part;
  const key = { tonic, mode };
  const played = playedWords(part);
  const shown = side === "pupil" || shares;
  return (
    <Card style={{ gap: 12 }} testID="part-key">
      <View style={{ flexDirection: "row", gap: 16, alignItems: "center" }}>
        <KeySign of={key} size={52} tone="plum" stacked />
        <View style={{ flexShrink: 1, gap: 2 }}>
          <Text variant="strong">{glyphs(keyWords(key))}</Text>
          <Text variant="small" tone="soft">{`The tune lies ${moveWords(shift)}.`}</Text>
          {shown && played !== "" && <Text variant="small">{played}</Text>}
        </View>
      </View>
      <Text variant="small" tone="soft">
        {[
          `Given ${dayOf(assignedAt, now)}${assignedBy === null ? "" : ` by ${assignedBy}`}`,
          dueOn && dueWords(dueOn, now),
        ]
          .filter(Boolean)
          .join(", ")}
      </Text>
      {note !== "" && <Text testID="assignment-note">{note}</Text>}
      {partNote !== "" && <Text testID="part-note">{partNote}</Text>}
      {side === "pupil" && <PupilLinks part={part} />}
    </Card>
  );
}

/** Where a pupil works on the song: their own copy of it on their own shelf. */
function PupilLinks({ part: { songId, tonic, shift, shares } }: { part: Part }) {
  const phone = useLayout() === "phone";
  if (songId === null)
    return (
      <Text variant="small" tone="soft" testID="copy-gone">
        Your copy of the song was deleted from your shelf.
      </Text>
    );
  const to = (page: string) => `/songs/${songId}${page}` as Href;
  const grow = phone ? { flexGrow: 1 } : null;
  return (
    <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
      <LinkButton
        label={shares ? "Sing it and hand it in" : "Sing it"}
        icon="mic"
        href={to(`/try?${new URLSearchParams({ key: tonic, shift: String(shift) }).toString()}`)}
        testID="sing-it"
        style={grow}
      />
      <View style={[{ flexDirection: "row", flexWrap: "wrap", gap: 10 }, grow]}>
        <LinkButton kind="secondary" label="Open the sheet" href={to("/sheet")} testID="part-sheet" style={grow} />
        <LinkButton kind="text" label="The song" href={to("")} testID="part-song" />
      </View>
    </View>
  );
}
