import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { newId } from "@/features/api/newId";
import { shelf } from "@/features/api/shelf";
import type { Take } from "@/shared/contract/take";
import type { Voice } from "@/shared/contract/voice";
import { chooseVoice } from "./chosenVoice";
import type { HeardTake } from "./recorder/recorder";
import { takeOfHeard } from "./takeOfHeard";

const oldestFirst = (a: Voice, b: Voice) => a.createdAt.localeCompare(b.createdAt);
const newestFirst = (a: Take, b: Take) => b.sungAt.localeCompare(a.sungAt);

export const voiceQueries = {
  list: () =>
    queryOptions({ queryKey: ["voices"], queryFn: async () => (await shelf.list("voices")).sort(oldestFirst) }),
  takes: () =>
    queryOptions({ queryKey: ["takes"], queryFn: async () => (await shelf.list("takes")).sort(newestFirst) }),
};

/** A new voice without any notes yet. */
export function newVoice(name: string): Voice {
  return { id: newId(), name, byHand: null, createdAt: new Date().toISOString() };
}

function useFresh() {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: voiceQueries.list().queryKey }),
      client.invalidateQueries({ queryKey: voiceQueries.takes().queryKey }),
    ]);
}

/** Keeps a heard take in a voice, old or new. What was sung replaces notes set by hand. The voice becomes the chosen one. */
export function useKeepTake() {
  const refresh = useFresh();
  return useMutation({
    mutationFn: async ({ heard, voice }: { heard: HeardTake; voice: Voice }) => {
      // Both writes carry their own id, so that a second try after a failure adds nothing twice.
      await shelf.put("voices", { ...voice, byHand: null });
      await shelf.put("takes", takeOfHeard(heard, voice.id));
      chooseVoice(voice.id);
    },
    onSuccess: refresh,
  });
}

/** Keeps what was held under guidance, in a voice old or new. The voice becomes the chosen one. */
export function useKeepHolds() {
  const refresh = useFresh();
  return useMutation({
    mutationFn: async ({ take, voice }: { take: Take; voice: Voice }) => {
      await shelf.put("voices", { ...voice, byHand: null });
      await shelf.put("takes", take);
      chooseVoice(voice.id);
    },
    onSuccess: refresh,
  });
}

/** Changes what the singer said about a take: how it felt, whether warmed up. */
export function useSaveTake() {
  const refresh = useFresh();
  return useMutation({ mutationFn: (take: Take) => shelf.put("takes", take), onSuccess: refresh });
}

/** Creates or changes a voice: its name, or its notes set by hand. */
export function useSaveVoice() {
  const refresh = useFresh();
  return useMutation({ mutationFn: (voice: Voice) => shelf.put("voices", voice), onSuccess: refresh });
}

/** Deletes a voice with all its takes. */
export function useRemoveVoice() {
  const refresh = useFresh();
  return useMutation({ mutationFn: (id: string) => shelf.remove("voices", id), onSuccess: refresh });
}

/** Erases one take; the voice is again what its other takes say. */
export function useEraseTake() {
  const refresh = useFresh();
  return useMutation({ mutationFn: (id: string) => shelf.remove("takes", id), onSuccess: refresh });
}
