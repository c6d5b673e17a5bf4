import { Pressable, View } from "react-native";
import { Icon } from "@/features/ui/Icon";
import { IconButton } from "@/features/ui/IconButton";
import { LiveText } from "@/features/ui/LiveText";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { webStyle } from "@/features/ui/webStyle";
import { BeatDots } from "./BeatDots";

export interface StageBarProps {
  /** quarter notes a minute */
  pace: number;
  beats: number;
  beat: number | null;
  running: boolean;
  onPace: (change: number) => void;
  onTap: () => void;
  onToggle: () => void;
  /** what goes on, for those who do not see it */
  said: string;
}

/** The foot of the stage: how fast the words pass, the beat, and start or pause. */
export function StageBar({ pace, beats, beat, running, onPace, onTap, onToggle, said }: StageBarProps) {
  return (
    <View
      role="region"
      aria-label="Pace"
      style={[
        {
          flexDirection: "row",
          alignItems: "center",
          gap: 6,
          minHeight: 92,
          paddingHorizontal: 16,
          backgroundColor: colors.card,
          borderTopWidth: 1,
          borderColor: colors.line,
        },
        webStyle({ paddingBottom: "env(safe-area-inset-bottom)" }),
      ]}
    >
      <LiveText hidden>{said}</LiveText>
      <IconButton icon="minus" label="Slower" onPress={() => onPace(-2)} testID="slower" />
      <Pressable
        role="button"
        onPress={onTap}
        testID="tap-pace"
        style={{ minWidth: 72, minHeight: 56, alignItems: "center", justifyContent: "center" }}
      >
        <Text variant="title" style={{ lineHeight: 22 }} testID="pace">
          {String(pace)}
        </Text>
        <Text variant="tiny" tone="soft">
          scroll pace
        </Text>
        <Text style={webStyle(unseen)}>, tap the beat to set it</Text>
      </Pressable>
      <IconButton icon="plus" label="Faster" onPress={() => onPace(2)} testID="faster" />
      <View style={{ flexGrow: 1, flexShrink: 1, alignItems: "flex-end", paddingRight: 8 }}>
        <BeatDots beats={beats} now={beat} />
      </View>
      <Pressable
        role="button"
        onPress={onToggle}
        testID="stage-toggle"
        aria-label={running ? "Pause" : "Start"}
        style={{
          width: 64,
          height: 64,
          borderRadius: 32,
          backgroundColor: colors.plum,
          alignItems: "center",
          justifyContent: "center",
          flexShrink: 0,
        }}
      >
        <Icon name={running ? "pause" : "play"} size={28} color={colors.onPlum} />
      </Pressable>
    </View>
  );
}
