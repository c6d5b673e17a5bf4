import { useState } from "react";
import { View } from "react-native";
import { NoteLine } from "@/features/span/NoteLine";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { tonicPitchClass } from "@/shared/music/keyName";
import { glyphs, noteName, type Spelling } from "@/shared/music/pitch";
import { NoteList } from "./NoteList";
import { movedNotes, NoteTools, withoutChosen } from "./NoteTools";
import type { NoteHistory, NoteStep } from "./noteHistory";
import { homeUnder } from "./scaleStep";

export interface TuneViewProps {
  history: NoteHistory;
  dispatch: (step: NoteStep) => void;
  home: string;
  spelling: Spelling;
  voice: SingingVoice | null;
  /** the note that sounds while the tune is played */
  sounding: number | null;
  onPlay: () => void;
}

/** Notes that are shown at a time; a longer tune is turned over like pages. */
const pageOf = 96;

/** The tune as a picture and as a list, and the tools that change it. */
export function TuneView({ history, dispatch, home, spelling, voice, sounding, onPlay }: TuneViewProps) {
  const [names, setNames] = useState<"notes" | "steps">("notes");
  const [choosingPart, setChoosingPart] = useState(false);
  const { notes, chosen } = history;
  const page = Math.floor((sounding ?? chosen?.to ?? 0) / pageOf);
  const first = page * pageOf;
  const shown = notes.slice(first, first + pageOf);
  const begin = shown[0]?.start ?? 0;
  const homeMidi = homeUnder(
    notes.map(({ midi }) => midi),
    tonicPitchClass(home),
  );
  const onPage = (range: { from: number; to: number } | null) =>
    range && { from: range.from - first, to: range.to - first };
  const choose = (range: { from: number; to: number }) => dispatch({ kind: "choose", chosen: range });
  const move = (by: number) => chosen && dispatch({ kind: "edit", notes: movedNotes(notes, chosen, by), chosen });
  const pitches = notes.map(({ midi }) => midi);
  const [low, high] = [Math.min(...pitches), Math.max(...pitches)];
  const say = (midi: number) => glyphs(noteName(midi, spelling));
  return (
    <View style={{ gap: 14 }}>
      <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", gap: 12 }}>
        <View style={{ flexGrow: 1 }}>
          <Heading level={2}>The notes</Heading>
          <Text variant="small" tone="soft" testID="melody-span">
            {`${notes.length} ${notes.length === 1 ? "note" : "notes"}, ${say(low)} to ${say(high)}, ${high - low} semitones`}
          </Text>
        </View>
        <Segmented
          label="How notes are named"
          value={names}
          options={[
            { value: "notes", label: "Names" },
            { value: "steps", label: "Steps" },
          ]}
          onChange={setNames}
        />
      </View>
      <NoteLine
        notes={shown.map((note) => ({ ...note, start: note.start - begin }))}
        home={home}
        voice={voice}
        spelling={spelling}
        chosen={onPage(sounding === null ? chosen : { from: sounding, to: sounding })}
        onPress={(index) => choose({ from: first + index, to: first + index })}
        testID="note-line"
      />
      <NoteTools
        history={history}
        dispatch={dispatch}
        chosenWords={chosenWords(history, say)}
        choosingPart={choosingPart}
        onChoosePart={setChoosingPart}
        playing={sounding !== null}
        onPlay={onPlay}
      />
      {choosingPart && (
        <Text variant="small" tone="soft">
          Press the first note of the part, then Choose a part, then its last note. With a keyboard: Shift and the arrow
          keys.
        </Text>
      )}
      <NoteList
        notes={shown}
        first={first}
        chosen={chosen}
        homeMidi={homeMidi}
        names={names}
        spelling={spelling}
        choosingPart={choosingPart}
        onChoose={choose}
        onMove={move}
        onDelete={() => chosen && dispatch(withoutChosen(notes, chosen))}
      />
      {notes.length > pageOf && (
        <View style={{ flexDirection: "row", alignItems: "center", gap: 12, flexWrap: "wrap" }}>
          <Button
            kind="secondary"
            small
            label="Earlier notes"
            disabled={first === 0}
            onPress={() => choose({ from: first - pageOf, to: first - pageOf })}
          />
          <Text variant="small" tone="soft">{`${first + 1} to ${first + shown.length} of ${notes.length}`}</Text>
          <Button
            kind="secondary"
            small
            label="Later notes"
            disabled={first + pageOf >= notes.length}
            onPress={() => choose({ from: first + pageOf, to: first + pageOf })}
          />
        </View>
      )}
      <Text variant="small" tone="soft">
        {names === "steps"
          ? "1 is the home note; a comma is an octave lower, a stroke an octave higher. Under each step stands its syllable, or its length in beats."
          : "Under each name stands its syllable, or its length in beats. Arrow keys walk along the notes and move them, Delete takes one out."}
      </Text>
    </View>
  );
}

function chosenWords({ notes, chosen }: NoteHistory, say: (midi: number) => string): string {
  const [from, to] = [chosen ? notes[chosen.from] : undefined, chosen ? notes[chosen.to] : undefined];
  if (!chosen || !from || !to) return "No note chosen";
  return chosen.from === chosen.to
    ? `Note ${chosen.from + 1}, ${say(from.midi)}`
    : `Notes ${chosen.from + 1} to ${chosen.to + 1}, ${say(from.midi)} to ${say(to.midi)}`;
}
