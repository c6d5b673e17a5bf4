import { infiniteQueryOptions, queryOptions } from "@tanstack/react-query";
import { http } from "@/features/api/httpClient";
import type { AdminUser, SecurityEvent, ServiceHealth } from "@/shared/contract/admin";

const pageSize = 50;
const lastId = (page: readonly { id: string }[]) => (page.length < pageSize ? undefined : page.at(-1)?.id);
const asked = (path: string, question: Record<string, string>) => {
  const words = new URLSearchParams(Object.entries(question).filter(([, value]) => value !== "")).toString();
  return words === "" ? path : `${path}?${words}`;
};

/** What administrators see, page by page. */
export const adminQueries = {
  users: (q: string) =>
    infiniteQueryOptions({
      queryKey: ["admin", "users", q],
      queryFn: ({ pageParam }) => http.get<AdminUser[]>(asked("/admin/users", { q, after: pageParam })),
      initialPageParam: "",
      getNextPageParam: lastId,
    }),
  events: (userId: string) =>
    infiniteQueryOptions({
      queryKey: ["admin", "events", userId],
      queryFn: ({ pageParam }) => http.get<SecurityEvent[]>(asked("/admin/audit", { userId, before: pageParam })),
      initialPageParam: "",
      getNextPageParam: lastId,
    }),
  health: () =>
    queryOptions({ queryKey: ["admin", "health"], queryFn: () => http.get<ServiceHealth>("/admin/health") }),
};
