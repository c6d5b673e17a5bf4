import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import type { Crumb } from "@/features/ui/ScreenHead";
import type { Song } from "@/shared/contract/song";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { spellingIn } from "../../keyRows";
import { EffortQuestion } from "./EffortQuestion";
import { tryOf } from "../tryOf";
import { useKeepTry } from "../tryQueries";
import type { TryRecorder } from "../singing/tryRecorder";
import { sungToHandIn } from "./sungToHandIn";
import type { TryScreenProps } from "../tryScreenProps";
import { TryReport } from "./TryReport";
import type { MeasuredTry, Try } from "../useTry";

export interface TryResultProps {
  song: Song;
  mode: KeyName["mode"];
  measured: MeasuredTry;
  own: Try;
  voiceId: string | null;
  playback: TryRecorder["playback"];
  crumb: Crumb;
  onKept: (id: string) => void;
  handIn: TryScreenProps["handIn"];
}

/** What was sung, how it felt, and whether to keep it. */
export function TryResult({ song, mode, measured, own, voiceId, playback, crumb, onKept, handIn }: TryResultProps) {
  const keep = useKeepTry();
  const key = { tonic: measured.key.tonic, mode };
  const sign = glyphs(keySign(key));
  const keepIt = () =>
    keep.mutate(tryOf(measured, own.effort, song.id, voiceId), {
      onSuccess: ({ item }) => {
        playback.stop();
        onKept(item.id);
        own.forget();
      },
    });
  return (
    <Screen
      title={`Sung in ${sign}`}
      subtitle={song.title}
      crumb={crumb}
      wide
      footer={
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
          <Button kind="secondary" icon="again" label="Sing again" onPress={own.forget} testID="try-again" />
          <Button
            label="Keep this try"
            busy={keep.isPending}
            onPress={keepIt}
            style={{ flexGrow: 1 }}
            testID="try-keep"
          />
        </View>
      }
    >
      <View style={{ gap: 16 }}>
        {keep.error && (
          <Notice kind="error" title="Not kept yet">
            {`${keep.error.message} This take is still here.`}
          </Notice>
        )}
        <View style={{ maxWidth: 560 }}>
          <EffortQuestion effort={own.effort} onFelt={own.felt} />
        </View>
        {handIn?.(sungToHandIn(measured, own.effort))}
        <TryReport measured={measured} spelling={spellingIn(key)} playback={playback} />
      </View>
    </Screen>
  );
}
