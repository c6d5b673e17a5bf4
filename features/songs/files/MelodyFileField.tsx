import { useEffect, useId, useRef, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Icon } from "@/features/ui/Icon";
import { LiveText } from "@/features/ui/LiveText";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { glyphs, noteName } from "@/shared/music/pitch";
import { lyricLines } from "@/shared/songs/lyricLines";
import type { DraftMelody, SongDraft } from "../editor/songDraft";
import { useTapTone } from "../melody/entry/useTapTone";
import { useTunePlayer } from "../melody/useTunePlayer";
import { MelodyPicture } from "./MelodyPicture";
import { readSongFile, type SongFile } from "./readSongFile";
import { type Filled, takenFromFile } from "./takenFromFile";
import { VoiceChoice } from "./VoiceChoice";

export interface MelodyFileFieldProps {
  draft: SongDraft;
  error: string | undefined;
  onChange: (change: Partial<SongDraft>) => void;
}

type Found = Extract<SongFile, { ok: true }> & { name: string; chosen: number; taken: string | null; filled: Filled };

/** Quarter notes a minute where neither the file nor the form tells a speed. */
const usualTempo = 96;

/** A melody from a file: choose it, choose among its voices, see and hear what came out, take its words. */
export function MelodyFileField({ draft, error, onChange }: MelodyFileFieldProps) {
  const input = useRef<HTMLInputElement>(null);
  const buttons = useRef<View>(null);
  const noteId = useId();
  const reading = useRef<AbortController | null>(null);
  const [busy, setBusy] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [file, setFile] = useState<Found | null>(null);
  const { melody } = draft;
  const tempo = file?.tempo ?? (Number(draft.tempo) || usualTempo);
  const player = useTunePlayer(useTapTone(), Math.max(20, Math.min(400, tempo)));
  useEffect(() => () => reading.current?.abort(), []);

  const choose = (found: Found, chosen: number, more: Partial<SongDraft> = {}) => {
    const voice = found.voices[chosen];
    if (!voice) return;
    player.stop();
    setFile({ ...found, chosen });
    const source = found.voices.length > 1 ? `${found.name}, ${voice.name}` : found.name;
    onChange({ melody: { source, notes: voice.melody.notes }, home: voice.melody.home ?? "", ...more });
  };
  const read = async (given: File) => {
    const turn = new AbortController();
    reading.current?.abort();
    reading.current = turn;
    player.stop();
    setBusy(true);
    setRefusal(null);
    const result = await readSongFile(given, { signal: turn.signal }).catch(() => null);
    if (reading.current !== turn) return;
    reading.current = null;
    setBusy(false);
    if (result === null) return;
    if (!result.ok) {
      setRefusal(`${given.name}: ${result.reason}`);
      return;
    }
    const { change, words } = takenFromFile(draft, result, file?.filled);
    const found = { ...result, name: given.name, chosen: result.proposed, taken: words, filled: change };
    choose(found, result.proposed, change);
  };
  const cancel = () => {
    reading.current?.abort();
    reading.current = null;
    setBusy(false);
    // The button that was pressed goes away.
    (buttons.current as unknown as HTMLElement | null)?.querySelector("button")?.focus();
  };
  const problem = refusal ?? error;
  const lyrics = file?.voices[file.chosen]?.lyrics;
  return (
    <View style={{ gap: 12 }}>
      <input
        ref={input}
        type="file"
        accept=".abc,.mid,.midi,.kar,.musicxml,.xml,.mxl"
        aria-label="Melody file"
        aria-describedby={problem === undefined ? undefined : noteId}
        data-testid="melody-file"
        tabIndex={-1}
        style={{ position: "absolute", width: 1, height: 1, opacity: 0, pointerEvents: "none" }}
        onChange={(event) => {
          const given = event.target.files?.[0];
          // The same file may be chosen again after it was mended.
          event.target.value = "";
          if (given) void read(given);
        }}
      />
      <View ref={buttons} style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
        <Button
          kind="secondary"
          small
          icon="file"
          label={melody ? "Choose another file" : "Choose a file"}
          busy={busy}
          onPress={() => input.current?.click()}
        />
        {busy && <Button kind="text" small label="Stop reading" onPress={cancel} />}
      </View>
      <LiveText variant="small" tone="soft">
        {busy
          ? "Reading the melody."
          : melody
            ? `${melodyWords(melody)} ${file?.taken ?? ""}`.trim()
            : "ABC, MIDI or MusicXML, at most 5 MB. It stays on this device until you save."}
      </LiveText>
      {problem !== undefined && (
        <View role="alert" nativeID={noteId} testID="melody-refusal" style={{ flexDirection: "row", gap: 5 }}>
          <Icon name="warning" size={16} color={colors.brick} />
          <Text variant="small" tone="brick" style={{ flexShrink: 1 }}>
            {problem}
          </Text>
        </View>
      )}
      {file && melody && file.cautions.length > 0 && (
        <Text variant="small" tone="soft" testID="melody-cautions">
          {file.cautions.join(" ")}
        </Text>
      )}
      {file && file.voices.length > 1 && (
        <VoiceChoice
          voices={file.voices}
          proposed={file.proposed}
          chosen={file.chosen}
          onChoose={(index) => choose(file, index)}
        />
      )}
      {melody && (
        <View style={{ gap: 8 }}>
          <MelodyPicture key={melody.source} notes={melody.notes} home={draft.home} sounding={player.at} />
          <Button
            kind="secondary"
            small
            icon={player.at === null ? "play" : "stop"}
            label={player.at === null ? "Hear the melody" : "Stop the melody"}
            onPress={() => (player.at === null ? player.play(melody.notes, 0) : player.stop())}
            style={{ alignSelf: "flex-start" }}
            testID="melody-hear"
          />
        </View>
      )}
      {lyrics && draft.chart.trim() === "" && (
        <Card style={{ gap: 8 }}>
          <Text variant="strong">This voice has words</Text>
          <Text variant="small">The chart is still empty. Take the words, then set the chords over them.</Text>
          <Button
            kind="secondary"
            small
            label="Put the words into the chart"
            onPress={() => onChange({ chart: lyricLines(lyrics).join("\n") })}
            style={{ alignSelf: "flex-start" }}
          />
        </Card>
      )}
    </View>
  );
}

function melodyWords({ source, notes }: DraftMelody): string {
  return `${notes.length} ${notes.length === 1 ? "note" : "notes"}, ${endsWords(notes)}, from ${source}.`;
}

function endsWords(notes: DraftMelody["notes"]): string {
  const midis = notes.map((note) => note.midi);
  // A file may hold many thousands of notes: too many for the arguments of one call.
  const low = midis.reduce((a, b) => Math.min(a, b), Infinity);
  const high = midis.reduce((a, b) => Math.max(a, b), -Infinity);
  return Number.isFinite(low) ? `${glyphs(noteName(low))} to ${glyphs(noteName(high))}` : "silent";
}
