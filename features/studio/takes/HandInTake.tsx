import { useMutation, useQuery } from "@tanstack/react-query";
import type { Href } from "expo-router";
import { View } from "react-native";
import { newId } from "@/features/api/newId";
import { useSession } from "@/features/api/SessionProvider";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import type { HandInRequest, TakePicture } from "@/shared/contract/studio/handIn";
import { glyphs } from "@/shared/music/pitch";
import { partPath } from "../partWords";
import { studioQueries } from "../studioQueries";
import { SendingRow } from "./SendingRow";
import { takeSender } from "./takeSender";
import { useSendings } from "./useSendings";

/** A take that was sung and measured; its sound is made when it is handed in. */
interface TakeToHandIn extends Pick<HandInRequest, "id" | "effort" | "measures">, Pick<TakePicture, "trail" | "tune"> {
  tonic: string;
  shift: number;
}

export interface HandInTakeProps {
  songId: string;
  take: TakeToHandIn;
  /** makes the file that is sent; null where the sound is gone */
  sound: () => Promise<{ sound: Blob; durationS: number; waveform: number[] } | null>;
}

/** Under a take of a song that a teacher gave: hand it in. Shows nothing for other songs, and to visitors. */
export function HandInTake({ songId, take, sound }: HandInTakeProps) {
  const { account } = useSession();
  const parts = useQuery({ ...studioQueries.parts(), enabled: account !== null });
  const listed = (parts.data ?? []).find((part) => part.songId === songId);
  const asked = useQuery({ ...studioQueries.part(listed?.id ?? ""), enabled: listed !== undefined });
  const part = asked.data;
  const sending = useSendings(listed?.id ?? "").findLast(({ takeId }) => takeId === take.id);
  const { effort, measures, trail, tune, tonic, shift } = take;
  const send = useMutation({
    mutationFn: async () => {
      const made = await sound();
      if (!made || !account || !listed) throw new Error("The sound of this take is gone. Sing it once more.");
      const { durationS, waveform } = made;
      const id = newId();
      await takeSender.handIn({
        ...{ id, accountId: account.id, partId: listed.id, title: listed.title, sound: made.sound },
        request: {
          ...{ id, takeId: take.id, kind: "pupil-take", bytes: made.sound.size, durationS, effort, measures },
          picture: { waveform, trail, tune },
        },
        at: new Date().toISOString(),
      });
    },
    networkMode: "always",
  });
  const failed = [parts, asked].find(({ data, isError }) => data === undefined && isError);
  if (failed)
    return (
      <Notice
        kind="caution"
        testID="hand-in-unknown"
        action={<Button kind="text" small icon="again" label="Look again" onPress={() => void failed.refetch()} />}
      >
        Whether a teacher gave you this song could not be looked up, so it cannot be handed in here now.
      </Notice>
    );
  if (!listed || !part) return null;
  const teacher = part.assignedBy ?? "your teacher";
  const thread = <TextLink href={partPath(part.id)}>Open the thread</TextLink>;
  const otherKey = part.tonic !== tonic || part.shift !== shift;
  return (
    <Card style={{ gap: 12 }} testID="hand-in">
      <Heading level={2}>{`Hand in to ${teacher}`}</Heading>
      {sending ? (
        <SendingRow
          sending={sending}
          sentWords={`${teacher} gets a mail and can listen for ${part.recordingsKeptDays} days.`}
          sentAction={thread}
        />
      ) : part.takesHandedIn.includes(take.id) ? (
        <Notice kind="good" title="Handed in" action={thread} testID="handed-in">
          {`${teacher} has this take. It stands in the thread, where you can take it back.`}
        </Notice>
      ) : !part.shares ? (
        <>
          <Text variant="small">
            {`Before ${teacher} can hear you, you agree to what teachers see. Until then this take stays on this device.`}
          </Text>
          <TextLink href={"/account/sharing" as Href}>What teachers see</TextLink>
        </>
      ) : (
        <>
          <Text variant="small">
            {`${teacher} gets the sound, what was measured and how it felt. The recording is deleted after ${part.recordingsKeptDays} days; you can take it back before.`}
          </Text>
          {otherKey && (
            <Notice kind="caution" testID="other-key">
              {`You were given this song in ${glyphs(part.tonic)}; this take is in ${glyphs(tonic)}.`}
            </Notice>
          )}
          {send.error && (
            <Notice kind="error" title="Not handed in">
              {send.error.message}
            </Notice>
          )}
          <View style={{ alignSelf: "flex-start" }}>
            <Button
              kind="secondary"
              small
              icon="check"
              label={`Hand in to ${teacher}`}
              busy={send.isPending}
              onPress={() => send.mutate()}
              testID="hand-in-now"
            />
          </View>
        </>
      )}
    </Card>
  );
}
