import type { ReactNode } from "react";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";

/** What plays plans for these pages: one at a time. */
export interface HearingDesk {
  /** false where the browser cannot sound */
  possible: boolean;
  /** which plan is heard; null for silence */
  heard: string | null;
  play: (id: string, plan: BackingPlan) => void;
  stop: () => void;
  /** the beat to be seen, while something is heard */
  lights: ReactNode;
}
