import { useMemo, useState } from "react";
import { useWindowDimensions, View } from "react-native";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { sizes } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import { voiceTypes } from "@/shared/keys/voiceTypes";
import { KeyLegend } from "../KeyLegend";
import { GroupResult } from "./GroupResult";
import { tuneWords } from "./groupWords";
import type { ReadNotes } from "./singers/SingerForm";
import { SingersPane } from "./singers/SingersPane";
import { knownSingers, type OwnVoice, type Singer } from "./singers/singers";
import { useRememberedSingers } from "./singers/rememberedSingers";
import { SpanList } from "./SpanList";
import { SpanTable } from "./SpanTable";
import { useGroupKeys } from "./useGroupKeys";

export interface TogetherScreenProps {
  song: Song;
  /** the voices kept here */
  own: readonly OwnVoice[];
  /** they are still being fetched */
  pending: boolean;
  /** why they could not be fetched */
  error: Error | null;
  onRetry: () => void;
  readNotes: ReadNotes;
}

/** From this width on the singers stand beside the result. */
const columns = { from: 1240, singers: 340, gap: 40 } as const;

/** One key for several singers: who sings, the fairest key, every singer in every key, and the tune in each voice. */
export function TogetherScreen({ song, own, pending, error, onRetry, readNotes }: TogetherScreenProps) {
  const layout = useLayout();
  const { singers, last, keep } = useRememberedSingers(song.id);
  const known = useMemo(() => knownSingers(singers, own, voiceTypes), [singers, own]);
  const group = useGroupKeys(song, known);
  const [tonic, setTonic] = useState<string | null>(null);
  const [said, setSaid] = useState("");
  const { keys } = group;
  const picked = keys?.find(({ key }) => key.tonic === tonic) ?? keys?.[0] ?? null;
  const decided = picked !== null && group.isDecided(picked);
  const change = (next: Singer[], words: string) => {
    keep(next);
    setSaid(words);
  };
  const width = useWindowDimensions().width;
  const room = Math.min(sizes.content, width - sizes.rail - 2 * sizes.gutterWide);
  const beside = width >= columns.from;
  const take = picked && (
    <Button
      small={layout !== "phone"}
      disabled={decided}
      busy={group.saving}
      label={takeWords(picked.sign, decided, picked.beyond)}
      onPress={() => group.take(picked)}
      testID="take-shared-key"
    />
  );
  return (
    <Screen
      title="Sing together"
      subtitle={layout === "phone" ? song.title : tuneWords(song)}
      crumb={{
        label: layout === "phone" ? "Keys" : `${song.title}, all keys`,
        href: { pathname: "/songs/[id]/keys", params: { id: song.id } },
      }}
      wide
      footer={take ?? undefined}
    >
      <LiveText hidden>{said}</LiveText>
      {!song.tune ? (
        <NeedsTune id={song.id} />
      ) : pending ? (
        <Skeleton bars={[{ height: 56 }, { height: 56 }, { height: 260 }]} words="Fetching the voices" />
      ) : (
        <View style={{ gap: 28 }}>
          {error && (
            <Notice
              kind="error"
              title="Your voices could not be fetched"
              action={<Button kind="text" small label="Try again" onPress={onRetry} />}
            >
              {`${error.message} Nothing is lost; table figures and typed notes work meanwhile.`}
            </Notice>
          )}
          {group.error && (
            <Notice kind="error" title="The key is not saved">
              {`${group.error.message} The singers are still here; try again.`}
            </Notice>
          )}
          <View style={beside ? { flexDirection: "row", gap: columns.gap, alignItems: "flex-start" } : { gap: 28 }}>
            <View style={beside ? { width: columns.singers } : null}>
              <SingersPane
                singers={singers}
                known={known}
                last={last}
                own={own}
                judged={group.singers.length}
                readNotes={readNotes}
                onChange={change}
              />
            </View>
            <View style={[{ gap: 28 }, beside ? { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 } : null]}>
              {keys && picked ? (
                <>
                  <GroupResult
                    keys={keys}
                    picked={picked}
                    singers={group.singers}
                    coarse={group.coarse}
                    decided={decided}
                    waysHref={{
                      pathname: "/songs/[id]/ways",
                      params: { id: song.id, key: picked.key.tonic, shift: String(picked.shift) },
                    }}
                    onPick={(key) => setTonic(key.key.tonic)}
                  />
                  <View style={{ gap: 12 }}>
                    <Heading level={2}>{`Each voice in ${picked.sign}`}</Heading>
                    {layout === "wide" ? (
                      <SpanTable picked={picked} room={room - (beside ? columns.singers + columns.gap : 0)} />
                    ) : (
                      <SpanList picked={picked} />
                    )}
                    <KeyLegend />
                  </View>
                </>
              ) : (
                <NeedsSingers id={song.id} judged={group.singers.length} />
              )}
            </View>
          </View>
        </View>
      )}
    </Screen>
  );
}

function NeedsTune({ id }: { id: string }) {
  return (
    <EmptyState
      testID="together-needs-tune"
      title="The melody is not known yet"
      text="A shared key is judged by where the melody lies in each voice. Its lowest and highest note are enough; a melody file says more."
      action={
        <LinkButton href={{ pathname: "/songs/[id]/edit", params: { id } }} label="Give the melody" icon="edit" small />
      }
    />
  );
}

function NeedsSingers({ id, judged }: { id: string; judged: number }) {
  if (judged === 0)
    return (
      <EmptyState
        testID="together-empty"
        title="One key for several voices"
        text="Add two or more singers. You then see the key in which the one who has it hardest is best off, who is squeezed and by how much, and who had better sing it in another octave."
      />
    );
  return (
    <EmptyState
      testID="together-one"
      title="One more singer"
      text="A shared key needs two voices that can be judged. Add another singer, or look at the keys for one voice."
      action={
        <LinkButton
          kind="secondary"
          small
          href={{ pathname: "/songs/[id]/keys", params: { id } }}
          label="Keys for one voice"
        />
      }
    />
  );
}

/** What the button does. A key that leaves notes out is not offered as if it fitted everybody. */
function takeWords(sign: string, decided: boolean, beyond: boolean): string {
  if (decided) return `${sign} is the key`;
  return beyond ? `Take ${sign} all the same` : `Make ${sign} the key`;
}
