import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import type { Take } from "@/shared/contract/take";
import { bandWords } from "../noteWords";
import { TakeRow } from "./TakeRow";
import { withoutTake } from "./whyEnd";

export interface TakeListProps {
  /** of one voice, newest first */
  takes: readonly Take[];
  busy: boolean;
  onErase: (id: string) => void;
  onChange: (take: Take) => void;
}

/** What was sung when; each take can be rated and erased, and the voice is then what all of them say. */
export function TakeList({ takes, busy, onErase, onChange }: TakeListProps) {
  return (
    <View role="region" aria-label="Takes" style={{ gap: 4 }}>
      <Heading level={2}>Takes</Heading>
      <View role="list">
        {takes.map((take) => (
          <TakeRow
            key={take.id}
            take={take}
            without={withoutWords(takes, take)}
            busy={busy}
            onErase={() => onErase(take.id)}
            onChange={onChange}
          />
        ))}
      </View>
    </View>
  );
}

function withoutWords(takes: readonly Take[], gone: Take): string {
  const rest = withoutTake(takes, gone);
  if (!rest) return "Nothing is then known of this voice.";
  return `Without it you can hold ${bandWords(rest.range)}, comfortably ${bandWords(rest.comfort)}.`;
}
