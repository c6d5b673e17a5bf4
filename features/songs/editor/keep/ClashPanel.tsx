import { useMemo, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import { draftErrors, songFromDraft, type SongDraft } from "../songDraft";
import { keyOfDraft } from "../useChartReading";
import { fieldWords, valueWords } from "./contentWords";
import { contentOf, mergeSongs, type Clash, type Side, type SongContent } from "./mergeSongs";

export interface ClashPanelProps {
  /** what both began from */
  base: Song;
  theirs: Song;
  draft: SongDraft;
  /** `resolved`: what the form is to hold from here on; null = as it is. `givenUp`: what of here goes to the earlier versions */
  onSettled: (resolved: Song | null, givenUp: SongContent | null) => void;
}

/** The song was changed here and elsewhere: both are shown, and nothing is lost whatever is chosen. */
export function ClashPanel({ base, theirs, draft, onSettled }: ClashPanelProps) {
  const mine = useMemo(() => {
    const found = draft.key === null ? keyOfDraft(draft) : null;
    return Object.keys(draftErrors(draft, found)).length > 0 ? null : songFromDraft(draft, found, base);
  }, [draft, base]);
  const merge = useMemo(
    () => mine && mergeSongs(contentOf(base), contentOf(mine), contentOf(theirs)),
    [base, mine, theirs],
  );
  const [sides, setSides] = useState<readonly Side[]>([]);
  const clashes = merge?.clashes ?? [];
  const chosen = clashes.map((_, index): Side => sides[index] ?? "mine");
  const together = () => {
    if (merge) onSettled({ ...theirs, ...merge.resolve(chosen) }, null);
  };
  return (
    <Card testID="clash" style={{ gap: 14 }}>
      <Heading level={2} size={16}>
        This song was changed elsewhere meanwhile
      </Heading>
      <Text variant="small">
        {clashes.length === 0
          ? "In another window or on another device. Both changes fit together. Whatever you choose, the other state stays in the earlier versions."
          : `In another window or on another device. ${clashes.length === 1 ? "One place was changed in both" : `${clashes.length} places were changed in both`}; choose for each. Whatever you choose, the other state stays in the earlier versions.`}
      </Text>
      {mine &&
        clashes.map((clash, index) => (
          <ClashChoice
            key={index}
            clash={clash}
            mine={mine}
            theirs={theirs}
            side={chosen[index] ?? "mine"}
            onSide={(side) => setSides(chosen.map((each, at) => (at === index ? side : each)))}
          />
        ))}
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
        {merge && (
          <Button
            small
            label={clashes.length === 0 ? "Put both together" : "Keep it like this"}
            onPress={together}
            testID="clash-merge"
          />
        )}
        <Button kind="secondary" small label="Keep mine" onPress={() => onSettled(null, null)} testID="clash-mine" />
        <Button
          kind="secondary"
          small
          label="Take theirs"
          onPress={() => onSettled(theirs, mine && contentOf(mine))}
          testID="clash-theirs"
        />
      </View>
    </Card>
  );
}

interface ClashChoiceProps {
  clash: Clash;
  mine: Song;
  theirs: Song;
  side: Side;
  onSide: (side: Side) => void;
}

function ClashChoice({ clash, mine, theirs, side, onSide }: ClashChoiceProps) {
  const phone = useLayout() === "phone";
  const what = fieldWords[clash.name];
  const text = (song: Song, lines: readonly string[] | undefined) =>
    lines ? lines.join("\n") || "(nothing)" : valueWords(clash.name, song);
  const pane = (label: string, words: string, on: boolean) => (
    <View
      style={{
        flexGrow: 1,
        flexShrink: 1,
        flexBasis: phone ? "auto" : 0,
        minWidth: 0,
        gap: 4,
        padding: 10,
        borderRadius: 10,
        borderWidth: on ? 2 : 1,
        borderColor: on ? colors.plum : colors.line,
      }}
    >
      <Text variant="tiny" tone="soft">
        {label}
      </Text>
      <div style={{ overflowX: "auto" }}>
        <Text variant={clash.lines ? "mono" : "body"} style={clash.lines ? { fontSize: 14, lineHeight: 20 } : null}>
          {words}
        </Text>
      </div>
    </View>
  );
  return (
    <View role="group" aria-label={what} style={{ gap: 8 }}>
      <Text variant="strong">{what}</Text>
      <View style={{ flexDirection: phone ? "column" : "row", gap: 8 }}>
        {pane("Here", text(mine, clash.lines?.mine), side !== "theirs")}
        {pane("Elsewhere", text(theirs, clash.lines?.theirs), side !== "mine")}
      </View>
      <Segmented<Side>
        label={`${what}: which to keep`}
        value={side}
        options={[
          { value: "mine", label: "Here" },
          { value: "theirs", label: "Elsewhere" },
          ...(clash.lines ? [{ value: "both" as const, label: "Both" }] : []),
        ]}
        onChange={onSide}
      />
    </View>
  );
}
