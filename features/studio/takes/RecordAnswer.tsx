import { useMutation } from "@tanstack/react-query";
import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { newId } from "@/features/api/newId";
import { useSession } from "@/features/api/SessionProvider";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { mostTakeBytes, mostTakeS } from "@/shared/contract/studio/takeLimits";
import type { Part } from "@/shared/contract/studio/assignment";
import { clockWords } from "../parts/clockWords";
import { readSound, recordSound, type Recording } from "./recordSound";
import { takeSender } from "./takeSender";

/** A teacher says or sings the answer; the pupil hears it in the thread. */
export function RecordAnswer({ part }: { part: Part }) {
  const { account } = useSession();
  const [begun, setBegun] = useState<number | null>(null);
  const [seconds, setSeconds] = useState(0);
  const recording = useRef<Recording | null>(null);
  const start = useMutation({
    networkMode: "always",
    mutationFn: async () => {
      recording.current = await recordSound().catch(() => {
        throw new Error("The microphone could not be used. Allow it for this page, then try again.");
      });
      setSeconds(0);
      setBegun(Date.now());
    },
  });
  const send = useMutation({
    networkMode: "always",
    mutationFn: async () => {
      const sound = await recording.current?.stop();
      recording.current = null;
      setBegun(null);
      if (!sound || !account) return;
      const { durationS, waveform } = await readSound(sound);
      if (sound.size > mostTakeBytes || durationS > mostTakeS)
        throw new Error("This is too long: an answer may last ten minutes.");
      const id = newId();
      await takeSender.handIn({
        ...{ id, accountId: account.id, partId: part.id, title: part.title, sound },
        request: {
          ...{ id, kind: "teacher-answer", bytes: sound.size, durationS, effort: null, measures: null },
          picture: { waveform, trail: [], tune: [] },
        },
        at: new Date().toISOString(),
      });
    },
  });
  const { mutate: sendNow } = send;
  useEffect(() => {
    if (begun === null) return;
    const timer = setInterval(() => {
      const passed = (Date.now() - begun) / 1000;
      setSeconds(passed);
      if (passed >= mostTakeS - 1) sendNow();
    }, 250);
    return () => clearInterval(timer);
  }, [begun, sendNow]);
  useEffect(() => () => recording.current?.drop(), []);
  const problem = start.error ?? send.error;
  return (
    <View style={{ gap: 8 }} testID="record-answer">
      <LiveText hidden>{begun === null ? "" : "Recording your answer."}</LiveText>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
        {begun === null ? (
          <Button
            kind="secondary"
            small
            icon="mic"
            label="Record an answer"
            busy={start.isPending || send.isPending}
            onPress={() => start.mutate()}
            testID="start-answer"
          />
        ) : (
          <>
            <Button
              small
              icon="stop"
              label={`Stop and send, ${clockWords(seconds)}`}
              onPress={() => send.mutate()}
              testID="send-answer"
            />
            <Button
              kind="text"
              small
              label="Forget it"
              onPress={() => {
                recording.current?.drop();
                recording.current = null;
                setBegun(null);
              }}
            />
          </>
        )}
      </View>
      {problem && (
        <Notice kind="error" title="Not recorded">
          {problem.message}
        </Notice>
      )}
    </View>
  );
}
