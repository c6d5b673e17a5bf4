import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Icon } from "@/features/ui/Icon";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { failureWords } from "./failureWords";
import { OtherWays } from "./OtherWays";
import type { Failure } from "../recorder/recorder";

export interface TakeFailureProps {
  failure: Failure;
  onAgain: () => void;
}

/** No range came out: why, what is safe, and the two ways on. */
export function TakeFailure({ failure, onAgain }: TakeFailureProps) {
  const words = failureWords(failure);
  const file = failure.stoppedBy === "file";
  return (
    <Screen
      title={words.title}
      crumb={{ label: "Voice", href: "/voice" }}
      footer={
        <>
          {file ? (
            <Button icon="file" label="Choose another recording" onPress={onAgain} testID="sing-again" />
          ) : (
            <Button icon="again" label="Try again" onPress={onAgain} testID="sing-again" />
          )}
          <OtherWays kind="secondary" recording={!file} />
        </>
      }
    >
      <View role="alert" testID={`take-failure-${failure.kind}`} style={{ paddingTop: 12, maxWidth: 560 }}>
        <Card error style={{ gap: 12 }}>
          <View style={{ flexDirection: "row", gap: 10 }}>
            <Icon name="warning" size={24} color={colors.brick} />
            <Text variant="strong" style={{ flexShrink: 1 }}>
              {words.happened}
            </Text>
          </View>
          <Text tone="soft">{words.safe}</Text>
          <Text>{words.next}</Text>
        </Card>
      </View>
    </Screen>
  );
}
