import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { keySign } from "@/shared/music/keyWords";
import type { KeyName } from "@/shared/music/keyName";
import { glyphs } from "@/shared/music/pitch";
import type { Listening } from "./listening";

export interface FoundSoFarProps {
  state: Listening;
  tempo: number | null;
  /** key of the chart; null without one */
  chart: KeyName | null;
}

/** Beside the steps on wide pages: what listening has brought, and what is still open. */
export function FoundSoFar({ state, tempo, chart }: FoundSoFarProps) {
  const { beatsPerBar, marks, home } = state;
  const mode = home?.mode ? `, ${home.mode}` : "";
  return (
    <Card style={{ gap: 16 }}>
      <Heading level={2} size={16}>
        What you have so far
      </Heading>
      <View style={{ gap: 12 }} testID="found-so-far">
        <Row label="Beat" words={tempo === null ? null : `${tempo} a minute, ${beatsPerBar} in a bar`} />
        <Row label="Parts" words={marks.length === 0 ? null : marks.map(({ name }) => name).join(", ")} />
        <Row label="Home note of the recording" words={home ? `${glyphs(home.tonic)}${mode}` : null} />
        <Row label="Key of the chart" words={chart ? glyphs(keySign(chart)) : null} open="No chart with a key yet" />
      </View>
      <Text variant="small" tone="soft">
        Every step may be left out. The answer needs only the home note.
      </Text>
    </Card>
  );
}

function Row({ label, words, open = "Not yet" }: { label: string; words: string | null; open?: string }) {
  return (
    <View>
      <Text variant="small" tone="soft">
        {label}
      </Text>
      <Text variant={words === null ? "body" : "strong"} tone={words === null ? "soft" : "ink"}>
        {words ?? open}
      </Text>
    </View>
  );
}
