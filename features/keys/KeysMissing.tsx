import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { View } from "react-native";

/** What keys need and do not have yet, with the one step that brings it. */
export function KeysMissing({ songId, missing }: { songId: string; missing: "voice" | "tune" }) {
  if (missing === "voice")
    return (
      <EmptyState
        testID="keys-need-voice"
        title="Your voice is not known yet"
        text="Here stand all twelve keys, scored for your voice. Sing a few seconds, or set your lowest and highest note by hand."
        action={
          <View style={{ gap: 4 }}>
            <LinkButton href="/voice/sing" label="Sing a few seconds" icon="mic" small />
            <LinkButton href="/voice/by-hand" label="Set the notes by hand" kind="text" small />
          </View>
        }
      />
    );
  return (
    <EmptyState
      testID="keys-need-tune"
      title="The melody is not known yet"
      text="Keys are judged by where the melody lies in your voice. Its lowest and highest note are enough; a melody file says more."
      action={
        <LinkButton
          href={{ pathname: "/songs/[id]/edit", params: { id: songId } }}
          label="Give the melody"
          icon="edit"
          small
        />
      }
    />
  );
}
