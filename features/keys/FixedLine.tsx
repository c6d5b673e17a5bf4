import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { fixedName, type FixedInstrument } from "@/shared/keys/fixed/fixedInstrument";

/** Says which instruments of the line-up are made in one key, and so move the order of the keys. */
export function FixedLine({ songId, fixed }: { songId: string; fixed: readonly FixedInstrument[] }) {
  if (fixed.length === 0) return null;
  const names = fixed.map((each) => `the ${fixedName(each)}`).join(" and ");
  return (
    <Text variant="small" tone="soft" testID="fixed-line" style={{ marginBottom: 8 }}>
      {`Playing along: ${names}. Keys that ${fixed.length === 1 ? "it plays" : "they play"} stand first. `}
      <TextLink href={`/songs/${songId}/everyone`}>See the line-up</TextLink>
    </Text>
  );
}
