import { useId, useRef, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Icon } from "@/features/ui/Icon";
import { LiveText } from "@/features/ui/LiveText";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { glyphs, noteName } from "@/shared/music/pitch";
import type { MelodyVoice } from "@/shared/songs/melodyVoice";
import { readSongFile } from "./readSongFile";
import type { DraftMelody, SongDraft } from "../editor/songDraft";

export interface MelodyFileFieldProps {
  melody: DraftMelody | null;
  error: string | undefined;
  onChange: (change: Partial<SongDraft>) => void;
}

/** A melody from a file: choose it, see what came out, choose among several voices. */
export function MelodyFileField({ melody, error, onChange }: MelodyFileFieldProps) {
  const input = useRef<HTMLInputElement>(null);
  const noteId = useId();
  const [reading, setReading] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [file, setFile] = useState<{ name: string; voices: MelodyVoice[]; chosen: number } | null>(null);

  const choose = (name: string, voices: MelodyVoice[], chosen: number) => {
    const voice = voices[chosen];
    if (!voice) return;
    setFile({ name, voices, chosen });
    const source = voices.length > 1 ? `${name}, ${voice.name}` : name;
    onChange({ melody: { source, notes: voice.melody.notes }, home: voice.melody.home ?? "" });
  };
  const read = async (given: File) => {
    setReading(true);
    setRefusal(null);
    const result = await readSongFile(given);
    setReading(false);
    if (result.ok) choose(given.name, result.voices, result.proposed);
    else setRefusal(`${given.name}: ${result.reason}`);
  };
  const problem = refusal ?? error;
  return (
    <View style={{ gap: 10 }}>
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
      <Button
        kind="secondary"
        small
        icon="file"
        label={melody ? "Choose another file" : "Choose a file"}
        busy={reading}
        onPress={() => input.current?.click()}
        style={{ alignSelf: "flex-start" }}
      />
      <LiveText variant="small" tone="soft">
        {reading
          ? "Reading the melody."
          : melody
            ? melodyWords(melody)
            : "ABC, MIDI or MusicXML, at most 5 MB. It stays on this device until you save."}
      </LiveText>
      {file && file.voices.length > 1 && (
        <Select
          label="Which voice is sung"
          testID="melody-voice"
          value={String(file.chosen)}
          options={file.voices.map((voice, index) => ({ value: String(index), label: voiceWords(voice, index) }))}
          onChange={(value) => choose(file.name, file.voices, Number(value))}
        />
      )}
      {problem !== undefined && (
        <View role="alert" nativeID={noteId} testID="melody-refusal" style={{ flexDirection: "row", gap: 5 }}>
          <Icon name="warning" size={16} color={colors.brick} />
          <Text variant="small" tone="brick" style={{ flexShrink: 1 }}>
            {problem}
          </Text>
        </View>
      )}
    </View>
  );
}

function melodyWords({ source, notes }: DraftMelody): string {
  return `${notes.length} ${notes.length === 1 ? "note" : "notes"}, ${endsWords(notes)}, from ${source}.`;
}

function voiceWords(voice: MelodyVoice, index: number): string {
  const { notes } = voice.melody;
  return `${voice.name || `Voice ${index + 1}`}, ${notes.length} notes, ${endsWords(notes)}`;
}

function endsWords(notes: DraftMelody["notes"]): string {
  const midis = notes.map((note) => note.midi);
  // A file may hold many thousands of notes: too many for the arguments of one call.
  const low = midis.reduce((a, b) => Math.min(a, b), Infinity);
  const high = midis.reduce((a, b) => Math.max(a, b), -Infinity);
  return Number.isFinite(low) ? `${glyphs(noteName(low))} to ${glyphs(noteName(high))}` : "silent";
}
