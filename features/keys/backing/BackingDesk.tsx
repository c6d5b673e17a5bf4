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
  /** Plays a plan from its first bar, at once; silences it if it is the one that is heard. */
  toggle: (id: string, plan: BackingPlan) => void;
  stop: () => void;
  /** the beat and the chord to be seen, while something is heard */
  lights: ReactNode;
}

interface OnDesk {
  id: string;
  plan: BackingPlan;
}

/** Plays the plans that the page's other parts make. */
export function BackingDesk({ children }: { children: (desk: Desk) => ReactNode }) {
  const [on, setOn] = useState<OnDesk | null>(null);
  const { possible, playing, start, stop, heard } = useBacking(on?.plan ?? null);
  const plan = on?.plan ?? null;
  useEffect(() => {
    if (plan) start({ from: plan.countInS, countIn: false });
  }, [plan, start]);
  const sounds = on !== null && playing === "playing";
  return children({
    possible,
    heard: sounds ? on.id : null,
    toggle: (id, next) => {
      if (sounds && on.id === id) stop();
      else if (on?.plan === next) {
        setOn({ id, plan: next });
        start({ from: next.countInS, countIn: false });
      } else setOn({ id, plan: next });
    },
    stop,
    lights: on && sounds ? <BeatLights plan={on.plan} heard={heard} playing /> : null,
  });
}
