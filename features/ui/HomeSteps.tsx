import { View } from "react-native";
import { Heading } from "./Heading";
import { Text } from "./Text";
import { colors } from "./theme";

const steps = [
  {
    title: "Sing",
    text: "Any song you know, five seconds or more. You see which notes sit well, which are a reach, and how sure that is.",
  },
  {
    title: "Bring a song",
    text: "Paste its chords over the words, and sing its tune or say its ends. Songs to try are here from the start.",
  },
  {
    title: "Play it in your key",
    text: "All twelve keys, each with its reason, and the ways to reach yours: a capo, other tuning, other shapes.",
  },
];

/** What happens here, in three steps; for screens with room. */
export function HomeSteps() {
  return (
    <View role="list" style={{ flexDirection: "row", gap: 32, borderTopWidth: 1.5, borderColor: colors.ink }}>
      {steps.map((step, index) => (
        <View
          key={step.title}
          role="listitem"
          style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0, paddingTop: 14, gap: 4, maxWidth: 380 }}
        >
          <Heading level={2}>{`${index + 1}  ${step.title}`}</Heading>
          <Text variant="small" tone="soft">
            {step.text}
          </Text>
        </View>
      ))}
    </View>
  );
}
