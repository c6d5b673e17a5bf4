import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Switch } from "@/features/ui/Switch";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import { useCountInSetting } from "../listening/countInSetting";
import { OtherWays } from "./OtherWays";

export interface BeforeSingingProps {
  /** the browser is asking whether the page may listen */
  asking: boolean;
  onSing: (counted: boolean) => void;
}

/** What will happen, how to sing, and the button that starts it. */
export function BeforeSinging({ asking, onSing }: BeforeSingingProps) {
  const [counted, setCounted] = useCountInSetting();
  const wide = useLayout() === "wide";
  const asked = (
    <LiveText variant="small" tone="soft">
      {asking ? "Your browser asks whether this page may use the microphone. Choose to allow it." : ""}
    </LiveText>
  );
  return (
    <Screen
      title="Sing a few seconds"
      crumb={{ label: "Voice", href: "/voice" }}
      footer={
        <>
          <Button
            icon="mic"
            label={asking ? "Waiting for the microphone" : "Start singing"}
            busy={asking}
            onPress={() => onSing(counted)}
            testID="sing-start"
          />
          {!wide && <OtherWays kind="text" except="sing" />}
        </>
      }
      wide
    >
      <View
        style={
          wide
            ? { flexDirection: "row", alignItems: "flex-start", gap: 48, paddingTop: 12 }
            : { gap: 20, paddingTop: 12, maxWidth: 560 }
        }
      >
        <View style={[{ gap: 20 }, wide ? column : null]}>
          <Text variant="body" style={{ fontSize: 20, lineHeight: 28 }}>
            Sing any song you know for 5 to 20 seconds, without an instrument, and see which notes are yours.
          </Text>
          <Text tone="soft">The sound stays on this device. Only numbers are kept, and only if you say so.</Text>
          <Switch
            label="Count me in"
            hint="Four clicks, also to be seen, before the listening begins."
            on={counted}
            onChange={setCounted}
            testID="count-in"
          />
          {wide ? asked : null}
        </View>
        <View style={[{ gap: 28 }, wide ? column : null]}>
          <Cautions />
          {wide ? <OtherWays kind="list" except="sing" /> : asked}
        </View>
      </View>
    </Screen>
  );
}

const column = { flexGrow: 1, flexBasis: 0, maxWidth: 560 } as const;

/** How to sing without harm, and whose advice the four weeks are. */
function Cautions() {
  return (
    <Notice kind="caution" title="Sing at your ease">
      <Text variant="small">Stop if it hurts, tickles or turns hoarse.</Text>
      <Text variant="small" tone="soft">
        If you are hoarse for more than about four weeks, see a doctor: so says the 2018 guideline on hoarseness of the
        American Academy of Otolaryngology.
      </Text>
    </Notice>
  );
}
