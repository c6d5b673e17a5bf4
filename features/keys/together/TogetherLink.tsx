import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { whyPath } from "@/features/ui/whyPath";
import type { KeyRow } from "../keyRows";

export interface TogetherLinkProps {
  songId: string;
  /** whether the song has chords to explain and to play */
  chords: boolean;
  /** the key in view */
  selected: KeyRow | null;
  /** its id */
  instrument: string;
}

/** The ways on from the keys for one voice: one key for several, everybody's plan, and why the song may move at all. */
export function TogetherLink({ songId, chords, selected, instrument }: TogetherLinkProps) {
  const params = selected ? { key: selected.key.tonic, shift: String(selected.shift) } : {};
  return (
    <View style={{ marginTop: 16, gap: 10 }} testID="keys-further">
      {chords && selected && (
        <Text variant="small" tone="soft">
          {"Why is it the same song in another key? "}
          <TextLink
            href={whyPath(songId, selected.key, selected.shift, { instrument, way: null })}
            testID="to-why"
          >{`Why ${selected.sign}, step by step`}</TextLink>
        </Text>
      )}
      <Text variant="small" tone="soft">
        {"Singing it with others? "}
        <TextLink href={{ pathname: "/songs/[id]/together", params: { id: songId } }} testID="to-together">
          Find one key for all
        </TextLink>
      </Text>
      {chords && (
        <Text variant="small" tone="soft">
          {"Playing it with others? "}
          <TextLink href={{ pathname: "/songs/[id]/everyone", params: { id: songId, ...params } }} testID="to-everyone">
            A plan for every instrument
          </TextLink>
        </Text>
      )}
    </View>
  );
}
