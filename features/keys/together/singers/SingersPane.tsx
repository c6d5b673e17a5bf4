import { useRef, useState } from "react";
import { View, type Text as NativeText } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { voiceTypes } from "@/shared/keys/voiceTypes";
import { AddSingers } from "./AddSingers";
import type { ReadNotes } from "./SingerForm";
import { sourceLines, type KnownSinger, type OwnVoice, type Singer } from "./singers";
import { SingersList } from "./SingersList";

export interface SingersPaneProps {
  singers: readonly Singer[];
  known: readonly KnownSinger[];
  last: readonly Singer[];
  own: readonly OwnVoice[];
  /** how many of them can be judged */
  judged: number;
  readNotes: ReadNotes;
  /** with what happened, to be spoken */
  onChange: (singers: Singer[], said: string) => void;
}

/** Who sings together, and where more come from. The sources stand open until there are two. */
export function SingersPane({ singers, known, last, own, judged, readNotes, onChange }: SingersPaneProps) {
  const [adding, setAdding] = useState(judged < 2);
  const heading = useRef<NativeText>(null);
  const change = (next: Singer[], said: string) => {
    // What was pressed may be gone with the singer.
    if (next.length < singers.length || singers.length === 0) heading.current?.focus();
    if (next.length < 2) setAdding(true);
    onChange(next, said);
  };
  const used = voiceTypes.filter(({ id }) => singers.some((singer) => singer.kind === "type" && singer.type === id));
  return (
    <View style={{ gap: 12 }}>
      <Heading ref={heading} level={2} focusable>
        Who sings
      </Heading>
      {singers.length > 0 && <SingersList singers={singers} known={known} readNotes={readNotes} onChange={change} />}
      {!adding && used.length > 0 && (
        <View testID="table-sources" style={{ gap: 4 }}>
          <Text variant="tiny" tone="soft">
            Plain voices are figures from tables, nobody’s own voice.
          </Text>
          {sourceLines(used).map((line) => (
            <Text key={line} variant="tiny" tone="soft">
              {line}
            </Text>
          ))}
        </View>
      )}
      {(judged >= 2 || !adding) && (
        <View style={{ alignItems: "flex-start" }}>
          <Button
            kind="secondary"
            small
            icon={adding ? "up" : "plus"}
            label={adding ? "That is everybody" : "Add a singer"}
            expanded={adding}
            onPress={() => setAdding(!adding)}
            testID="adding"
          />
        </View>
      )}
      {adding && (
        <AddSingers
          singers={singers}
          names={known.map(({ name }) => name)}
          last={last}
          own={own}
          readNotes={readNotes}
          onChange={onChange}
        />
      )}
    </View>
  );
}
