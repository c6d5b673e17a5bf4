import { useInfiniteQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import { momentInWords } from "../momentInWords";
import { adminQueries } from "./adminQueries";
import { Records } from "./Records";
import { ShowMore } from "./ShowMore";

function sentence(what: string): string {
  const words = what.replaceAll("-", " ").replace(/\bemail\b/, "e-mail");
  return `${words.charAt(0).toUpperCase()}${words.slice(1)}`;
}

/** What touched the safety of accounts, newest first. Addresses are hashed: equal signs are one address. */
export function EventsPage() {
  const query = useInfiniteQuery(adminQueries.events(""));
  return (
    <View style={{ gap: 16 }}>
      <Text variant="small" tone="soft">
        Addresses of the network are not kept; equal signs stand for one address.
      </Text>
      <QueryState query={query} title="The events could not be listed">
        {({ pages }) => (
          <>
            {pages.flat().length === 0 && <Text variant="body">Nothing has happened yet.</Text>}
            <Records
              caption="Security events, newest first"
              columns={["When", "What", "Account", "By", "Address"]}
              rows={pages.flat()}
              keyOf={({ id }) => id}
              cellsOf={({ at, what, userId, byUserId, addressHash }) => [
                momentInWords(at),
                sentence(what),
                userId?.slice(0, 8) ?? "none",
                byUserId?.slice(0, 8) ?? "the person",
                addressHash?.slice(0, 8) ?? "none",
              ]}
            />
            <ShowMore query={query} />
          </>
        )}
      </QueryState>
    </View>
  );
}
