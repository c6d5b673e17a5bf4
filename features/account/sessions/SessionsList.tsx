import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { session } from "@/features/api/session";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { OpenSession } from "@/shared/contract/account";
import { accountQueries } from "../accountQueries";
import { momentInWords } from "../momentInWords";

/** Which sessions to end: one, all but this one, or all. */
type Ending = OpenSession | "others" | "all";

const pathOf = (ending: Ending) =>
  ending === "all"
    ? "/account/sessions"
    : ending === "others"
      ? "/account/sessions?keepThis=true"
      : `/account/sessions/${ending.id}`;

/** Where one is signed in, and the way out of each place. */
export function SessionsList() {
  const client = useQueryClient();
  const query = useQuery(accountQueries.sessions());
  const end = useMutation({
    mutationFn: async (ending: Ending) => {
      await http.delete(pathOf(ending));
      if (ending === "all" || (ending !== "others" && ending.current)) session.leave();
      else await client.invalidateQueries({ queryKey: accountQueries.sessions().queryKey });
    },
  });
  return (
    <QueryState query={query} title="Your sessions could not be listed">
      {(sessions) => (
        <>
          <Card style={{ paddingVertical: 4 }}>
            <View role="list" testID="sessions">
              {sessions.map((each, k) => (
                <View
                  key={each.id}
                  role="listitem"
                  style={{
                    flexDirection: "row",
                    flexWrap: "wrap",
                    alignItems: "center",
                    justifyContent: "space-between",
                    columnGap: 12,
                    paddingVertical: 12,
                    borderTopWidth: k === 0 ? 0 : 1,
                    borderColor: colors.line,
                  }}
                >
                  <View style={{ flexShrink: 1 }}>
                    <Text variant="strong">{each.current ? `${each.device}, this one` : each.device}</Text>
                    <Text variant="small" tone="soft">
                      {`Last used ${momentInWords(each.lastUsedAt)}, begun ${momentInWords(each.begunAt)}`}
                    </Text>
                  </View>
                  <Button
                    kind="text"
                    small
                    label="Sign out"
                    accessibleName={`Sign out of ${each.device}${each.current ? ", this one" : ""}`}
                    busy={end.isPending && end.variables === each}
                    onPress={() => end.mutate(each)}
                    testID={each.current ? "end-this" : "end-session"}
                  />
                </View>
              ))}
            </View>
          </Card>
          {end.error && (
            <Notice kind="error" title="You are still signed in there">
              {end.error.message}
            </Notice>
          )}
          <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12 }}>
            {sessions.length > 1 && (
              <Button
                kind="secondary"
                small
                label="Sign out of all others"
                busy={end.isPending && end.variables === "others"}
                onPress={() => end.mutate("others")}
                testID="end-others"
              />
            )}
            <Button
              kind="secondary"
              small
              label="Sign out everywhere"
              busy={end.isPending && end.variables === "all"}
              onPress={() => end.mutate("all")}
              testID="end-all"
            />
          </View>
        </>
      )}
    </QueryState>
  );
}
