import { useRef, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Icon } from "@/features/ui/Icon";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { colors, sizes } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webProps } from "@/features/ui/webStyle";
import { OtherWays } from "../sing/OtherWays";

export interface ChooseRecordingProps {
  /** it is not known yet whether there is a take already */
  waiting: boolean;
  /** a recording that was not read to its end when the page was left or loaded again */
  unread: string | null;
  /** back to what was heard before; null where nothing was */
  onBack: (() => void) | null;
  onChoose: (file: File) => void;
}

const column = { flexGrow: 1, flexBasis: 0, maxWidth: 560 } as const;
const accepted = ".wav,.mp3,.m4a,.ogg,.oga,.opus,.webm,.flac,audio/*";

/** Which recordings can be read, and the button that chooses one; on a wide page it may be dropped. */
export function ChooseRecording({ waiting, unread, onBack, onChoose }: ChooseRecordingProps) {
  const input = useRef<HTMLInputElement>(null);
  const [over, setOver] = useState(false);
  const layout = useLayout();
  const phone = layout === "phone";
  const wide = layout === "wide";
  const drop = {
    onDragOver: (event: React.DragEvent) => {
      event.preventDefault();
      setOver(true);
    },
    onDragLeave: () => setOver(false),
    onDrop: (event: React.DragEvent) => {
      event.preventDefault();
      setOver(false);
      const file = event.dataTransfer.files[0];
      if (file) onChoose(file);
    },
  };
  const choose = (
    <Button
      icon="file"
      label="Choose a recording"
      busy={waiting}
      onPress={() => input.current?.click()}
      testID="upload-choose"
    />
  );
  return (
    <Screen
      title="Use a recording"
      crumb={{ label: "Voice", href: "/voice" }}
      footer={
        phone ? (
          <>
            {choose}
            <OtherWays kind="text" except="recording" />
          </>
        ) : undefined
      }
      wide
    >
      <View
        style={
          wide
            ? { flexDirection: "row", alignItems: "flex-start", gap: 48, paddingTop: 12 }
            : { gap: 28, paddingTop: 12, maxWidth: 560 }
        }
      >
        <View style={[{ gap: 20 }, wide ? column : null]}>
          {unread !== null && (
            <Notice kind="caution" title="Choose the recording again" testID="upload-unread">
              {`This page was left or loaded again before ${unread} was read to its end. Nothing was kept, and the file is as it was.`}
            </Notice>
          )}
          {onBack && (
            <Notice
              kind="good"
              title="What was heard is still here"
              action={
                <Button kind="text" small label="Back to what was heard" onPress={onBack} flush testID="upload-back" />
              }
            >
              It stays until another recording is read.
            </Notice>
          )}
          <Text variant="body" style={{ fontSize: 20, lineHeight: 28 }}>
            Choose a recording of one voice singing alone, and see which notes are yours.
          </Text>
          <View
            {...webProps(drop)}
            style={{
              ...(phone ? { gap: 8, padding: 20 } : { gap: 16, padding: 32, minHeight: 240, justifyContent: "center" }),
              borderRadius: sizes.radius,
              borderWidth: 1.5,
              borderStyle: "dashed",
              borderColor: over ? colors.plum : colors.inkSoft,
              backgroundColor: over ? "var(--soft)" : "transparent",
            }}
          >
            <View style={{ flexDirection: "row", gap: 10, alignItems: "center" }}>
              <Icon name="file" size={22} color={colors.plum} />
              <Text variant="strong">wav, mp3, m4a, ogg, webm or flac</Text>
            </View>
            <Text variant="small" tone="soft">
              Up to 20 MB and 10 minutes. 20 seconds are enough. You can also drop the file here.
            </Text>
            {!phone && <View style={{ alignSelf: "flex-start" }}>{choose}</View>}
          </View>
          <Text tone="soft">
            The recording is read on this device and not sent anywhere. Only numbers are kept, and only if you say so.
          </Text>
          <input
            ref={input}
            type="file"
            accept={accepted}
            aria-label="Recording"
            data-testid="upload-file"
            tabIndex={-1}
            style={{ position: "absolute", width: 1, height: 1, opacity: 0, pointerEvents: "none" }}
            onChange={(event) => {
              const file = event.target.files?.[0];
              // The same file may be chosen again.
              event.target.value = "";
              if (file) onChoose(file);
            }}
          />
        </View>
        {!phone && (
          <View style={wide ? column : null}>
            <OtherWays kind="list" except="recording" />
          </View>
        )}
      </View>
    </Screen>
  );
}
