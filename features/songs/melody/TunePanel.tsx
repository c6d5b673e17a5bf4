import { useMemo } from "react";
import { View } from "react-native";
import { Tessituragram } from "@/features/span/Tessituragram";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { Text } from "@/features/ui/Text";
import type { Song } from "@/shared/contract/song";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { movedKey } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { moveTune } from "@/shared/songs/noteEdits";
import { spellingOfHome } from "./spellingOfHome";

export interface TunePanelProps {
  song: Song;
  voice: SingingVoice | null;
  /** semitones to the key that the page shows */
  shift: number;
}

/** On a song's page: where its tune lies in the voice, and the ways to the tune and to a recording of it. */
export function TunePanel({ song, voice, shift }: TunePanelProps) {
  const { tune } = song;
  const params = { id: song.id };
  const notes = useMemo(() => (tune?.kind === "melody" ? moveTune(tune.notes, shift) : null), [tune, shift]);
  const home = tune && movedKey({ tonic: tune.home, mode: song.writtenKey?.mode ?? "major" }, shift).tonic;
  return (
    <View style={{ gap: 8, marginTop: 24 }} testID="tune-panel">
      <Heading level={2}>{home && notes ? `Where the tune lies in ${glyphs(home)}` : "The tune"}</Heading>
      {notes && home ? (
        <Tessituragram notes={notes} home={home} voice={voice} spelling={spellingOfHome(home)} testID="tessituragram" />
      ) : (
        <Text variant="small" tone="soft">
          {tune
            ? "Only the ends of this tune are known. With its notes you see where it spends its time."
            : "This song has no tune yet. Sing it, or play it in note by note."}
        </Text>
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8, marginLeft: -8 }}>
        <LinkButton
          kind="text"
          small
          label={notes ? "Change the tune" : "Sing the tune"}
          href={{ pathname: "/songs/[id]/melody", params }}
          testID="to-melody"
        />
        <LinkButton
          kind="text"
          small
          label="Compare with a recording"
          href={{ pathname: "/songs/[id]/recording", params }}
          testID="to-recording"
        />
      </View>
    </View>
  );
}
