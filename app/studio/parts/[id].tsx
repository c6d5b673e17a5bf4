import { useLocalSearchParams } from "expo-router";
import { useMemo } from "react";
import { SignedIn } from "@/features/account/SignedIn";
import { PartPage } from "@/features/studio/parts/PartPage";
import { PartTakes } from "@/features/studio/takes/PartTakes";
import { PartScreen } from "@/features/studio/parts/PartScreen";

export default function PartRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  const now = useMemo(() => new Date(), []);
  return (
    <PartPage
      id={id}
      now={now}
      door={(inside) => (
        <SignedIn here={`/studio/parts/${id}`} wide>
          {inside}
        </SignedIn>
      )}
    >
      {(part) => (
        <PartScreen key={part.id} part={part} now={now} takes={(place) => <PartTakes {...place} now={now} />} />
      )}
    </PartPage>
  );
}
