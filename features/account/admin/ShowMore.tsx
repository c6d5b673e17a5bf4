import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Text } from "@/features/ui/Text";

interface ShowMoreProps {
  /** what it reads of an infinite query */
  query: { hasNextPage: boolean; isFetchingNextPage: boolean; error: Error | null; fetchNextPage: () => unknown };
}

/** The next page of a list; nothing at its end. */
export function ShowMore({ query }: ShowMoreProps) {
  if (!query.hasNextPage) return null;
  return (
    <View style={{ alignSelf: "flex-start", gap: 8 }}>
      {query.error && (
        <Text variant="small" tone="brick">
          {query.error.message}
        </Text>
      )}
      <Button
        kind="secondary"
        small
        label="Show more"
        busy={query.isFetchingNextPage}
        onPress={() => void query.fetchNextPage()}
        testID="show-more"
      />
    </View>
  );
}
