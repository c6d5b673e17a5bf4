import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { TryKept } from "./kept/TryKept";
import { TryResult } from "./report/TryResult";
import { TrySetUp } from "./setup/TrySetUp";
import type { TryScreenProps } from "./tryScreenProps";
import { TrySinging } from "./singing/TrySinging";
import { useTry } from "./useTry";

/** A key sung for real: chosen, sung with its backing, measured, kept, and the keys as they then stand. */
export function TryScreen(props: TryScreenProps) {
  const { song, to, shift, singer, recorder } = props;
  const own = useTry(song, { tonic: to.tonic, shift }, recorder);
  const [keptId, setKeptId] = useState<string | null>(null);
  const { state, restoring } = recorder;
  const sign = glyphs(keySign(to));
  const { measured } = own;
  const view = restoring ? "restoring" : state.step === "heard" && measured ? "result" : state.step;
  useHeadFocus(view);
  const crumb = {
    label: `${song.title} / Keys`,
    href: { pathname: "/songs/[id]/keys" as const, params: { id: song.id } },
  };
  return (
    <>
      <LiveText hidden urgent={view === "listening"}>
        {liveWords[view] ?? ""}
      </LiveText>
      {state.step === "listening" || state.step === "stopping" ? (
        <TrySinging
          song={song}
          to={to}
          sign={sign}
          own={own}
          recorder={recorder}
          seconds={state.seconds}
          stopping={state.step === "stopping"}
          voice={props.voice?.range ?? null}
          draw={props.draw}
        />
      ) : restoring || state.step === "judging" ? (
        <Screen title={`Try it in ${sign}`} subtitle={song.title} crumb={crumb} wide>
          <View style={{ gap: 16, maxWidth: 560 }}>
            <Skeleton words="Reading the notes" bars={[{ height: 48 }, { height: 96 }, { height: 120 }]} />
            {state.step === "judging" && (
              <Button
                kind="text"
                small
                label="Give this take up"
                onPress={own.forget}
                style={{ alignSelf: "flex-start" }}
              />
            )}
          </View>
        </Screen>
      ) : measured ? (
        <TryResult
          song={song}
          mode={to.mode}
          measured={measured}
          own={own}
          voiceId={singer?.id ?? null}
          playback={recorder.playback}
          crumb={crumb}
          onKept={setKeptId}
          handIn={props.handIn}
        />
      ) : keptId !== null && state.step === "idle" ? (
        <TryKept {...props} sign={sign} keptId={keptId} crumb={crumb} onOn={() => setKeptId(null)} />
      ) : (
        <TrySetUp {...props} sign={sign} own={own} crumb={crumb} />
      )}
    </>
  );
}

const liveWords: Partial<Record<string, string>> = {
  asking: "Waiting for the microphone.",
  listening: "Listening. The count-in begins.",
  judging: "Stopped. Reading the notes.",
  result: "The take is measured.",
};

/** The focus goes to the head of whatever takes the page's place; while it is sung Stop has it. */
function useHeadFocus(view: string): void {
  const before = useRef(view);
  useEffect(() => {
    if (before.current !== view && view !== "listening" && view !== "asking" && view !== "stopping") {
      document.querySelector<HTMLElement>("h1")?.focus();
    }
    before.current = view;
  }, [view]);
}
