import { LinkButton } from "@/features/ui/LinkButton";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";

export interface TryLinkProps {
  songId: string;
  of: KeyName;
  shift: number;
}

/** The way to singing a key for real. */
export function TryLink({ songId, of, shift }: TryLinkProps) {
  return (
    <LinkButton
      kind="secondary"
      small
      icon="mic"
      href={{ pathname: "/songs/[id]/try", params: { id: songId, key: of.tonic, shift: String(shift) } }}
      label={`Try it in ${glyphs(keySign(of))}`}
      testID="try-it"
    />
  );
}
