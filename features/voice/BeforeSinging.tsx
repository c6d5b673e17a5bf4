import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";

export interface BeforeSingingProps {
  /** the browser is asking whether the page may listen */
  asking: boolean;
  onSing: () => void;
}

/** What will happen, how to sing, and the button that starts it. */
export function BeforeSinging({ asking, onSing }: BeforeSingingProps) {
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
            onPress={onSing}
            testID="sing-start"
          />
          <LinkButton kind="text" label="Set notes by hand" href="/voice/by-hand" testID="sing-by-hand" />
        </>
      }
    >
      <View style={{ gap: 20, paddingTop: 12, maxWidth: 560 }}>
        <Text variant="body" style={{ fontSize: 20, lineHeight: 28 }}>
          Sing any song you know for 5 to 20 seconds, without an instrument, and see which notes are yours.
        </Text>
        <Text tone="soft">The sound stays on this device. Only numbers are kept, and only if you say so.</Text>
        <Cautions />
        <LiveText variant="small" tone="soft">
          {asking ? "Your browser asks whether this page may use the microphone. Choose to allow it." : ""}
        </LiveText>
      </View>
    </Screen>
  );
}

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
