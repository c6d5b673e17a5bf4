import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Icon } from "@/features/ui/Icon";
import { LiveText } from "@/features/ui/LiveText";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import type { RecorderState } from "../recorder/recorder";

export interface ReadingRecordingProps {
  name: string;
  state: RecorderState;
  onCancel: () => void;
}

/** While a recording is read: how far each of the three steps is, and the way out. */
export function ReadingRecording({ name, state, onCancel }: ReadingRecordingProps) {
  const bytes = state.step === "reading" ? state.share : null;
  const listening = state.step === "judging";
  const heard = listening ? state.listened : 0;
  const all = listening ? lengthWords(state.seconds) : "";
  return (
    <Screen
      title="Reading the recording"
      {...(name === "" ? null : { subtitle: name })}
      crumb={{ label: "Voice", href: "/voice" }}
      footer={<Button kind="secondary" icon="close" label="Cancel" onPress={onCancel} testID="upload-cancel" />}
    >
      <View aria-busy testID="upload-progress" style={{ gap: 16, paddingTop: 20, maxWidth: 560 }}>
        <Step words="Reading the file" now={bytes !== null} done={bytes === null} share={bytes} />
        <Step words="Turning it into sound" now={!listening && bytes === null} done={listening} />
        <Step
          words={listening ? `Listening: ${lengthWords(heard * state.seconds)} of ${all}` : "Listening"}
          now={listening}
          done={false}
          share={listening ? heard : null}
        />
        <Text variant="small" tone="soft">
          {listening && state.seconds > 60
            ? "A long recording takes a little while. The page can be used meanwhile, and nothing is sent anywhere."
            : "Nothing is sent anywhere."}
        </Text>
        <LiveText hidden>{listening ? `Listening to ${all} of sound: ${quarterWords(heard)}` : ""}</LiveText>
      </View>
    </Screen>
  );
}

/** Said four times, not a hundred. */
function quarterWords(share: number): string {
  return `${25 * Math.floor(4 * share)} % done.`;
}

interface StepProps {
  words: string;
  done: boolean;
  now: boolean;
  /** how far it is, 0 to 1; null where that cannot be told */
  share?: number | null;
}

function Step({ words, done, now, share = null }: StepProps) {
  return (
    <View style={{ flexDirection: "row", gap: 12, alignItems: "flex-start" }}>
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
      <View style={{ flexGrow: 1, flexShrink: 1, gap: 8, paddingTop: 2 }}>
        <Text variant={now ? "strong" : "body"} tone={done || now ? "ink" : "soft"}>
          {done ? `${words}: done` : words}
        </Text>
        {now && share !== null && (
          <View
            role="progressbar"
            aria-label={words}
            aria-valuemin={0}
            aria-valuemax={100}
            aria-valuenow={Math.round(100 * share)}
            style={{ height: 8, borderRadius: 4, borderWidth: 1, borderColor: mixtures.rungC }}
          >
            <View
              style={{
                ...{ position: "absolute", top: -1, bottom: -1, left: -1, borderRadius: 4 },
                width: `${100 * share}%`,
                backgroundColor: colors.plum,
              }}
            />
          </View>
        )}
      </View>
    </View>
  );
}

function lengthWords(seconds: number): string {
  const whole = Math.round(seconds);
  if (whole < 60) return `${whole} s`;
  return `${Math.floor(whole / 60)} min ${whole % 60} s`;
}
