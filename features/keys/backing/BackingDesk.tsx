import { useEffect, useState, type ReactNode } from "react";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { BeatLights } from "./BeatLights";
import { useBacking } from "./useBacking";

/** One place on a page that plays one plan at a time. */
export interface Desk {
  /** false where the browser has no Web Audio */
  possible: boolean;
  /** which plan is heard; null for silence */
  heard: string | null;
  /** Plays a plan from its first bar, at once. */
  play: (id: string, plan: BackingPlan) => void;
  stop: () => void;
  /** the beat and the chord to be seen, while something is heard */
  lights: ReactNode;
}

/** Plays the plans that the page's other parts make. */
export function BackingDesk({ children }: { children: (desk: Desk) => ReactNode }) {
  const [on, setOn] = useState<{ id: string; plan: BackingPlan } | null>(null);
  const { possible, playing, start, stop, heard } = useBacking(on?.plan ?? null);
  useEffect(() => {
    if (on) start({ from: on.plan.countInS, countIn: false });
  }, [on, start]);
  const sounds = on !== null && playing === "playing";
  return children({
    possible,
    heard: sounds ? on.id : null,
    play: (id, plan) => setOn({ id, plan }),
    stop,
    lights: sounds ? <BeatLights plan={on.plan} heard={heard} playing /> : null,
  });
}
