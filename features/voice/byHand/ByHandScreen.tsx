import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { ByHandForm } from "./ByHandForm";
import { chooseVoice, useChosenVoiceId } from "../chosenVoice";
import { singingVoiceOf } from "@/shared/keys/singingVoiceOf";
import { pickVoice } from "../useSingingVoice";
import { letGoOfByHandDraft } from "./useByHandDraft";
import { newVoice, useSaveVoice, voiceQueries } from "../voiceQueries";
import { useState } from "react";

export interface ByHandScreenProps {
  /** whose notes; the chosen voice, or a new one where there is none */
  voiceId: string | undefined;
  onKept: () => void;
}

/** Setting the notes of a voice without singing. */
export function ByHandScreen({ voiceId, onKept }: ByHandScreenProps) {
  const voices = useQuery(voiceQueries.list());
  const takes = useQuery(voiceQueries.takes());
  const chosenId = useChosenVoiceId();
  const [fresh] = useState(() => newVoice("My voice"));
  const save = useSaveVoice();
  const both = {
    data: voices.data && takes.data && { voices: voices.data, takes: takes.data },
    isPending: voices.isPending || takes.isPending,
    error: voices.error ?? takes.error,
    refetch: () => Promise.all([voices.refetch(), takes.refetch()]),
  };
  return (
    <Screen title="Notes by hand" crumb={{ label: "Voice", href: "/voice" }} wide>
      <QueryState query={both} title="Your voices could not be opened">
        {(data) => {
          const voice = pickVoice(data.voices, voiceId, chosenId) ?? fresh;
          const place = voice === fresh ? "new" : voice.id;
          return (
            <View style={{ gap: 16, paddingTop: 8, maxWidth: 1040 }}>
              <Text tone="soft">
                {voice === fresh
                  ? "Give the lowest and the highest note that you can hold without pressing."
                  : `These notes are for ${voice.name}. Its takes stay as they are.`}
              </Text>
              <ByHandForm
                key={place}
                place={place}
                voice={singingVoiceOf(voice, data.takes)}
                busy={save.isPending}
                refusal={save.error ? `${save.error.message} What you entered is still here.` : null}
                onKeep={({ range, comfort }) =>
                  save.mutate(
                    { ...voice, byHand: { range, comfort } },
                    {
                      onSuccess: () => {
                        letGoOfByHandDraft(place);
                        chooseVoice(voice.id);
                        onKept();
                      },
                    },
                  )
                }
              />
            </View>
          );
        }}
      </QueryState>
    </Screen>
  );
}
