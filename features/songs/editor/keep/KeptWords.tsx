import { View } from "react-native";
import { LiveText } from "@/features/ui/LiveText";
import { ApiError } from "@/features/api/apiError";
import type { KeepState } from "./songKeeper";

const clock = (at: Date) => `${String(at.getHours()).padStart(2, "0")}:${String(at.getMinutes()).padStart(2, "0")}`;

function keptWords(state: KeepState): string {
  switch (state.kind) {
    case "kept":
      return state.at === null ? "Changes are kept by themselves" : `Kept ${clock(state.at)}`;
    case "keeping":
      return "Keeping…";
    case "unfinished":
      return "Not kept yet: something needs mending. Everything is still here.";
    case "clash":
      return "Not kept yet: it was changed elsewhere. Everything is still here.";
    case "failed":
      return state.error instanceof ApiError && state.error.code === "offline"
        ? "Not kept yet: no connection. Everything is still here."
        : "Not kept yet. Everything is still here.";
  }
}

/** Quiet words on whether what is typed is kept. */
export function KeptWords({ state }: { state: KeepState }) {
  const quiet = state.kind === "kept" || state.kind === "keeping";
  return (
    <View style={{ flexShrink: 1, flexGrow: 1, minWidth: 0 }}>
      <LiveText variant="small" tone={quiet ? "soft" : "honey"} testID="kept-words">
        {keptWords(state)}
      </LiveText>
    </View>
  );
}
