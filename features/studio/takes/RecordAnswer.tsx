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
import { clockWords } from "@/features/ui/clockWords";
import { readSound, recordSound, type Recording } from "./recordSound";
import { takeSender } from "./takeSender";

/** A teacher says or sings the answer; the pupil hears it in the thread. */
export function RecordAnswer({ part }: { part: Part }) {
  const { account } = useSession();
  const [begun, setBegun] = useState<number | null>(null);
  const [seconds, setSeconds] = useState(0);
  /** recorded, and not yet safe on this device */
  const [unsent, setUnsent] = useState<Blob | null>(null);
  const recording = useRef<Recording | null>(null);
  const left = useRef(false);
  const start = useMutation({
    networkMode: "always",
    mutationFn: async () => {
      const running = await recordSound().catch(() => {
        throw new Error("The microphone could not be used. Allow it for this page, then try again.");
      });
      if (left.current) return running.drop();
      recording.current = running;
      setSeconds(0);
      setBegun(Date.now());
    },
  });
  const send = useMutation({
    networkMode: "always",
    mutationFn: async () => {
      const running = recording.current;
      recording.current = null;
      setBegun(null);
      const sound = running ? await running.stop() : unsent;
      if (!sound || !account) return;
      setUnsent(sound);
      const { durationS, waveform } = await readSound(sound);
      if (sound.size > mostTakeBytes || durationS > mostTakeS)
        throw new Error("This is too long: an answer may last ten minutes. Forget it and record a shorter one.");
      const id = newId();
      await takeSender.handIn({
        ...{ id, accountId: account.id, partId: part.id, title: part.title, sound },
        request: {
          ...{ id, takeId: null, kind: "teacher-answer", bytes: sound.size, durationS, effort: null, measures: null },
          picture: { waveform, trail: [], tune: [] },
        },
        at: new Date().toISOString(),
      });
      setUnsent(null);
    },
  });
  const { mutate: sendNow } = send;
  useEffect(() => {
    if (begun === null) return;
    const timer = setInterval(() => {
      const passed = (Date.now() - begun) / 1000;
      setSeconds(passed);
      if (passed < mostTakeS - 1) return;
      clearInterval(timer);
      sendNow();
    }, 250);
    return () => clearInterval(timer);
  }, [begun, sendNow]);
  useEffect(() => {
    left.current = false;
    return () => {
      left.current = true;
      recording.current?.drop();
    };
  }, []);
  const problem = start.error ?? send.error;
  return (
    <View style={{ gap: 8 }} testID="record-answer">
      <LiveText hidden>{begun === null ? "" : "Recording your answer."}</LiveText>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
        {begun === null && unsent !== null && !send.isPending ? (
          <>
            <Button small icon="again" label="Try again" onPress={() => send.mutate()} testID="send-answer-again" />
            <Button
              kind="text"
              small
              label="Forget it"
              onPress={() => {
                setUnsent(null);
                send.reset();
              }}
            />
          </>
        ) : begun === null ? (
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
        <Notice kind="error" title={unsent === null ? "Not recorded" : "Recorded, not sent yet"}>
          {problem.message}
        </Notice>
      )}
    </View>
  );
}
