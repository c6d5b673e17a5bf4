import { useEffect, useRef } from "react";
import { Pressable, View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { webProps, webStyle } from "@/features/ui/webStyle";
import { glyphs, noteName, type Spelling } from "@/shared/music/pitch";
import type { MelodyNote } from "@/shared/songs/melody";
import { lengthSign, lengthWords } from "./lengthWords";
import type { Chosen } from "./noteHistory";
import { stepName, stepSpoken } from "./scaleStep";

export interface NoteListProps {
  notes: readonly MelodyNote[];
  /** number of the first shown note in the whole tune */
  first: number;
  chosen: Chosen;
  homeMidi: number;
  names: "notes" | "steps";
  spelling: Spelling;
  /** a press chooses one note; while a part is being chosen it reaches from the first to the pressed one */
  onChoose: (chosen: NonNullable<Chosen>) => void;
  choosingPart: boolean;
  onMove: (semitones: number) => void;
  onDelete: () => void;
}

type Key = { key: string; shiftKey: boolean; preventDefault: () => void };

/** The tune as a row of notes to choose from; arrow keys walk along it and move notes, Delete takes them out. */
export function NoteList({
  notes,
  first,
  chosen,
  homeMidi,
  names,
  spelling,
  onChoose,
  choosingPart,
  onMove,
  onDelete,
}: NoteListProps) {
  const items = useRef(new Map<number, View>());
  const walking = useRef(false);
  const head = chosen?.to ?? first;
  useEffect(() => {
    if (walking.current) items.current.get(head)?.focus();
    walking.current = false;
  }, [head]);
  const last = first + notes.length - 1;
  const onKeyDown = (event: Key) => {
    const by = { ArrowRight: 1, ArrowLeft: -1 }[event.key];
    const up = { ArrowUp: 1, ArrowDown: -1 }[event.key];
    if (by !== undefined) {
      const to = Math.max(first, Math.min(last, head + by));
      walking.current = true;
      onChoose(event.shiftKey || choosingPart ? { from: Math.min(chosen?.from ?? to, to), to } : { from: to, to });
    } else if (up !== undefined) onMove(event.shiftKey ? 12 * up : up);
    else if (event.key === "Delete" || event.key === "Backspace") onDelete();
    else return;
    event.preventDefault();
  };
  return (
    <View
      aria-label="Notes of the tune"
      testID="note-list"
      {...webProps({ role: "listbox", "aria-multiselectable": true, "aria-orientation": "horizontal", onKeyDown })}
      style={{ flexDirection: "row", flexWrap: "wrap", gap: 6 }}
    >
      {notes.map((note, place) => {
        const index = first + place;
        const picked = chosen !== null && index >= chosen.from && index <= chosen.to;
        const [name, step] = [glyphs(noteName(note.midi, spelling)), stepName(note.midi, homeMidi)];
        const shown = names === "notes" ? name : step;
        const under = note.lyric ?? lengthSign(note.duration);
        return (
          <Pressable
            key={index}
            ref={(item) => {
              if (item) items.current.set(index, item as unknown as View);
              else items.current.delete(index);
            }}
            role="option"
            aria-selected={picked}
            testID={`note-${index}`}
            onPress={() =>
              onChoose(
                choosingPart && chosen
                  ? { from: Math.min(chosen.from, index), to: Math.max(chosen.from, index) }
                  : { from: index, to: index },
              )
            }
            {...webProps({ tabIndex: index === head || (chosen === null && place === 0) ? 0 : -1 })}
            style={{
              minWidth: 48,
              height: 52,
              paddingHorizontal: 8,
              alignItems: "center",
              justifyContent: "center",
              borderRadius: 10,
              borderWidth: picked ? 2 : 1,
              borderColor: picked ? colors.plum : colors.line,
              backgroundColor: picked ? "var(--selected)" : colors.card,
            }}
          >
            <Text variant="monoBold" style={{ fontSize: 15, lineHeight: 20 }} testID={`note-name-${index}`}>
              {shown}
            </Text>
            <Text variant="tiny" tone="soft" numberOfLines={1} style={{ maxWidth: 72 }}>
              {under}
            </Text>
            <Text
              style={webStyle(unseen)}
            >{`. Note ${index + 1}, ${names === "notes" ? `step ${stepSpoken(note.midi, homeMidi)}` : name}, ${lengthWords(note.duration)}`}</Text>
          </Pressable>
        );
      })}
    </View>
  );
}
