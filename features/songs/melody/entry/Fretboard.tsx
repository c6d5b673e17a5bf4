import { useState } from "react";
import { Pressable, View } from "react-native";
import { IconButton } from "@/features/ui/IconButton";
import { Text } from "@/features/ui/Text";
import { colors, sizes } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import type { Instrument } from "@/shared/instruments/instrument";
import { glyphs, noteName } from "@/shared/music/pitch";
import { neckPlaces, placeWords, type NeckPlace } from "./fretboardNotes";

export interface FretboardProps {
  instrument: Instrument;
  onNote: (midi: number) => void;
  testID?: string;
}

const shownFrets = 5;
const rowHigh = sizes.target;
const fretColumn = 34;

/** The neck as the chord grids show it: nut at the top, strings from the bass side, five frets at a time. */
export function Fretboard({ instrument, onNote, testID }: FretboardProps) {
  const [first, setFirst] = useState(1);
  const last = Math.max(1, instrument.frets - shownFrets + 1);
  const move = (by: number) => setFirst(Math.max(1, Math.min(last, first + by)));
  const inOrder = neckPlaces(instrument, first, shownFrets).map((places, index) => ({
    note: instrument.strings[index]?.note ?? "",
    places,
  }));
  const strings = instrument.leftHanded ? inOrder.reverse() : inOrder;
  const rows = Array.from({ length: shownFrets + 1 }, (_, row) => row);
  return (
    <View role="group" aria-label={`Neck of the ${instrument.name}`} testID={testID} style={{ gap: 8 }}>
      <View style={{ flexDirection: "row", alignItems: "center", gap: 4 }}>
        <IconButton icon="up" label="Towards the nut" disabled={first <= 1} onPress={() => move(-shownFrets + 1)} />
        <Text variant="label" style={{ minWidth: 112, textAlign: "center" }}>
          {`Frets ${first} to ${Math.min(instrument.frets, first + shownFrets - 1)}`}
        </Text>
        <IconButton icon="down" label="Up the neck" disabled={first >= last} onPress={() => move(shownFrets - 1)} />
      </View>
      <View style={{ maxWidth: fretColumn + strings.length * 64 }}>
        {rows.map((row) => (
          <View
            key={row}
            style={{
              flexDirection: "row",
              height: rowHigh,
              borderBottomWidth: row === 0 ? (first === 1 ? 4 : 1.5) : 1.5,
              borderColor: row === 0 && first === 1 ? colors.ink : colors.inkSoft,
              marginLeft: 0,
            }}
          >
            <Text
              variant="small"
              tone="soft"
              aria-hidden
              style={{ width: fretColumn, alignSelf: "center", textAlign: "center", fontWeight: "600" }}
            >
              {row === 0 ? "open" : (strings.find(({ places }) => places[row])?.places[row]?.fret ?? "")}
            </Text>
            {strings.map(({ note, places }, index) => (
              <Place key={index} note={note} place={places[row] ?? null} open={row === 0} onNote={onNote} />
            ))}
          </View>
        ))}
      </View>
    </View>
  );
}

interface PlaceProps {
  note: string;
  place: NeckPlace | null;
  open: boolean;
  onNote: (midi: number) => void;
}

function Place({ note, place, open, onNote }: PlaceProps) {
  const line = (
    <View
      aria-hidden
      style={webStyle({
        position: "absolute",
        top: open ? "72%" : 0,
        bottom: 0,
        left: "50%",
        width: 1.5,
        backgroundColor: "var(--inkSoft)",
      })}
    />
  );
  if (!place) return <View style={{ flexGrow: 1, flexBasis: 0 }} />;
  const name = glyphs(noteName(place.midi));
  return (
    <Pressable
      role="button"
      aria-label={`${name}. ${placeWords(note, place)}`}
      onPress={() => onNote(place.midi)}
      testID={`place-${note}-${place.fret}`}
      style={{ flexGrow: 1, flexBasis: 0, alignItems: "center", justifyContent: "center" }}
    >
      {line}
      <View style={{ backgroundColor: colors.paper, borderRadius: 10, paddingHorizontal: 5, paddingVertical: 1 }}>
        <Text variant="small" style={{ fontWeight: open ? "600" : "500" }}>
          {name}
        </Text>
      </View>
    </Pressable>
  );
}
