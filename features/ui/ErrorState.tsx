import { View } from "react-native";
import { Button } from "./Button";
import { Card } from "./Card";
import { Heading } from "./Heading";
import { Icon } from "./Icon";
import { Text } from "./Text";
import { colors } from "./theme";

export interface ErrorStateProps {
  title: string;
  /** what happened, what is safe, what to do */
  text: string;
  onRetry?: (() => void) | undefined;
  retryLabel?: string;
  testID?: string;
}

export function ErrorState({ title, text, onRetry, retryLabel = "Try again", testID }: ErrorStateProps) {
  return (
    <View role="alert">
      <Card error {...(testID === undefined ? null : { testID })} style={{ gap: 10, maxWidth: 480, width: "100%" }}>
        <View style={{ flexDirection: "row", gap: 8, alignItems: "center" }}>
          <Icon name="warning" size={20} color={colors.brick} />
          <Heading level={2} style={{ color: colors.brick, flexShrink: 1 }}>
            {title}
          </Heading>
        </View>
        <Text variant="body">{text}</Text>
        {onRetry && (
          <Button kind="secondary" small icon="again" label={retryLabel} onPress={onRetry} style={{ marginTop: 8 }} />
        )}
      </Card>
    </View>
  );
}
