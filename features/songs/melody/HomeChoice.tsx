import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { glyphs } from "@/shared/music/pitch";
import type { ProposedHome } from "@/shared/songs/sungMelody";
import { tonics } from "../editor/keyChoice";

export interface HomeChoiceProps {
  home: string;
  proposed: ProposedHome | null;
  onChange: (home: string) => void;
  /** what keeping does to the tune's key */
  kept: string | null;
}

/** The home note: proposed from the notes, with its reasons, and changeable. */
export function HomeChoice({ home, proposed, onChange, kept }: HomeChoiceProps) {
  return (
    <View style={{ gap: 8 }}>
      <Select
        label="Home note of the tune"
        value={home}
        testID="melody-home"
        options={tonics.map((tonic) => ({ value: tonic, label: glyphs(tonic) }))}
        onChange={onChange}
      />
      {proposed && (
        <Text variant="small" tone="soft" testID="home-proposed">
          {proposed.tonic === home
            ? proposed.reasons.join(" ")
            : `From its notes it would be ${glyphs(proposed.tonic)}. ${proposed.reasons.join(" ")}`}
          {proposed.orElse !== null &&
            proposed.tonic === home &&
            ` It could be ${glyphs(proposed.orElse)}: the two are close.`}
        </Text>
      )}
      {proposed && proposed.tonic !== home && (
        <Button
          kind="text"
          small
          label={`Take ${glyphs(proposed.tonic)}`}
          onPress={() => onChange(proposed.tonic)}
          style={{ alignSelf: "flex-start" }}
        />
      )}
      {kept !== null && (
        <Text variant="small" testID="melody-moved">
          {kept}
        </Text>
      )}
    </View>
  );
}
