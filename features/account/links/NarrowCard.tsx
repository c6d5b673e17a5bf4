import type { ReactNode } from "react";
import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { RoomCard } from "../forms/RoomCard";

/** One short form or answer on a page: plain on the phone, on a card where there is room. */
export function NarrowCard({ text, children }: { text?: string; children: ReactNode }) {
  return (
    <View style={{ maxWidth: 480, width: "100%", gap: 20 }}>
      {text !== undefined && <Text variant="body">{text}</Text>}
      <RoomCard>
        <View style={{ gap: 16 }}>{children}</View>
      </RoomCard>
    </View>
  );
}
