import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import type { PersonFacts, PersonFactsChange } from "@/shared/contract/account";
import { ApiError } from "../apiError";
import { http } from "../httpClient";
import { personQuery } from "./personFacts";
import { stopSharingWords } from "./stopSharingWords";

export interface KeptPerson {
  /** the facts are kept, and sharing has ended by it */
  onEnded: () => void;
  /** nothing was kept: the form shows again what stood there before */
  onStay: () => void;
}

/** Keeps year of birth and country. Where sharing would end by it, nothing is kept until that was asked. */
export function useKeepPerson({ onEnded, onStay }: KeptPerson) {
  const client = useQueryClient();
  /** why it is asked first, and what was to be kept */
  const [asked, setAsked] = useState<{ why: string; told: PersonFacts } | null>(null);
  const put = async (told: PersonFactsChange) => {
    client.setQueryData(personQuery.queryKey, await http.put<PersonFacts>("/account/person", told));
  };
  const ending = useMutation({
    mutationFn: async (told: PersonFacts) => {
      await put({ ...told, endsSharing: true });
      setAsked(null);
      void client.invalidateQueries({ queryKey: ["studio"] });
    },
    onSuccess: onEnded,
    networkMode: "always",
  });
  /** Whether they are kept; false where it is asked first. */
  const keep = async (told: PersonFacts): Promise<boolean> => {
    setAsked(null);
    ending.reset();
    try {
      await put(told);
      return true;
    } catch (error) {
      if (!(error instanceof ApiError) || error.code !== "ends-sharing") throw error;
      setAsked({ why: error.message, told });
      return false;
    }
  };
  /** for a `Question` */
  const question = asked && {
    ...stopSharingWords,
    text: asked.why,
    busy: ending.isPending,
    error: ending.error,
    onConfirm: () => ending.mutate(asked.told),
    onKeep: () => {
      setAsked(null);
      onStay();
    },
  };
  return { keep, question };
}
