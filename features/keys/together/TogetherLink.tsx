import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";

/** The way from the keys for one voice to one key for several. */
export function TogetherLink({ songId }: { songId: string }) {
  return (
    <Text variant="small" tone="soft" style={{ marginTop: 16 }}>
      {"Singing it with others? "}
      <TextLink href={{ pathname: "/songs/[id]/together", params: { id: songId } }} testID="to-together">
        Find one key for all
      </TextLink>
    </Text>
  );
}
