import type { ReactNode } from "react";
import { ErrorState } from "./ErrorState";
import { Skeleton } from "./Skeleton";

/** What QueryState reads of a query; every `useQuery` result has it. */
export interface QueryLike<Data> {
  data: Data | undefined;
  isPending: boolean;
  error: Error | null;
  refetch: () => unknown;
}

export interface QueryStateProps<Data> {
  query: QueryLike<Data>;
  /** in the real layout; grey bars unless told otherwise */
  skeleton?: ReactNode;
  /** what could not be had, such as "Your songs" */
  title?: string;
  children: (data: Data) => ReactNode;
}

/** Loading, failed with a way out, or there. What was there before stays while a newer copy is fetched. */
export function QueryState<Data>({
  query,
  skeleton,
  title = "This could not be opened",
  children,
}: QueryStateProps<Data>) {
  if (query.data !== undefined) return <>{children(query.data)}</>;
  if (query.error) {
    return (
      <ErrorState
        title={title}
        text={`${query.error.message} Nothing of yours was lost.`}
        onRetry={() => void query.refetch()}
      />
    );
  }
  return <>{skeleton ?? <Skeleton />}</>;
}
