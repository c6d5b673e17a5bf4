import type { Instrument } from "@/shared/instruments/instrument";
import type { ShapeTicks } from "../WayCard";
import { knownOn, withShape, type Wishes } from "./wishes";

/** Ticks for the shapes that are known on one instrument. */
export function ticksOn(instrument: Instrument, wishes: Wishes, keep: (wishes: Wishes) => void): ShapeTicks {
  return {
    known: knownOn(wishes, instrument),
    onKnown: (mark, known) => keep(withShape(wishes, instrument, mark, known)),
  };
}
