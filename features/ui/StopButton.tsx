import { useEffect, useRef } from "react";
import { Pressable, type View } from "react-native";
import { Icon } from "./Icon";
import { Text } from "./Text";
import { colors, sizes } from "./theme";

export interface StopButtonProps {
  stopping: boolean;
  onStop: () => void;
  /** fully round ends, as in the columns of a wide page */
  round?: boolean;
}

/** Ends what is being sung. It has the focus while one sings, so that Space or Enter stops. */
export function StopButton({ stopping, onStop, round = false }: StopButtonProps) {
  const button = useRef<View>(null);
  useEffect(() => button.current?.focus(), []);
  return (
    <Pressable
      ref={button}
      role="button"
      onPress={onStop}
      disabled={stopping}
      testID="sing-stop"
      style={{
        height: 64,
        borderRadius: round ? 999 : sizes.radius,
        backgroundColor: colors.plum,
        flexDirection: "row",
        alignItems: "center",
        justifyContent: "center",
        gap: 10,
      }}
    >
      <Icon name="stop" size={26} color={colors.onPlum} />
      <Text variant="strong" tone="onPlum" style={{ fontSize: 20, lineHeight: 24 }}>
        {stopping ? "Stopping" : "Stop"}
      </Text>
    </Pressable>
  );
}
