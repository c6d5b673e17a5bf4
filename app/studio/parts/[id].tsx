import { useLocalSearchParams } from "expo-router";
import { useMemo } from "react";
import { SignedIn } from "@/features/account/SignedIn";
import { instrumentOf } from "@/features/instruments/myInstruments";
import { songPiece } from "@/features/keys/songKeys";
import { ChangePart } from "@/features/studio/parts/ChangePart";
import { PartPage } from "@/features/studio/parts/PartPage";
import { PartTakes } from "@/features/studio/takes/PartTakes";
import { useWaysOfMany } from "@/features/ways/useWaysOfMany";
import type { Part } from "@/shared/contract/studio/assignment";
import { PartScreen } from "@/features/studio/parts/PartScreen";

export default function PartRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  const now = useMemo(() => new Date(), []);
  return (
    <PartPage id={id} now={now} door={SignedIn}>
      {(part) => (
        <PartScreen
          key={part.id}
          part={part}
          now={now}
          takes={(place) => <PartTakes {...place} now={now} />}
          change={<Change part={part} />}
        />
      )}
    </PartPage>
  );
}

function Change({ part }: { part: Part }) {
  const piece = useMemo(() => songPiece({ id: part.id, ...part.song }), [part]);
  return <ChangePart part={part} piece={piece} useWays={useWaysOfMany} instrumentOf={instrumentOf} />;
}
