import { useState, type ReactNode } from "react";
import { View } from "react-native";
import { Segmented } from "@/features/ui/Segmented";
import { LiveText } from "@/features/ui/LiveText";
import { Text } from "@/features/ui/Text";
import type { TakeReport } from "@/shared/voice/takeReport";
import type { SungPlace } from "./useMelodyEditor";

/** The recorder, as the page that joins voice and songs gives it. */
export type SingButton = (line: { label: string; onSung: (report: TakeReport) => void }) => ReactNode;

export interface SingPaneProps {
  sing: SingButton;
  /** how many notes there are already */
  count: number;
  /** the chosen part in words; null where no notes are chosen */
  part: string | null;
  tempo: number | null;
  onSung: (report: TakeReport, place: SungPlace) => number;
}

/** Singing the tune: as a whole, on from where it ends, or a part of it again. */
export function SingPane({ sing, count, part, tempo, onSung }: SingPaneProps) {
  const [wanted, setWanted] = useState<SungPlace>("on");
  const [heard, setHeard] = useState("");
  const place: SungPlace = count === 0 ? "whole" : wanted === "part" && part === null ? "on" : wanted;
  const label = {
    whole: count === 0 ? "Sing the tune" : "Sing it all anew",
    on: "Sing on from its end",
    part: `Sing ${part ?? ""} again`,
  }[place];
  return (
    <View style={{ gap: 12 }}>
      <Text>
        Sing it alone, without an instrument, in any key that suits you. La, la is enough; a clear beginning of each
        note helps.
      </Text>
      {count > 0 && (
        <Segmented
          label="What the singing becomes"
          testID="sung-place"
          value={place}
          options={[
            { value: "on", label: "Sing on" },
            { value: "part", label: "The chosen part" },
            { value: "whole", label: "All anew" },
          ]}
          onChange={setWanted}
        />
      )}
      {place === "part" && (
        <Text variant="small" tone="soft">
          Sing it in the key of the rest. It takes the place of the chosen notes; Undo brings them back.
        </Text>
      )}
      {sing({
        label,
        onSung: (report) => {
          const notes = onSung(report, place);
          setHeard(
            notes === 0
              ? "No notes came out of that. Sing a few of them, each held for a moment."
              : `${notes} ${notes === 1 ? "note" : "notes"} heard.`,
          );
        },
      })}
      <LiveText variant="small" tone="soft">
        {heard}
      </LiveText>
      <Text variant="small" tone="soft">
        {tempo === null
          ? "The song has no tempo yet, so a second counts as one beat. The sound stays on this device and is not kept."
          : `Lengths are read at ${tempo} beats a minute, the song's tempo. The sound stays on this device and is not kept.`}
      </Text>
    </View>
  );
}
