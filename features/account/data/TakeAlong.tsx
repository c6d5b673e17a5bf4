import { useMutation } from "@tanstack/react-query";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { saveFile } from "@/features/api/saveFile";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";

/** Everything of the account as one file. */
export function TakeAlong() {
  const take = useMutation({
    mutationFn: async () => {
      const blob = await http.download("/account/export");
      saveFile({ name: `larkspan-${new Date().toISOString().slice(0, 10)}.zip`, blob });
    },
  });
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>Take everything along</Heading>
      <Text variant="small" tone="soft">
        One zip file with all that is in your account: as JSON for programs, the charts as text for reading, what you
        handed in as sound.
      </Text>
      {take.error && (
        <Notice kind="error" title="The file could not be made">
          {take.error.message}
        </Notice>
      )}
      {take.isSuccess && <Notice kind="good">The file is with your browser’s downloads.</Notice>}
      <View style={{ alignSelf: "flex-start" }}>
        <Button
          kind="secondary"
          small
          icon="file"
          label={take.isPending ? "Packing" : "Take everything along"}
          busy={take.isPending}
          onPress={() => take.mutate()}
          testID="export"
        />
      </View>
    </Card>
  );
}
