import { View } from "react-native";
import { VoiceStrip } from "@/features/span/VoiceStrip";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { commonScale, spellingIn, wholeVoice, type KeyRow } from "./keyRows";

/** The decided key against the voice, for a row of the shelf; the row says it in words too. */
export function ShelfStrip({ row, singing }: { row: KeyRow; singing: SingingVoice }) {
  const voice = wholeVoice(singing);
  return (
    <View aria-hidden>
      <VoiceStrip
        voice={voice}
        marks={row.marks}
        scale={commonScale([], voice)}
        width={120}
        spelling={spellingIn(row.key)}
      />
    </View>
  );
}
