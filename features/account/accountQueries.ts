import { queryOptions } from "@tanstack/react-query";
import { http } from "@/features/api/httpClient";
import type { OpenSession, SecondFactor } from "@/shared/contract/account";
import type { MailPreferences } from "@/shared/contract/mail";

/** What the server tells about the account of whoever is signed in. */
export const accountQueries = {
  sessions: () =>
    queryOptions({ queryKey: ["account", "sessions"], queryFn: () => http.get<OpenSession[]>("/account/sessions") }),
  secondFactor: () =>
    queryOptions({
      queryKey: ["account", "second-factor"],
      queryFn: () => http.get<SecondFactor>("/account/second-factor"),
    }),
  mail: () =>
    queryOptions({ queryKey: ["account", "mail"], queryFn: () => http.get<MailPreferences>("/mail/preferences") }),
};
