import { useEffect, useRef, type ReactNode } from "react";
import { Pressable, ScrollView, View } from "react-native";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import { colors, sizes } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webProps } from "@/features/ui/webStyle";
import { parseNoteName } from "@/shared/music/pitch";
import type { ByHandFields } from "./byHand";
import { noteWord } from "../noteWords";

export interface NoteLadderProps {
  values: ByHandFields;
  /** the field that a tap fills */
  active: keyof ByHandFields;
  onActive: (name: keyof ByHandFields) => void;
  onNote: (midi: number) => void;
  /** moves the chosen note by a semitone; where each field has its own, null */
  steps: ReactNode;
}

const top = 84;
const bottom = 36;
const rungs = Array.from({ length: top - bottom + 1 }, (_, k) => top - k);
const rungHeight = 28;
/** On a phone the fields before and the button below take their room. */
const shownHeight = { phone: 9 * rungHeight, other: 16 * rungHeight };

const targets = [
  { value: "lowest", label: "Lowest" },
  { value: "highest", label: "Highest" },
  { value: "comfortLow", label: "Comfort low" },
  { value: "comfortTop", label: "Comfort top" },
] as const;

/** All semitones from C2 to C6, one under the other, to tap instead of typing. */
export function NoteLadder({ values, active, onActive, onNote, steps }: NoteLadderProps) {
  const scroll = useRef<ScrollView>(null);
  const shown = useLayout() === "phone" ? shownHeight.phone : shownHeight.other;
  const low = parseNoteName(values.lowest);
  const high = parseNoteName(values.highest);
  const chosen = parseNoteName(values[active]);
  const first = useRef(chosen ?? high ?? 60);
  useEffect(() => {
    scroll.current?.scrollTo({ y: (top - first.current) * rungHeight - shown / 2, animated: false });
  }, [shown]);
  return (
    <View style={{ gap: 8 }}>
      <View style={{ flexDirection: "row", alignItems: "center", minHeight: steps ? 48 : 0 }}>
        <Text variant="label" style={{ flexGrow: 1 }}>
          Or tap the notes
        </Text>
        {steps}
      </View>
      <Segmented label="Which note a tap sets" options={targets} value={active} onChange={onActive} />
      <ScrollView
        ref={scroll}
        style={{
          height: shown,
          borderWidth: 1,
          borderColor: colors.line,
          borderRadius: sizes.radius,
          backgroundColor: colors.card,
        }}
      >
        {rungs.map((midi) => {
          const natural = noteWord(midi).length === 2;
          const inRange = low !== null && high !== null && midi >= low && midi <= high;
          const on = midi === chosen;
          return (
            <Pressable
              key={midi}
              role="button"
              aria-label={noteWord(midi)}
              {...webProps({ "aria-pressed": on })}
              onPress={() => onNote(midi)}
              style={{ height: rungHeight, flexDirection: "row", alignItems: "center", paddingHorizontal: 12, gap: 12 }}
            >
              <Text
                variant="label"
                tone={on ? "plum" : natural ? "ink" : "soft"}
                style={{ width: 44, textAlign: "right", fontWeight: on ? "600" : "500" }}
              >
                {noteWord(midi)}
              </Text>
              <View
                style={{ width: 28, height: rungHeight, backgroundColor: inRange ? colors.lagoon : "transparent" }}
              />
              <View
                style={{
                  flexGrow: 1,
                  height: 1,
                  backgroundColor: natural ? colors.inkSoft : colors.line,
                  opacity: natural ? 0.5 : 1,
                }}
              />
              {on && <View style={{ width: 12, height: 12, borderRadius: 6, backgroundColor: colors.plum }} />}
            </Pressable>
          );
        })}
      </ScrollView>
    </View>
  );
}
