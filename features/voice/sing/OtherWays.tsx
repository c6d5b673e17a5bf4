import { View } from "react-native";
import { LinkButton } from "@/features/ui/LinkButton";

export interface OtherWaysProps {
  kind: "text" | "secondary";
  /** where a recording is being used already, that way is not another one */
  recording?: boolean;
}

/** The ways to one's notes that need no microphone. */
export function OtherWays({ kind, recording = true }: OtherWaysProps) {
  return (
    <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
      {recording && (
        <LinkButton
          kind={kind}
          icon="file"
          label="Use a recording"
          href="/voice/upload"
          testID="sing-upload"
          style={{ flexGrow: 1 }}
        />
      )}
      <LinkButton
        kind={kind}
        label="Set notes by hand"
        href="/voice/by-hand"
        testID="sing-by-hand"
        style={{ flexGrow: 1 }}
      />
    </View>
  );
}
