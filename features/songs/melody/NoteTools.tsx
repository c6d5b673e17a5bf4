import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { IconButton } from "@/features/ui/IconButton";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { deleteNote, mergeWithNext, moveNote, setLength, splitNote } from "@/shared/songs/noteEdits";
import type { MelodyNote } from "@/shared/songs/melody";
import { nextLength } from "./lengthWords";
import type { Chosen, NoteHistory, NoteStep } from "./noteHistory";

export interface NoteToolsProps {
  history: NoteHistory;
  dispatch: (step: NoteStep) => void;
  /** the chosen notes in words, such as "E4" or "E4 to G4" */
  chosenWords: string;
  choosingPart: boolean;
  onChoosePart: (on: boolean) => void;
  playing: boolean;
  onPlay: () => void;
}

/** The chosen notes moved by semitones. */
export function movedNotes(notes: readonly MelodyNote[], { from, to }: NonNullable<Chosen>, by: number) {
  let moved: readonly MelodyNote[] = notes;
  for (let index = from; index <= to; index += 1) moved = moveNote(moved, index, by);
  return moved;
}

/** The notes without the chosen ones; the one behind them is chosen next. */
export function withoutChosen(notes: readonly MelodyNote[], { from, to }: NonNullable<Chosen>): NoteStep {
  let left: readonly MelodyNote[] = notes;
  for (let index = to; index >= from; index -= 1) left = deleteNote(left, index);
  return { kind: "edit", notes: left, chosen: { from, to: from } };
}

/** What can be done with the chosen notes, and the way back. */
export function NoteTools({
  history,
  dispatch,
  chosenWords,
  choosingPart,
  onChoosePart,
  playing,
  onPlay,
}: NoteToolsProps) {
  const { notes, chosen, past, future } = history;
  const one = chosen !== null && chosen.from === chosen.to ? chosen.from : null;
  const edit = (edited: readonly MelodyNote[]) => dispatch({ kind: "edit", notes: edited, chosen });
  const length = (by: 1 | -1) => {
    const note = one === null ? undefined : notes[one];
    if (one !== null && note) edit(setLength(notes, one, nextLength(note.duration, by)));
  };
  const words = (label: string, onPress: () => void, disabled: boolean, testID: string) => (
    <Button kind="secondary" small label={label} disabled={disabled} onPress={onPress} testID={testID} />
  );
  return (
    <View role="toolbar" aria-label="Change the chosen notes" style={{ gap: 8 }}>
      <View style={{ flexDirection: "row", alignItems: "center", gap: 4, flexWrap: "wrap" }}>
        <Text variant="strong" style={{ flexGrow: 1, minWidth: 96 }} testID="chosen-notes">
          {chosenWords}
        </Text>
        <IconButton
          icon={playing ? "stop" : "play"}
          label={playing ? "Stop playing" : "Play from the chosen note"}
          onPress={onPlay}
          color={colors.plum}
          testID="play-tune"
        />
        <IconButton
          icon="up"
          label="A semitone higher"
          disabled={!chosen}
          onPress={() => chosen && edit(movedNotes(notes, chosen, 1))}
          testID="note-up"
        />
        <IconButton
          icon="down"
          label="A semitone lower"
          disabled={!chosen}
          onPress={() => chosen && edit(movedNotes(notes, chosen, -1))}
          testID="note-down"
        />
        <IconButton
          icon="trash"
          label="Take the chosen notes out"
          disabled={!chosen}
          onPress={() => chosen && dispatch(withoutChosen(notes, chosen))}
          testID="note-delete"
        />
      </View>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 8 }}>
        {words("Shorter", () => length(-1), one === null, "note-shorter")}
        {words("Longer", () => length(1), one === null, "note-longer")}
        {words("Split", () => one !== null && edit(splitNote(notes, one)), one === null, "note-split")}
        {words(
          "Join with next",
          () => one !== null && edit(mergeWithNext(notes, one)),
          one === null || one >= notes.length - 1,
          "note-join",
        )}
        {words(
          choosingPart ? "Choose one note" : "Choose a part",
          () => onChoosePart(!choosingPart),
          notes.length < 2,
          "choose-part",
        )}
        {words("Undo", () => dispatch({ kind: "undo" }), past.length === 0, "note-undo")}
        {words("Redo", () => dispatch({ kind: "redo" }), future.length === 0, "note-redo")}
      </View>
    </View>
  );
}
