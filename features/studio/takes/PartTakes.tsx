import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { AskedTwice } from "@/features/ui/AskedTwice";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import type { HandIn } from "@/shared/contract/studio/handIn";
import { dayOf } from "../dayWords";
import type { TakesPlace } from "../parts/takesPlace";
import { effortWord } from "../roster/rosterWords";
import { studioQueries, useStudioChange } from "../studioQueries";
import { measuredLine } from "./measuredLine";
import { RecordAnswer } from "./RecordAnswer";
import { SendingRow } from "./SendingRow";
import { takeSender } from "./takeSender";
import { TakePlayer } from "./TakePlayer";
import { useSendings } from "./useSendings";

export interface PartTakesProps extends TakesPlace {
  now: Date;
}

/** The recordings in a part's thread, and the way to one more. */
export function PartTakes({ part, comments, onTime, now }: PartTakesProps) {
  const query = useQuery(studioQueries.handIns(part.id));
  const sendings = useSendings(part.id);
  const other = part.side === "teacher" ? part.pupil : (part.assignedBy ?? "Your teacher");
  return (
    <View style={{ gap: 16 }} testID="takes">
      <Heading level={2}>Recordings</Heading>
      <QueryState query={query} title="The recordings could not be opened">
        {(takes) => {
          const shown = takes.filter(({ state }) => state !== "uploading");
          return (
            <>
              {shown.length === 0 && (
                <Text tone="soft" testID="no-takes">
                  {part.side === "teacher" ? `${part.pupil} has not handed anything in yet.` : "Nothing handed in yet."}
                </Text>
              )}
              {shown.map((take) => (
                <TakeCard key={take.id} take={take} comments={comments} onTime={onTime} now={now} />
              ))}
              {sendings
                .filter(({ id, state }) => state !== "sent" || !shown.some((take) => take.id === id))
                .map((sending) => (
                  <SendingRow key={sending.id} sending={sending} sentWords={`${other} gets a mail.`} />
                ))}
            </>
          );
        }}
      </QueryState>
      {part.side === "teacher" && <RecordAnswer part={part} />}
    </View>
  );
}

interface TakeCardProps extends Pick<TakesPlace, "comments" | "onTime"> {
  take: HandIn;
  now: Date;
}

function TakeCard({ take, comments, onTime, now }: TakeCardProps) {
  const { id, kind, mine, author, createdAt, expiresAt, effort, measures, state } = take;
  const remove = useStudioChange(async () => {
    await http.delete(`/hand-ins/${id}`);
    // Where the same take is looked at, it can be handed in again.
    await takeSender.giveUp(id);
  });
  const title = kind === "pupil-take" ? "Take" : "Answer";
  const facts = [
    mine ? "you" : author.name,
    dayOf(createdAt, now),
    effort === null ? null : `felt ${effortWord(effort)}`,
  ];
  return (
    <Card style={{ gap: 10 }} testID={kind}>
      <View style={{ gap: 2 }}>
        <Heading level={3}>{title}</Heading>
        <Text variant="small" tone="soft">
          {facts.filter(Boolean).join(" · ")}
        </Text>
      </View>
      {state === "deleted" ? (
        <Text tone="soft" testID="take-deleted">
          This recording was deleted.
        </Text>
      ) : (
        <>
          <TakePlayer take={take} comments={comments} onTime={onTime} />
          {measures && <Text variant="small">{measuredLine(measures)}</Text>}
          <Text variant="tiny" tone="soft" testID="take-expiry">
            {`Deleted by itself on ${dayOf(expiresAt, now)}.`}
          </Text>
          {mine && (
            <AskedTwice
              flush
              label="Take it back"
              question="Take this recording back?"
              text="It leaves the thread at once and is deleted from the storage."
              failed="It is still there."
              confirmLabel="Take it back"
              onRemove={() => remove.mutate()}
              busy={remove.isPending}
              error={remove.error}
              testID="take-back"
            />
          )}
        </>
      )}
    </Card>
  );
}
