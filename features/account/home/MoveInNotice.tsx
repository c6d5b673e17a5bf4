import { useSyncExternalStore } from "react";
import { View } from "react-native";
import { moveIn } from "@/features/api/moveIn";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";

/** How the move from this device into the account went, where the person has to know. */
export function MoveInNotice() {
  const { status, moved, total, stayed } = useSyncExternalStore(moveIn.subscribe, moveIn.state, moveIn.state);
  const again = (
    <Button
      kind="secondary"
      small
      icon="again"
      label="Move the rest now"
      onPress={() => void moveIn.resume()}
      testID="move-again"
    />
  );
  if (status === "moving")
    return (
      <Notice kind="good" testID="move-in">
        {`Moving what you did on this device into your account: ${moved} of ${total}.`}
      </Notice>
    );
  if (status === "stopped")
    return (
      <Notice kind="offline" title="The move was interrupted" action={again} testID="move-in">
        {`${moved} of ${total} are in your account; the rest is safe on this device and follows when you are connected.`}
      </Notice>
    );
  if (stayed.length > 0)
    return (
      <Notice kind="caution" title="Not everything could move" action={again} testID="move-in">
        <Text variant="small">This is still on the device, unchanged:</Text>
        <View role="list" style={{ gap: 2 }}>
          {stayed.map((item) => (
            <View key={item.id} role="listitem">
              <Text variant="small">
                {item.title.trim() || "Without a title"}: {item.reason}
              </Text>
            </View>
          ))}
        </View>
      </Notice>
    );
  if (moved > 0)
    return (
      <Notice kind="good" testID="move-in">
        {moved === 1
          ? "1 thing moved from this device into your account."
          : `${moved} things moved from this device into your account.`}
      </Notice>
    );
  return null;
}
