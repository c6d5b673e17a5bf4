import { View } from "react-native";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";

/** When to stop, in plain sight before anything sounds and, where there is room, all the way. */
export function StopSigns() {
  return (
    <Notice kind="caution" title="Stop at once if" testID="guided-cautions">
      <View role="list" style={{ gap: 2 }}>
        {stopSigns.map((sign) => (
          <View key={sign} role="listitem" style={{ flexDirection: "row", gap: 8 }}>
            <Text variant="small" aria-hidden>
              •
            </Text>
            <Text variant="small" style={{ flexShrink: 1 }}>
              {sign}
            </Text>
          </View>
        ))}
      </View>
      <Text variant="small">Do not repeat an extreme note. Warm up first, and never push.</Text>
      <Text variant="small" tone="soft">
        If you are hoarse for more than about four weeks, see a doctor: so says the 2018 guideline on hoarseness of the
        American Academy of Otolaryngology (AAO-HNS). Larkspan helps to practise; it does not replace a teacher or a
        doctor.
      </Text>
    </Notice>
  );
}

const stopSigns = [
  "it hurts or burns",
  "your throat tickles and you have to cough",
  "your top notes are gone",
  "your voice turns hoarse",
];
