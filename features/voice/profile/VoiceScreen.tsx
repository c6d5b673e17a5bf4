import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { useLayout } from "@/features/ui/useLayout";
import { chooseVoice, useChosenVoiceId } from "../chosenVoice";
import { pickVoice } from "../useSingingVoice";
import { MovingVoice } from "./MovingVoice";
import { TakeList } from "./TakeList";
import { TrendPicture } from "../trend/TrendPicture";
import { VoiceNames } from "./VoiceNames";
import { VoicePicture } from "./VoicePicture";
import { useEraseTake, useRemoveVoice, useSaveTake, useSaveVoice, voiceQueries } from "../voiceQueries";
import type { Take } from "@/shared/contract/take";
import type { Voice } from "@/shared/contract/voice";

/** My voices: the chosen one in picture and words, its takes, and the others. */
export function VoiceScreen() {
  const voices = useQuery(voiceQueries.list());
  const takes = useQuery(voiceQueries.takes());
  const chosenId = useChosenVoiceId();
  const both = {
    data: voices.data && takes.data && { voices: voices.data, takes: takes.data },
    isPending: voices.isPending || takes.isPending,
    error: voices.error ?? takes.error,
    refetch: () => Promise.all([voices.refetch(), takes.refetch()]),
  };
  const voice = pickVoice(voices.data ?? [], undefined, chosenId);
  return (
    <Screen
      title={voice?.name ?? "Your voice"}
      wide
      footer={
        voice && (
          <View style={{ flexDirection: "row", gap: 10 }}>
            <LinkButton
              kind="secondary"
              label="Set by hand"
              href={`/voice/by-hand?voice=${voice.id}`}
              testID="voice-by-hand"
            />
            <LinkButton icon="mic" label="Sing again" href="/voice/sing" style={{ flexGrow: 1 }} testID="voice-sing" />
          </View>
        )
      }
    >
      <QueryState
        query={both}
        title="Your voices could not be opened"
        skeleton={<Skeleton words="Opening your voices" bars={[{ height: 52, width: 230 }, { height: 380 }]} />}
      >
        {(data) => (voice ? <ChosenVoice voice={voice} {...data} /> : <NoVoiceYet />)}
      </QueryState>
    </Screen>
  );
}

function NoVoiceYet() {
  return (
    <View style={{ paddingTop: 12, gap: 12 }}>
      <EmptyState
        title="No voice yet"
        text="Sing a few seconds of any song. This page then shows which notes are yours, and songs are put into keys that suit them."
        action={
          <View style={{ gap: 8 }}>
            <LinkButton icon="mic" label="Sing a few seconds" href="/voice/sing" testID="voice-sing" />
            <LinkButton
              kind="text"
              label="Find your lowest and highest note"
              href="/voice/guided"
              testID="voice-guided"
            />
            <LinkButton kind="text" label="Use a recording" href="/voice/upload" testID="voice-upload" />
            <LinkButton kind="text" label="Set notes by hand" href="/voice/by-hand" testID="voice-by-hand" />
          </View>
        }
        testID="voice-empty"
      />
    </View>
  );
}

function ChosenVoice({ voice, voices, takes }: { voice: Voice; voices: Voice[]; takes: Take[] }) {
  const wide = useLayout() === "wide";
  const save = useSaveVoice();
  const remove = useRemoveVoice();
  const erase = useEraseTake();
  const change = useSaveTake();
  const own = takes.filter(({ voiceId }) => voiceId === voice.id);
  const refusal = [save, remove, erase, change].find(({ isError }) => isError)?.error;
  return (
    <View
      style={{
        flexDirection: wide ? "row" : "column",
        gap: 32,
        alignItems: wide ? "flex-start" : "stretch",
        paddingTop: 4,
      }}
    >
      <View style={wide ? { flexBasis: 0, flexGrow: 1 } : null}>
        <VoicePicture voice={voice} takes={own} onUseTakes={() => save.mutate({ ...voice, byHand: null })} />
      </View>
      <View style={[{ gap: 28 }, wide ? { flexBasis: 0, flexGrow: 1, maxWidth: 560 } : { maxWidth: 720 }]}>
        {refusal && (
          <Notice kind="error" title="Not done">
            {`${refusal.message} Nothing was changed.`}
          </Notice>
        )}
        <MovingVoice takes={own} />
        {own.length > 1 && <TrendPicture takes={own} />}
        {own.length > 0 && (
          <TakeList
            takes={own}
            busy={erase.isPending}
            onErase={(id) => erase.mutate(id)}
            onChange={(take) => change.mutate(take)}
          />
        )}
        <VoiceNames
          voices={voices}
          chosen={voice}
          takeCount={({ id }) => takes.filter(({ voiceId }) => voiceId === id).length}
          busy={save.isPending || remove.isPending}
          onChoose={chooseVoice}
          onSave={(changed) => save.mutate(changed, { onSuccess: () => chooseVoice(changed.id) })}
          onRemove={({ id }) => remove.mutate(id)}
        />
      </View>
    </View>
  );
}
