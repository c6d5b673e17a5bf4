import { useId } from "react";
import { Pressable, View } from "react-native";
import { ChordGrid } from "@/features/ui/ChordGrid";
import { gridWidth, nameLines } from "@/features/ui/chordGridGeometry";
import { Icon } from "@/features/ui/Icon";
import { RadioDot } from "@/features/ui/RadioDot";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webProps, webStyle } from "@/features/ui/webStyle";
import type { Instrument } from "@/shared/instruments/instrument";
import { fretName } from "@/shared/instruments/frets";
import { parseChord } from "@/shared/music/chord";
import { glyphs } from "@/shared/music/pitch";
import type { Way, WayChord } from "@/shared/ways/way";

export interface WayCardProps {
  way: Way;
  instrument: Instrument;
  chosen: boolean;
  /** keyboard and focus of this one button of the group */
  radio: object;
  onChoose: () => void;
}

/** One way: what to do, what it costs, the shapes, and what to take care of. */
export function WayCard({ way, instrument, chosen, radio, onChoose }: WayCardProps) {
  const id = useId();
  const moved = way.retune !== 0 || way.capo !== 0;
  const column = Math.max(80, gridWidth(instrument.strings.length) + 8);
  const lines = Math.max(1, ...way.chords.map(({ played }) => nameLines(glyphs(played)).length));
  return (
    <>
      <Pressable
        role="radio"
        aria-checked={chosen}
        aria-labelledby={`${id}-title`}
        onPress={onChoose}
        {...webProps({ ...radio, "aria-describedby": `${id}-cost` })}
        style={{ flexDirection: "row", gap: 12, justifyContent: "space-between", minHeight: 44 }}
      >
        <View style={{ flexShrink: 1 }}>
          <Text variant="strong" nativeID={`${id}-title`} style={{ lineHeight: 20 }}>
            {way.title}
          </Text>
          <Text variant="small" tone="soft" nativeID={`${id}-cost`} style={{ lineHeight: 19, marginTop: 2 }}>
            {way.cost}
          </Text>
        </View>
        <RadioDot on={chosen} />
      </Pressable>
      <View
        style={webStyle({
          display: "grid",
          gridTemplateColumns: `repeat(auto-fill, minmax(${column}px, 1fr))`,
          rowGap: 10,
          marginTop: 6,
        })}
      >
        {way.chords.map((chord) => (
          <Grid key={chord.written} chord={chord} way={way} instrument={instrument} moved={moved} lines={lines} />
        ))}
      </View>
      {way.cautions.length > 0 && <Cautions texts={way.cautions} />}
    </>
  );
}

function Grid({
  chord,
  way,
  instrument,
  moved,
  lines,
}: {
  chord: WayChord;
  way: Way;
  instrument: Instrument;
  moved: boolean;
  /** how many lines the names of this card take */
  lines: number;
}) {
  const sounds = moved ? { sounds: glyphs(chord.sounding) } : null;
  if (chord.shape)
    return (
      <View style={{ alignItems: "center" }}>
        <ChordGrid
          name={glyphs(chord.played)}
          shape={chord.shape}
          strings={instrument.strings.length}
          capo={way.capo}
          leftHanded={instrument.leftHanded}
          nameHeight={lines}
          stringNames={instrument.strings.map(({ note }, index) => way.strings[index]?.to ?? note)}
          {...(instrument.fretMap && way.capo === 0 ? { fretNames: fretNames(instrument) } : null)}
          {...sounds}
        />
      </View>
    );
  return (
    <View style={{ alignItems: "center", gap: 6 }}>
      <Text variant="monoBold" style={{ fontSize: 14, lineHeight: 18 }}>
        {glyphs(chord.played)}
      </Text>
      {parseChord(chord.played) && (
        <Text variant="tiny" tone="brick" style={{ textAlign: "center" }}>
          No shape on this instrument
        </Text>
      )}
    </View>
  );
}

function Cautions({ texts }: { texts: readonly string[] }) {
  return (
    <View style={{ borderTopWidth: 1, borderColor: colors.line, marginTop: 8, paddingTop: 8, gap: 6 }}>
      {texts.map((text) => (
        <View key={text} style={{ flexDirection: "row", gap: 8 }}>
          <Icon name="warning" size={20} color={colors.honeyText} />
          <Text variant="tiny" style={{ flexShrink: 1 }}>
            {text}
          </Text>
        </View>
      ))}
    </View>
  );
}

/** What players call the frets, from the nut: "6½" stands between 6 and 7 on a diatonic fretboard. */
function fretNames(instrument: Instrument): string[] {
  return Array.from({ length: instrument.frets + 1 }, (_, fret) => fretName(instrument, fret));
}
