import type { ReactNode } from "react";
import { View } from "react-native";
import { newId } from "@/features/api/newId";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { voiceTypes } from "@/shared/keys/voiceTypes";
import { AddChip } from "./AddChip";
import { SingerForm, type ReadNotes } from "./SingerForm";
import { bandWords, calledAs, freeName, mostSingers, sourceLines, type OwnVoice, type Singer } from "./singers";

export interface AddSingersProps {
  singers: readonly Singer[];
  /** names as they are shown */
  names: readonly string[];
  last: readonly Singer[];
  own: readonly OwnVoice[];
  readNotes: ReadNotes;
  /** with what happened, to be spoken */
  onChange: (singers: Singer[], said: string) => void;
}

/** Where singers come from: the voices kept here, plain voices that nobody sang for, notes typed by hand, or the last group. */
export function AddSingers({ singers, names, last, own, readNotes, onChange }: AddSingersProps) {
  const full = singers.length >= mostSingers;
  const add = (singer: Singer, name: string) => onChange([...singers, singer], `${name} added`);
  const turn = (voice: OwnVoice) => {
    const there = singers.find((singer) => singer.kind === "voice" && singer.voiceId === voice.id);
    if (there)
      onChange(
        singers.filter((singer) => singer !== there),
        `${voice.name} left out`,
      );
    else if (!full) add({ id: newId(), kind: "voice", voiceId: voice.id, name: null }, voice.name);
  };
  return (
    <View style={{ gap: 20 }} testID="add-singers">
      {full && (
        <Text variant="small" tone="honey">
          {`${mostSingers} singers are the most that one table holds. Leave one out to add another.`}
        </Text>
      )}
      {singers.length === 0 && last.length > 1 && (
        <Button
          kind="secondary"
          small
          label={`The same ${last.length} as last time`}
          onPress={() => onChange([...last], `${last.length} singers added`)}
          testID="add-last"
        />
      )}
      <Group title="Your voices">
        {own.length === 0 ? (
          <Text variant="small" tone="soft">
            {"No voice is kept here yet. "}
            <TextLink href="/voice/sing">Sing a few seconds</TextLink>
            {" and it stands here."}
          </Text>
        ) : (
          <Chips>
            {own.map((voice) => (
              <AddChip
                key={voice.id}
                label={voice.name}
                hint={voice.singing ? bandWords(voice.singing.range) : "nothing sung yet"}
                pressed={singers.some((singer) => singer.kind === "voice" && singer.voiceId === voice.id)}
                testID={`add-voice-${voice.id}`}
                onPress={() => turn(voice)}
              />
            ))}
          </Chips>
        )}
      </Group>
      {!full && (
        <>
          <Group title="Plain voices">
            <Chips>
              {voiceTypes.map((type) => (
                <AddChip
                  key={type.id}
                  label={type.name}
                  hint={bandWords(type.voice.range)}
                  testID={`add-type-${type.id}`}
                  onPress={() => {
                    const name = freeName(calledAs(type), names);
                    add({ id: newId(), kind: "type", type: type.id, name }, name);
                  }}
                />
              ))}
            </Chips>
            <Text variant="tiny" tone="soft">
              Figures from printed tables, nobody’s own voice: two singers of one kind differ by several semitones.
            </Text>
            {sourceLines(voiceTypes).map((line) => (
              <Text key={line} variant="tiny" tone="soft">
                {line}
              </Text>
            ))}
          </Group>
          <Group title="By hand">
            <SingerForm
              label="A singer by hand"
              start={{ name: "", notes: null }}
              withNotes
              readNotes={readNotes}
              button="Add this singer"
              onKeep={(name, notes) => {
                const called = freeName(name, names);
                if (notes) add({ id: newId(), kind: "hand", name: called, notes }, called);
              }}
            />
          </Group>
        </>
      )}
    </View>
  );
}

function Group({ title, children }: { title: string; children: ReactNode }) {
  return (
    <View style={{ gap: 8 }}>
      <Heading level={3}>{title}</Heading>
      {children}
    </View>
  );
}

function Chips({ children }: { children: ReactNode }) {
  return <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8, rowGap: 8 }}>{children}</View>;
}
