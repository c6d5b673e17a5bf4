import { queryOptions } from "@tanstack/react-query";
import { countBelongings } from "@/features/api/belongings";

export const belongingsQueries = {
  /** what this device keeps, whoever is signed in; other screens add to it, so it is counted anew each time */
  counts: () => queryOptions({ queryKey: ["device", "belongings"], queryFn: countBelongings, staleTime: 0 }),
};
