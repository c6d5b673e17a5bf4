import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { exportFormats } from "./exportSongs";
import { useExport } from "./useExport";

/** The formats songs can be saved in, and how far the saving is. `ids` are asked for when a format is chosen. */
export function ExportChoices({
  count,
  ids,
}: {
  count: number;
  ids: () => Promise<readonly string[]> | readonly string[];
}) {
  const { state, start, cancel } = useExport();
  const working = state.status === "working";
  return (
    <View style={{ gap: 12 }}>
      {exportFormats.map(({ value, label, hint }) => (
        <View key={value} style={{ flexDirection: "row", alignItems: "center", gap: 12, flexWrap: "wrap" }}>
          <Button
            kind="secondary"
            small
            icon="file"
            label={label}
            disabled={working || count === 0}
            onPress={() => void Promise.resolve(ids()).then((all) => start(all, value))}
            testID={`export-${value}`}
            style={{ minWidth: 160 }}
          />
          <Text variant="small" tone="soft" style={{ flexShrink: 1, flexBasis: 160, flexGrow: 1 }}>
            {hint}
          </Text>
        </View>
      ))}
      {state.status === "failed" ? (
        <Notice kind="error" title="The file was not made">{`${state.words} Your songs are as they were.`}</Notice>
      ) : (
        <LiveText variant="small" tone="soft" testID="export-state">
          {working
            ? state.total > 1
              ? `${state.done} of ${state.total} songs.`
              : "Making the file."
            : state.status === "done"
              ? `Saved as ${state.words}.`
              : ""}
        </LiveText>
      )}
      {working && state.total > 1 && <Button kind="text" small label="Cancel" onPress={cancel} />}
    </View>
  );
}
