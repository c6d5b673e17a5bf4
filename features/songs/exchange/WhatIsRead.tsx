import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";

const kinds = [
  { name: "Text", words: "Chords over words. One file gives one song, named after the file. To 20 MB." },
  { name: "ABC", words: "One tune, or a book of up to 500: each becomes a song with its melody." },
  {
    name: "MIDI and MusicXML",
    words: "The voice that is likely sung, with its words where the file has them. To 5 MB.",
  },
  { name: "Larkspan JSON", words: "Songs exported here come back as they were, with tags and tunes." },
] as const;

/** Which files can be imported, and what becomes of each. */
export function WhatIsRead() {
  return (
    <View style={{ gap: 12 }}>
      <Heading level={2} size={16}>
        What can be read
      </Heading>
      {kinds.map(({ name, words }) => (
        <View key={name}>
          <Text variant="strong">{name}</Text>
          <Text variant="small" tone="soft">
            {words}
          </Text>
        </View>
      ))}
      <Text variant="small" tone="soft">
        A song that you have already is not taken twice. If you cancel, nothing stays.
      </Text>
    </View>
  );
}
