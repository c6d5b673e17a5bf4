import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Icon } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { Failure } from "../recorder/recorder";
import { failureWords } from "../sing/failureWords";

/** Nothing came out of the line: why, and how to go on. What stood on the page before stands there still. */
export function LineFailure({ failure, onAgain }: { failure: Failure; onAgain: () => void }) {
  const words = failureWords(failure);
  return (
    <View role="alert" testID={`line-failure-${failure.kind}`}>
      <Card error style={{ gap: 10 }}>
        <View style={{ flexDirection: "row", gap: 10 }}>
          <Icon name="warning" size={24} color={colors.brick} />
          <Text variant="strong" style={{ flexShrink: 1 }}>
            {words.title}
          </Text>
        </View>
        <Text>{words.happened}</Text>
        <Text tone="soft">Nothing on this page has changed, and the other ways work without a microphone.</Text>
        <Text>{words.next}</Text>
        <Button kind="secondary" small icon="again" label="Try again" onPress={onAgain} testID="sing-again" />
      </Card>
    </View>
  );
}
