import { useState, type ReactNode } from "react";
import { View } from "react-native";
import { Notice } from "@/features/ui/Notice";
import { useLayout } from "@/features/ui/useLayout";
import type { Part } from "@/shared/contract/studio/assignment";
import { AnswerCard } from "./AnswerCard";
import type { TakesPlace, TakeTime } from "./takesPlace";
import { KeyCard } from "./KeyCard";
import { Thread } from "./Thread";

export interface PartScreenProps {
  part: Part;
  now: Date;
  /** the takes handed in, heard and answered */
  takes: (place: TakesPlace) => ReactNode;
  /** changing key and way, for the teacher */
  change?: ReactNode;
}

/** One pupil's part of an assignment from either side: key and way, the takes, the thread. */
export function PartScreen({ part, now, takes, change }: PartScreenProps) {
  const wide = useLayout() === "wide";
  const [time, setTime] = useState<TakeTime | null>(null);
  const column = (grow: number) =>
    wide ? ({ flexGrow: grow, flexBasis: 0, minWidth: 0, gap: 16 } as const) : ({ gap: 16 } as const);
  const teacher = part.side === "teacher";
  return (
    <View style={{ flexDirection: wide ? "row" : "column", gap: wide ? 32 : 20 }}>
      <View style={column(2)}>
        <KeyCard part={part} now={now} />
        {teacher && part.shares && change}
      </View>
      <View style={column(3)}>
        {part.shares ? (
          <>
            <Thread part={part} time={time} onTime={setTime} now={now} takes={takes} />
            {teacher && part.state !== "assigned" && <AnswerCard part={part} />}
          </>
        ) : (
          <NotShared part={part} />
        )}
      </View>
    </View>
  );
}

function NotShared({ part }: { part: Part }) {
  return part.side === "teacher" ? (
    <Notice kind="caution" title={`${part.pupil} does not share this`} testID="not-shared">
      You see only the name until they agree. What was handed in before is not shown.
    </Notice>
  ) : (
    <Notice kind="caution" title="You do not share this with your teachers" testID="not-shared">
      The song is yours to play and sing. To hand in takes and write to your teacher, agree first, under What teachers
      see in your account.
    </Notice>
  );
}
