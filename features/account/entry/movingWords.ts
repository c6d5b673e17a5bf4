import type { MoveInState } from "@/features/api/moveIn";

/** How far the move into the account is, while one is entering; null before it begins. */
export function movingWords(entering: boolean, { status, moved, total }: MoveInState): string | null {
  return entering && status === "moving" ? `Moving your things: ${moved} of ${total}` : null;
}
