import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Select } from "@/features/ui/Select";
import { LinkButton } from "@/features/ui/LinkButton";
import type { Crumb } from "@/features/ui/ScreenHead";
import { moveWords } from "@/shared/music/moveWords";
import { BeforeTry } from "./BeforeTry";
import { Sitting } from "../kept/Sitting";
import { TryFailure } from "../singing/TryFailure";
import type { TryScreenProps } from "../tryScreenProps";
import type { Try } from "../useTry";

export interface TrySetUpProps extends TryScreenProps {
  sign: string;
  own: Try;
  crumb: Crumb;
}

/** Before it is sung: the key, the backing, and Start under the thumb. */
export function TrySetUp(props: TrySetUpProps) {
  const { song, shift, sign, keys, recorder, own, crumb, onKey } = props;
  const { state } = recorder;
  const asking = state.step === "asking";
  const melody = song.tune?.kind === "melody";
  const begin = () => {
    own.backing.stop();
    recorder.sing();
  };
  const rows = keys.rows ?? [];
  const known = rows.some((row) => row.shift === shift);
  const options = [
    ...(known ? [] : [{ value: String(shift), label: `${sign}, ${moveWords(shift)}` }]),
    ...rows.map((row) => ({ value: String(row.shift), label: `${row.sign}, ${row.score} of 100, ${row.moved}` })),
  ];
  return (
    <Screen
      title={`Try it in ${sign}`}
      subtitle={song.title}
      crumb={crumb}
      wide
      footer={
        own.plan && (
          <Button
            icon="mic"
            label={asking ? "Waiting for the microphone" : state.step === "failure" ? "Try again" : "Start singing"}
            busy={asking}
            onPress={begin}
            testID="sing-start"
          />
        )
      }
    >
      {state.step === "failure" && (
        <TryFailure words={state.words} loudspeaker={state.heard && own.wishes.backing && !own.wishes.headphones} />
      )}
      {own.plan ? (
        <BeforeTry
          keys={
            <View style={{ gap: 12 }}>
              <Select
                label="Key"
                options={options}
                value={String(shift)}
                onChange={(value) => {
                  const row = rows.find((each) => String(each.shift) === value);
                  if (row) onKey({ tonic: row.key.tonic, shift: row.shift });
                }}
                testID="try-key"
              />
              {rows.find((row) => row.shift === shift)?.beyond && (
                <Notice kind="caution" testID="try-beyond">
                  {`In ${sign} some of the tune lies outside your range. Leave a note out rather than force it.`}
                </Notice>
              )}
            </View>
          }
          wishes={own.wishes}
          onWish={own.setWishes}
          plan={own.plan}
          backing={own.backing}
          melody={melody}
        />
      ) : (
        <Notice kind="caution" testID="try-nothing">
          This song has no chords, no words and no tune yet. With any of them it can be tried.
        </Notice>
      )}
      {!melody && own.plan && (
        <View style={{ marginTop: 16, gap: 8, maxWidth: 560 }}>
          <Notice
            kind="caution"
            testID="try-no-melody"
            action={
              <LinkButton
                kind="text"
                small
                href={{ pathname: "/songs/[id]/melody", params: { id: song.id } }}
                label="Put in the tune"
                flush
              />
            }
          >
            The tune is not known note by note, so what you sing cannot be measured. How it felt counts all the same.
          </Notice>
        </View>
      )}
      <Sitting {...props} />
    </Screen>
  );
}
