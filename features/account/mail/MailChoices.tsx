import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { http } from "@/features/api/httpClient";
import { Card } from "@/features/ui/Card";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Switch } from "@/features/ui/Switch";
import { Text } from "@/features/ui/Text";
import type { MailPreferences, OptionalMail } from "@/shared/contract/mail";
import { accountQueries } from "../accountQueries";
import { mailWords } from "./mailWords";

/** Which mails one gets. Each switch counts at once, and goes back where it could not be kept. */
export function MailChoices() {
  const client = useQueryClient();
  const { queryKey } = accountQueries.mail();
  const query = useQuery(accountQueries.mail());
  const keep = useMutation({
    mutationFn: (wish: MailPreferences) => http.put<MailPreferences>("/mail/preferences", wish),
    onMutate: (wish) => {
      const before = client.getQueryData(queryKey);
      client.setQueryData(queryKey, wish);
      return before;
    },
    onError: (_error, _wish, before) => client.setQueryData(queryKey, before),
  });
  return (
    <QueryState query={query} title="Your choices could not be opened">
      {(wish) => (
        <Card style={{ gap: 16 }}>
          {(Object.keys(mailWords) as OptionalMail[]).map((kind) => (
            <Switch
              key={kind}
              {...mailWords[kind]}
              on={wish[kind]}
              onChange={(on) => keep.mutate({ ...wish, [kind]: on })}
              testID={`mail-${kind}`}
            />
          ))}
          {keep.error && (
            <Notice kind="error" title="This is not kept">
              {keep.error.message}
            </Notice>
          )}
          <Text variant="small" tone="soft">
            Mails about the safety of your account always come.
          </Text>
        </Card>
      )}
    </QueryState>
  );
}
