import { View } from "react-native";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";

/** Dots in a row, and the most that are drawn: the notes of a long recording would say nothing as a cloud of them. */
const rowOf = 12;
const most = 72;

export interface NoteDotsProps {
  /** "Heard clearly in 14 of 16 notes." */
  words: string;
}

/** One dot a note, filled where it was heard clearly: the very numbers of the words that stand beside it. */
export function NoteDots({ words }: NoteDotsProps) {
  const [clear = 0, all = 0] = (words.match(/\d+/g) ?? []).map(Number);
  if (all === 0 || all > most) return null;
  const columns = Math.ceil(all / Math.ceil(all / rowOf));
  return (
    <View
      aria-hidden
      testID="note-dots"
      style={webStyle({ display: "grid", gridTemplateColumns: `repeat(${columns}, 9px)`, gap: 4, flexShrink: 0 })}
    >
      {Array.from({ length: all }, (_, k) => (
        <View
          key={k}
          style={{
            width: 9,
            height: 9,
            borderRadius: 5,
            borderWidth: 1.5,
            borderColor: colors.ink,
            backgroundColor: k < clear ? colors.ink : "transparent",
          }}
        />
      ))}
    </View>
  );
}
