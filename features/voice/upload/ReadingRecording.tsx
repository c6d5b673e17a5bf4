import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Icon } from "@/features/ui/Icon";
import { LiveText } from "@/features/ui/LiveText";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { RecorderState } from "../recorder/recorder";

export interface ReadingRecordingProps {
  name: string;
  state: RecorderState;
  onCancel: () => void;
}

/** While a recording is read: which of the two steps it is at, and the way out. */
export function ReadingRecording({ name, state, onCancel }: ReadingRecordingProps) {
  const listening = state.step === "judging";
  return (
    <Screen
      title="Reading the recording"
      {...(name === "" ? null : { subtitle: name })}
      crumb={{ label: "Voice", href: "/voice" }}
      footer={<Button kind="secondary" icon="close" label="Cancel" onPress={onCancel} testID="upload-cancel" />}
    >
      <View aria-busy testID="upload-progress" style={{ gap: 16, paddingTop: 20, maxWidth: 560 }}>
        <Step words="Turning the file into sound" done={listening} now={!listening} />
        <Step
          words={listening ? `Listening to ${lengthWords(state.seconds)} of sound` : "Listening to it"}
          done={false}
          now={listening}
        />
        <LiveText variant="small" tone="soft">
          {listening && state.seconds > 60
            ? "A long recording takes a little while. The page can be used meanwhile, and nothing is sent anywhere."
            : "Nothing is sent anywhere."}
        </LiveText>
      </View>
    </Screen>
  );
}

function Step({ words, done, now }: { words: string; done: boolean; now: boolean }) {
  return (
    <View style={{ flexDirection: "row", gap: 12, alignItems: "center" }}>
      <View
        style={{
          width: 28,
          height: 28,
          borderRadius: 14,
          borderWidth: 1.75,
          borderColor: done || now ? colors.plum : colors.inkSoft,
          alignItems: "center",
          justifyContent: "center",
        }}
      >
        {done && <Icon name="check" size={18} color={colors.plum} />}
        {now && <View style={{ width: 10, height: 10, borderRadius: 5, backgroundColor: colors.plum }} />}
      </View>
      <Text variant={now ? "strong" : "body"} tone={done || now ? "ink" : "soft"}>
        {done ? `${words}: done` : words}
      </Text>
    </View>
  );
}

function lengthWords(seconds: number): string {
  const whole = Math.max(1, Math.round(seconds));
  if (whole < 60) return `${whole} s`;
  return `${Math.floor(whole / 60)} min ${whole % 60} s`;
}
