import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { countInBeats } from "../recorder/countIn";

export interface CountInScreenProps {
  /** beats still to come, this one with them */
  left: number;
  onCancel: () => void;
}

/** The count before a take, for eyes as for ears: a number and a row of beats. */
export function CountInScreen({ left, onCancel }: CountInScreenProps) {
  const phone = useLayout() === "phone";
  const cancel = <Button kind="secondary" icon="close" label="Not yet" onPress={onCancel} testID="count-cancel" />;
  return (
    <Screen
      title="Get ready"
      subtitle="Listening begins after the count"
      back="/voice"
      closes
      hideBar
      wide
      footer={phone ? cancel : undefined}
    >
      <View
        style={{ flexGrow: 1, minHeight: phone ? 320 : 560, alignItems: "center", justifyContent: "center", gap: 28 }}
      >
        <Text
          variant="number"
          aria-hidden
          testID="count-left"
          style={
            phone
              ? { fontSize: 120, lineHeight: 128, letterSpacing: -2 }
              : { fontSize: 176, lineHeight: 184, letterSpacing: -3 }
          }
        >
          {String(left)}
        </Text>
        <View aria-hidden style={{ flexDirection: "row", gap: 14 }}>
          {Array.from({ length: countInBeats }, (_, beat) => (
            <View
              key={beat}
              style={{
                width: 18,
                height: 18,
                borderRadius: 9,
                borderWidth: 2,
                borderColor: colors.plum,
                backgroundColor: beat <= countInBeats - left ? colors.plum : "transparent",
              }}
            />
          ))}
        </View>
        <Text tone="soft">Breathe in, and sing on the beat after one.</Text>
        {!phone && cancel}
        <LiveText hidden urgent>
          {String(left)}
        </LiveText>
      </View>
    </Screen>
  );
}
