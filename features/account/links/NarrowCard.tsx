import type { ReactNode } from "react";
import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";

/** One short form or answer on a page: plain on the phone, on a card where there is room. */
export function NarrowCard({ text, children }: { text?: string; children: ReactNode }) {
  const phone = useLayout() === "phone";
  const inside = <View style={{ gap: 16 }}>{children}</View>;
  return (
    <View style={{ maxWidth: 480, width: "100%", gap: 20 }}>
      {text !== undefined && <Text variant="body">{text}</Text>}
      {phone ? inside : <Card style={{ padding: 24 }}>{inside}</Card>}
    </View>
  );
}
