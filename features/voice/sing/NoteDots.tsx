import { View } from "react-native";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";

export interface NoteDotsProps {
  clear: number;
  all: number;
}

/** One dot a note, filled where it was heard clearly; the words stand beside it. */
export function NoteDots({ clear, all }: NoteDotsProps) {
  const columns = Math.min(12, Math.max(8, Math.ceil(all / 2)));
  return (
    <View
      aria-hidden
      style={webStyle({ display: "grid", gridTemplateColumns: `repeat(${columns}, 9px)`, gap: 4, flexShrink: 0 })}
    >
      {Array.from({ length: Math.min(all, 3 * columns) }, (_, k) => (
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
