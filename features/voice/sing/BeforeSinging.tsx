import { Pressable, View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webProps } from "@/features/ui/webStyle";
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
          <CountInSwitch on={counted} onChange={setCounted} />
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

function CountInSwitch({ on, onChange }: { on: boolean; onChange: (on: boolean) => void }) {
  return (
    <Pressable
      role="switch"
      aria-checked={on}
      onPress={() => onChange(!on)}
      testID="count-in"
      {...webProps({
        // The web renderer lets Space press buttons only.
        onKeyDown: (event: React.KeyboardEvent) => {
          if (event.key !== " ") return;
          event.preventDefault();
          onChange(!on);
        },
      })}
      style={{ flexDirection: "row", alignItems: "center", gap: 12, minHeight: 48 }}
    >
      <View
        style={{
          width: 46,
          height: 26,
          borderRadius: 13,
          borderWidth: 1.5,
          borderColor: on ? colors.plum : colors.inkSoft,
          backgroundColor: on ? colors.plum : "transparent",
          justifyContent: "center",
          alignItems: on ? "flex-end" : "flex-start",
          paddingHorizontal: 3,
        }}
      >
        <View
          style={{ width: 17, height: 17, borderRadius: 9, backgroundColor: on ? colors.onPlum : colors.inkSoft }}
        />
      </View>
      <View style={{ flexShrink: 1 }}>
        <Text variant="label">Count me in</Text>
        <Text variant="small" tone="soft">
          Four clicks, also to be seen, before the listening begins.
        </Text>
      </View>
    </Pressable>
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
