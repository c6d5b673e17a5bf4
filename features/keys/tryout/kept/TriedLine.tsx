import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";

/** Says what tries have changed about the voice that the keys are judged by, and where they can be taken out. */
export function TriedLine({ songId, tried }: { songId: string; tried: readonly string[] }) {
  if (tried.length === 0) return null;
  return (
    <Text variant="small" tone="soft" testID="tried-line" style={{ marginBottom: 8 }}>
      {`From what you tried: ${tried.join(" ")} `}
      <TextLink href={`/songs/${songId}/try`}>See your tries</TextLink>
    </Text>
  );
}
