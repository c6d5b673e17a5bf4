import type { KeyName } from "@/shared/music/keyName";
import type { Way } from "@/shared/ways/way";

/** The address of the walk that explains a key and, where one is in hand, a way on an instrument. */
export function whyPath(
  songId: string,
  key: Pick<KeyName, "tonic">,
  shift: number,
  on?: { instrument: string; way: Pick<Way, "retune" | "capo" | "shapeKey"> | null },
): `/songs/${string}` {
  const asked = new URLSearchParams({ key: key.tonic, shift: String(shift) });
  if (on) asked.set("instrument", on.instrument);
  if (on?.way) {
    asked.set("retune", String(on.way.retune));
    asked.set("capo", String(on.way.capo));
    asked.set("shapes", on.way.shapeKey);
  }
  return `/songs/${songId}/why?${asked}`;
}
