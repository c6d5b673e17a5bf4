import { useRef } from "react";
import { newId } from "./newId";

interface SentId {
  /** the id under which this is sent */
  idFor: (sent: object) => string;
  /** the answer is here: the same once more would be something new */
  answered: () => void;
}

/**
 * Ids for what must not be there twice when an answer is lost: the same id while the same is tried again, another one
 * for anything else.
 */
export function useSentId(): SentId {
  const last = useRef<{ written: string; id: string } | null>(null);
  return {
    idFor: (sent) => {
      const written = JSON.stringify(sent);
      if (last.current?.written !== written) last.current = { written, id: newId() };
      return last.current.id;
    },
    answered: () => {
      last.current = null;
    },
  };
}
