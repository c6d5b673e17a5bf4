import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { belongingsInWords } from "../belongingsInWords";
import { belongingsQueries } from "../belongingsQueries";

/** Says what will move from this device into the account; nothing where there is nothing. */
export function MovesIn() {
  const { data } = useQuery(belongingsQueries.counts());
  const words = data && belongingsInWords(data);
  if (!words) return null;
  return (
    <View testID="moves-in">
      <Text variant="small">
        What you did here moves into your account: {words}.
        {data.takes > 0 ? " The sound of a take stays on this device." : ""}
      </Text>
    </View>
  );
}
