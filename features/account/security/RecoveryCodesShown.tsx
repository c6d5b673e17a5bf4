import { useState } from "react";
import { View } from "react-native";
import { saveFile } from "@/features/api/saveFile";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";

/** The recovery codes, this once. */
export function RecoveryCodesShown({ codes, onKept }: { codes: readonly string[]; onKept: () => void }) {
  const [said, setSaid] = useState("");
  const text = `${codes.join("\n")}\n`;
  async function copy() {
    try {
      await navigator.clipboard.writeText(text);
      setSaid("Copied.");
    } catch {
      setSaid("The browser does not let this page copy. Save them, or write them down.");
    }
  }
  return (
    <View style={{ gap: 16 }}>
      <Notice kind="caution" title="Keep these recovery codes">
        They are shown this once. Each stands in for the app one time, when your phone is lost or broken.
      </Notice>
      <View
        role="list"
        testID="recovery-codes"
        style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 24, rowGap: 6 }}
      >
        {codes.map((code) => (
          <View key={code} role="listitem">
            <Text variant="mono">{code}</Text>
          </View>
        ))}
      </View>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
        <Button kind="secondary" small label="Copy" onPress={() => void copy()} testID="copy-codes" />
        <Button
          kind="secondary"
          small
          label="Save as a file"
          onPress={() =>
            saveFile({ name: "larkspan-recovery-codes.txt", blob: new Blob([text], { type: "text/plain" }) })
          }
          testID="save-codes"
        />
        <Button small label="I have kept them" onPress={onKept} testID="codes-kept" />
      </View>
      <LiveText variant="small">{said}</LiveText>
    </View>
  );
}
