import { Notice } from "@/features/ui/Notice";
import type { DraftErrors } from "./songDraft";

/** All that needs mending before the song can be kept. */
export function WrongNotice({ errors }: { errors: DraftErrors }) {
  const wrong = Object.values(errors).filter((message) => message !== undefined);
  if (wrong.length === 0) return null;
  return (
    <Notice kind="error" title={wrong.length === 1 ? "One thing needs mending" : `${wrong.length} things need mending`}>
      {wrong.join(" ")}
    </Notice>
  );
}
