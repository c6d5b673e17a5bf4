import { Button } from "@/features/ui/Button";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import type { HearingDesk } from "./hearingDesk";

export interface HearButtonProps {
  desk: HearingDesk;
  id: string;
  /** what is to be heard: made when it is wanted; null where there is nothing to play */
  plan: () => BackingPlan | null;
  /** of the arrangement */
  label: string;
  small?: boolean;
  grow?: boolean;
}

/** Plays an arrangement as it is now, or silences it. */
export function HearButton({ desk, id, plan, label, small = false, grow = false }: HearButtonProps) {
  const on = desk.heard === id;
  return (
    <Button
      kind="secondary"
      small={small}
      label={on ? "Stop" : "Hear it"}
      accessibleName={on ? `Stop ${label}` : `Hear it: ${label}`}
      icon={on ? "stop" : "play"}
      disabled={!desk.possible}
      onPress={() => {
        const made = on ? null : plan();
        if (on) desk.stop();
        else if (made) desk.play(id, made);
      }}
      testID={`hear-${id}`}
      style={grow ? { flexGrow: 1 } : null}
    />
  );
}
