import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { askedKey, writtenKeyOf } from "@/features/keys/songKeys";
import { KeyUnknown } from "@/features/keys/tryout/KeyUnknown";
import { TryScreen } from "@/features/keys/tryout/TryScreen";
import { useSongKeys } from "@/features/keys/useSongKeys";
import { ChartView } from "@/features/songs/ChartView";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { HandInTake } from "@/features/studio/takes/HandInTake";
import { useTryTake } from "@/features/voice/tryTake/useTryTake";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import type { Song } from "@/shared/contract/song";
import type { ChartLine } from "@/shared/songs/chart";

export default function TryRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Try it">
      {(song) => (writtenKeyOf(song) ? <TryIt key={song.id} song={song} /> : <KeyUnknown song={song} />)}
    </SongState>
  );
}

function TryIt({ song }: { song: Song }) {
  const router = useRouter();
  const asked = useLocalSearchParams<{ key?: string; shift?: string }>();
  const singer = useSingingVoice();
  const keys = useSongKeys(song, singer);
  const { key, shift } = askedKey(song, keys.inHand, asked.key, asked.shift);
  const recorder = useTryTake(song.id);
  return (
    <TryScreen
      song={song}
      to={key}
      shift={shift}
      keys={keys}
      singer={singer.voice}
      voice={singer.forKeys}
      recorder={recorder}
      draw={drawLine}
      handIn={(take) => <HandInTake songId={song.id} take={take} sound={recorder.toSend} />}
      onKey={({ tonic, shift: semitones }) => router.setParams({ key: tonic, shift: String(semitones) })}
    />
  );
}

function drawLine(line: ChartLine) {
  return <ChartView chart={{ sections: [oneLine(line)], unread: [] }} size={17} />;
}

function oneLine(line: ChartLine) {
  return { label: null, heading: null, lines: [line], kind: null, number: null, times: 1, recalls: null };
}
