import type { ReactNode } from "react";
import { View } from "react-native";
import { Card } from "./Card";
import { Heading } from "./Heading";
import { Text } from "./Text";

export interface EmptyStateProps {
  title: string;
  /** what this will be */
  text: string;
  /** the one next step: a Button or LinkButton */
  action?: ReactNode;
  testID?: string;
}

export function EmptyState({ title, text, action, testID }: EmptyStateProps) {
  return (
    <Card {...(testID === undefined ? null : { testID })} style={{ gap: 10, maxWidth: 480, width: "100%" }}>
      <Heading level={2}>{title}</Heading>
      <Text variant="body">{text}</Text>
      {action !== undefined && <View style={{ marginTop: 8 }}>{action}</View>}
    </Card>
  );
}
