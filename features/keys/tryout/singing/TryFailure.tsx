import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { Icon } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";

export interface TryFailureProps {
  words: { title: string; happened: string; safe: string; next: string };
  /** a backing may have stood in the recording */
  loudspeaker: boolean;
}

/** Nothing came out of the take: why, what is safe, and how to go on. */
export function TryFailure({ words, loudspeaker }: TryFailureProps) {
  return (
    <View role="alert" testID="try-failure" style={{ maxWidth: 560, marginBottom: 16 }}>
      <Card error style={{ gap: 10 }}>
        <View style={{ flexDirection: "row", gap: 10 }}>
          <Icon name="warning" size={24} color={colors.brick} />
          <Text variant="strong" style={{ flexShrink: 1 }}>
            {words.title}
          </Text>
        </View>
        <Text>{words.happened}</Text>
        <Text tone="soft">{words.safe}</Text>
        <Text>{words.next}</Text>
        {loudspeaker && <Text>The backing may have covered your voice: use headphones, or turn the backing off.</Text>}
      </Card>
    </View>
  );
}
