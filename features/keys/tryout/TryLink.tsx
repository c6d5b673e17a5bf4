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
  /** it was sung in this key before */
  again?: boolean;
  kind?: "secondary" | "text";
}

/** The way to singing a key for real. */
export function TryLink({ songId, of, shift, beside, again = false, kind = "secondary" }: TryLinkProps) {
  if (!of) return <>{beside}</>;
  return (
    <>
      <LinkButton
        kind={kind}
        small
        icon="mic"
        href={{ pathname: "/songs/[id]/try", params: { id: songId, key: of.tonic, shift: String(shift) } }}
        label={`Try it ${again ? "again " : ""}in ${glyphs(keySign(of))}`}
        testID="try-it"
        flush={kind === "text"}
      />
      {beside}
    </>
  );
}
