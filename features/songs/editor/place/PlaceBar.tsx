import { useState, type CSSProperties } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { IconButton } from "@/features/ui/IconButton";
import { LiveText } from "@/features/ui/LiveText";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { glyphs } from "@/shared/music/pitch";
import type { PaletteChord } from "./palette";
import type { Placing } from "./usePlacing";

/** The chosen place and the chords to put there, in reach of the thumb. */
export function PlaceBar({ placing }: { placing: Placing }) {
  const [other, setOther] = useState<string | null>(null);
  const { palette, cell, words, refusal, place, nudge, remove } = placing;
  const standing = cell?.chord?.text ?? null;
  const putOther = () => {
    if (other !== null && place(other)) setOther(null);
  };
  return (
    <View testID="place-bar" style={{ gap: 6 }}>
      <View style={{ flexDirection: "row", alignItems: "center", minHeight: 48, gap: 2 }}>
        <View style={{ flexGrow: 1, flexShrink: 1 }}>
          <LiveText variant="small" tone={refusal ? "honey" : cell ? "ink" : "soft"} testID="place-words">
            {refusal ?? words}
          </LiveText>
        </View>
        {standing !== null && (
          <>
            <IconButton
              icon="back"
              label="Move the chord one letter left"
              onPress={() => nudge(-1)}
              testID="nudge-left"
            />
            <IconButton
              icon="forward"
              label="Move the chord one letter right"
              onPress={() => nudge(1)}
              testID="nudge-right"
            />
            <IconButton icon="trash" label="Take the chord away" onPress={remove} testID="remove-chord" />
          </>
        )}
      </View>
      {other !== null && (
        <div
          onKeyDown={(event) => {
            if (event.key !== "Enter") return;
            event.preventDefault();
            putOther();
          }}
          style={{ display: "flex", gap: 8, alignItems: "flex-end" }}
        >
          <div style={{ flexGrow: 1, minWidth: 0 }}>
            <Field label="Another chord" value={other} onChangeText={setOther} autoFocus mono testID="other-chord" />
          </div>
          <Button small label="Put it there" onPress={putOther} testID="put-other" />
        </div>
      )}
      <div role="group" aria-label="Chords" style={strip} data-testid="palette">
        {palette.own.map((chord) => (
          <PaletteButton key={chord.text} chord={chord} on={chord.text === standing} onPress={place} />
        ))}
        {palette.own.length > 0 && palette.others.length > 0 && (
          <span aria-hidden style={{ flex: "none", width: 1, background: colors.line, margin: "8px 2px" }} />
        )}
        {palette.others.map((chord) => (
          <PaletteButton key={chord.text} chord={chord} on={chord.text === standing} quiet onPress={place} />
        ))}
        <Button
          kind="text"
          small
          label="Other…"
          expanded={other !== null}
          onPress={() => setOther(other === null ? "" : null)}
          testID="other"
          style={{ flexShrink: 0 }}
        />
      </div>
    </View>
  );
}

interface PaletteButtonProps {
  chord: PaletteChord;
  on: boolean;
  quiet?: boolean;
  onPress: (symbol: string) => void;
}

function PaletteButton({ chord: { text, roman }, on, quiet = false, onPress }: PaletteButtonProps) {
  const line = on ? colors.plum : quiet ? colors.line : colors.inkSoft;
  return (
    <button
      type="button"
      aria-pressed={on}
      onClick={() => onPress(text)}
      style={{
        position: "relative",
        flex: "none",
        minWidth: 52,
        minHeight: 52,
        padding: "4px 10px",
        borderRadius: 12,
        border: `1.5px solid ${line}`,
        background: on ? colors.plum : colors.card,
        color: on ? colors.onPlum : quiet ? colors.inkSoft : colors.ink,
        cursor: "pointer",
        display: "flex",
        flexDirection: "column",
        alignItems: "center",
        justifyContent: "center",
      }}
    >
      <span aria-hidden style={{ font: `600 16px/20px ${fonts.mono}` }}>
        {setSigns(glyphs(text))}
      </span>
      {roman !== null && (
        <span aria-hidden style={{ font: `400 12px/15px ${fonts.text}`, color: on ? colors.onPlum : colors.inkSoft }}>
          {setSigns(glyphs(roman))}
        </span>
      )}
      <span style={unseen}>{roman === null ? glyphs(text) : `${glyphs(text)}, ${glyphs(roman)}`}</span>
    </button>
  );
}

const strip: CSSProperties = {
  display: "flex",
  gap: 8,
  overflowX: "auto",
  padding: "4px",
  margin: "0 -4px",
  scrollbarWidth: "thin",
};
