import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { PhoneFoot } from "@/features/ui/PhoneFoot";
import { useLayout } from "@/features/ui/useLayout";
import { plural } from "@/shared/music/countWords";
import { searchWords } from "./useWaysOfParts";

export interface AssignFootProps {
  chosen: number;
  /** pupils whose way is not found yet */
  searching: number;
  sending: boolean;
  error: Error | null;
  onSend: () => void;
}

/** Gives the song out, once every chosen pupil has a way; on the phone always in reach. */
export function AssignFoot({ chosen, searching, sending, error, onSend }: AssignFootProps) {
  const phone = useLayout() === "phone";
  const foot = (
    <>
      {error && (
        <Notice kind="error" title="The song was not given" testID="assign-problem">
          {`${error.message} What you set here is still here.`}
        </Notice>
      )}
      <Button
        label={
          sending
            ? "Giving it out"
            : chosen === 0
              ? "Choose at least one pupil"
              : `Give it to ${plural(chosen, "pupil")}`
        }
        busy={sending}
        disabled={chosen === 0 || searching > 0}
        onPress={onSend}
        testID="give"
      />
      <LiveText variant="small" tone="soft">
        {searchWords(searching, chosen)}
      </LiveText>
    </>
  );
  return phone ? <PhoneFoot>{foot}</PhoneFoot> : <View style={{ gap: 8, alignItems: "flex-start" }}>{foot}</View>;
}
