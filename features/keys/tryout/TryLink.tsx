import type { ReactNode } from "react";
import { LinkButton } from "@/features/ui/LinkButton";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";

export interface TryLinkProps {
  songId: string;
  /** nothing is shown while no key is known */
  of: KeyName | null;
  shift: number;
  /** stands after it */
  beside?: ReactNode;
}

/** The way to singing a key for real. */
export function TryLink({ songId, of, shift, beside }: TryLinkProps) {
  if (!of) return <>{beside}</>;
  return (
    <>
      <LinkButton
        kind="secondary"
        small
        icon="mic"
        href={{ pathname: "/songs/[id]/try", params: { id: songId, key: of.tonic, shift: String(shift) } }}
        label={`Try it in ${glyphs(keySign(of))}`}
        testID="try-it"
      />
      {beside}
    </>
  );
}
