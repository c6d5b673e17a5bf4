import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import type { Take } from "@/shared/contract/take";
import { movingEnds, type MovedEnd } from "@/shared/voice/movingEnds";
import { shownTake } from "@/shared/voice/shownTake";
import { semitoneWords } from "@/shared/music/moveWords";

export interface MovingVoiceProps {
  /** of one voice */
  takes: readonly Take[];
}

/** Says kindly that a voice is on its way; nothing where it is not. */
export function MovingVoice({ takes }: MovingVoiceProps) {
  const moved = movingEnds(takes.map(shownTake));
  if (moved.length === 0) return null;
  return (
    <Notice kind="good" title="Your voice is moving" testID="voice-moving">
      <Text variant="small">{`${moved.map(movedWords).join(" ")} Voices change, most of all while growing up.`}</Text>
      <Text variant="small" tone="soft">
        Sing again every six to eight weeks. Where the old notes are no longer yours, erase the older takes or start a
        new voice, and your keys follow. Nothing has to be reached again.
      </Text>
    </Notice>
  );
}

function movedWords({ end, by, weeks }: MovedEnd): string {
  const note = end === "low" ? "lowest" : "highest";
  const time = weeks === 1 ? "a week" : `${weeks} weeks`;
  return `In about ${time} your ${note} note went ${by < 0 ? "down" : "up"} by ${semitoneWords(Math.abs(by))}.`;
}
