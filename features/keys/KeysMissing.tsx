import { useState } from "react";
import { View } from "react-native";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Select } from "@/features/ui/Select";
import type { Song } from "@/shared/contract/song";
import { keySign, movedKey } from "@/shared/music/keyWords";
import { moveWords } from "@/shared/music/moveWords";
import { glyphs } from "@/shared/music/pitch";
import { writtenKeyOf } from "./songKeys";

/** What keys need and do not have yet, with the one step that brings it, and the way on for who knows the key already. */
export function KeysMissing({ song }: { song: Song }) {
  return (
    <View style={{ gap: 16 }}>
      {song.tune ? (
        <EmptyState
          testID="keys-need-voice"
          title="Your voice is not known yet"
          text="Here stand all twelve keys, scored for your voice. Sing a few seconds, or set your lowest and highest note by hand."
          action={
            <View style={{ gap: 4 }}>
              <LinkButton href="/voice/sing" label="Sing a few seconds" icon="mic" small />
              <LinkButton href="/voice/by-hand" label="Set the notes by hand" kind="text" small />
            </View>
          }
        />
      ) : (
        <EmptyState
          testID="keys-need-tune"
          title="The melody is not known yet"
          text="Keys are judged by where the melody lies in your voice. Its lowest and highest note are enough; a melody file says more."
          action={
            <LinkButton
              href={{ pathname: "/songs/[id]/edit", params: { id: song.id } }}
              label="Give the melody"
              icon="edit"
              small
            />
          }
        />
      )}
      <KnownKey song={song} />
    </View>
  );
}

const moves = [0, -1, 1, -2, 2, -3, 3, -4, 4, -5, 5, -6];

function KnownKey({ song }: { song: Song }) {
  const written = writtenKeyOf(song);
  const [shift, setShift] = useState("0");
  if (!written) return null;
  const keyAt = (semitones: number) => movedKey(written, semitones);
  const key = keyAt(Number(shift));
  return (
    <View style={{ gap: 8, maxWidth: 480 }}>
      <Select
        label="Or choose a key that you know"
        testID="known-key"
        value={shift}
        options={moves.map((semitones) => ({
          value: String(semitones),
          label: `${glyphs(keySign(keyAt(semitones)))}, ${moveWords(semitones)}`,
        }))}
        onChange={setShift}
      />
      <LinkButton
        kind="secondary"
        small
        label={`Ways to play it in ${glyphs(keySign(key))}`}
        href={{ pathname: "/songs/[id]/ways", params: { id: song.id, key: key.tonic, shift } }}
      />
    </View>
  );
}
