import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { View } from "react-native";
import { Notice } from "@/features/ui/Notice";
import { rankMoves } from "./rankMoves";
import { SideBySide } from "./SideBySide";
import { sittingOf } from "./sitting";
import { rowsWith, triesOfVoice } from "./triedRows";
import { TryList } from "./TryList";
import { tryQueries } from "../tryQueries";
import type { TryScreenProps } from "../tryScreenProps";

/** What was tried in this sitting, side by side, and every try that counts; nothing where nothing was tried. */
export function Sitting({ song, keys, singer, voice }: Pick<TryScreenProps, "song" | "keys" | "singer" | "voice">) {
  const tries = useQuery(tryQueries.all());
  const [openedMs] = useState(() => Date.now());
  const own = triesOfVoice(tries.data ?? [], singer?.id ?? null);
  const sitting = sittingOf(
    own.filter(({ songId }) => songId === song.id),
    openedMs,
  );
  const plain = rowsWith(song, voice, []);
  const now = rowsWith(song, voice, own);
  if (own.length === 0) return null;
  return (
    <View style={{ marginTop: 24, gap: 24 }}>
      {keys.error && <Notice kind="error" title="Your key is not saved">{`${keys.error.message} Try again.`}</Notice>}
      {sitting.length > 0 && plain && now && (
        <SideBySide
          song={song}
          tries={sitting}
          moves={rankMoves(plain.rows, now.rows)}
          decided={keys.decided?.otherVoice === null ? (keys.decision?.shift ?? null) : null}
          saving={keys.saving}
          onDecide={(row) =>
            keys.take({
              tonic: row.key.tonic,
              shift: row.shift,
              instrument: keys.decision?.instrument ?? null,
              way: null,
            })
          }
        />
      )}
      <TryList songId={song.id} tries={own} />
    </View>
  );
}
