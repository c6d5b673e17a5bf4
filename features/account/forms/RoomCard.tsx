import type { ReactNode } from "react";
import { Card } from "@/features/ui/Card";
import { useLayout } from "@/features/ui/useLayout";

const plain = { padding: 0, borderWidth: 0, borderRadius: 0, backgroundColor: "transparent" } as const;

/**
 * Plain on the phone, a card where there is room. The same piece in both, so that what was typed in it stays when a window
 * or a device is turned.
 */
export function RoomCard({ children }: { children: ReactNode }) {
  return <Card style={useLayout() === "phone" ? plain : { padding: 24 }}>{children}</Card>;
}
