import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Icon, type IconName } from "@/features/ui/Icon";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import type { FailureWords } from "./failureWords";
import { OtherWays, type OtherWaysProps } from "./OtherWays";

export interface RefusalPageProps {
  words: FailureWords;
  again: { icon: IconName; label: string; onPress: () => void; testID: string };
  /** what was there before and is still there */
  back?: { label: string; onPress: () => void } | null;
  /** the way that was tried */
  except: OtherWaysProps["except"];
  testID: string;
}

/**
 * No notes came out: why, what is safe, what to do, and the other ways on. On a phone the next try is under the thumb;
 * where there is room it stands with its reason, and the other ways beside them.
 */
export function RefusalPage({ words, again, back = null, except, testID }: RefusalPageProps) {
  const layout = useLayout();
  const phone = layout === "phone";
  const wide = layout === "wide";
  const buttons = (
    <View style={phone ? { gap: 10 } : { flexDirection: "row", flexWrap: "wrap", gap: 10, marginTop: 6 }}>
      <Button {...again} />
      {back && <Button kind="secondary" {...back} testID="refusal-back" />}
    </View>
  );
  const column = wide ? { flexGrow: 1, flexBasis: 0, maxWidth: 560 } : { maxWidth: 560 };
  return (
    <Screen title={words.title} crumb={{ label: "Voice", href: "/voice" }} wide footer={phone ? buttons : undefined}>
      <View
        style={{
          flexDirection: wide ? "row" : "column",
          alignItems: wide ? "flex-start" : "stretch",
          gap: wide ? 48 : 28,
          paddingTop: 12,
        }}
      >
        <View role="alert" testID={testID} style={column}>
          <Card error style={phone ? { gap: 12 } : { gap: 14, padding: 24 }}>
            <View style={{ flexDirection: "row", gap: 10 }}>
              <Icon name="warning" size={24} color={colors.brick} />
              <Text variant="strong" style={{ flexShrink: 1 }}>
                {words.happened}
              </Text>
            </View>
            <Text tone="soft">{words.safe}</Text>
            <Text>{words.next}</Text>
            {!phone && buttons}
          </Card>
        </View>
        <View style={column}>
          <OtherWays kind="list" except={except} />
        </View>
      </View>
    </Screen>
  );
}
