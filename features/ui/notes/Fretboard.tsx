import { useState } from "react";
import { Pressable, View } from "react-native";
import { fretName } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";
import { glyphs, noteName } from "@/shared/music/pitch";
import { Icon } from "../Icon";
import { IconButton } from "../IconButton";
import { Text } from "../Text";
import { colors, sizes } from "../theme";
import { webProps, webStyle } from "../webStyle";
import { neckPlaces, placeWords, type NeckPlace } from "./fretboardNotes";

/** A place that was pressed. */
interface PressedPlace {
  /** index of the string, from the bass side */
  string: number;
  /** fret from the nut, 0 = open */
  fret: number;
  midi: number;
}

/** A pressed place, and whether it was the one asked for. */
export interface MarkedPlace {
  string: number;
  fret: number;
  right: boolean;
}

export interface FretboardProps {
  instrument: Instrument;
  onPlace: (place: PressedPlace) => void;
  /** these frets and no others, without names of notes: for a question */
  only?: { firstFret: number; frets: number };
  /** a fret as a whole is pressed, as a capo lies over it */
  whole?: boolean;
  marked?: MarkedPlace | null;
  testID?: string;
}

const pageFrets = 5;
const rowHigh = sizes.target;
const fretColumn = 34;

/** The neck as the chord grids show it: nut at the top, strings from the bass side, five frets at a time. */
export function Fretboard({ instrument, onPlace, only, whole = false, marked = null, testID }: FretboardProps) {
  const [page, setPage] = useState(1);
  const first = only?.firstFret ?? page;
  const shown = only?.frets ?? pageFrets;
  const last = Math.max(1, instrument.frets - pageFrets + 1);
  const move = (by: number) => setPage(Math.max(1, Math.min(last, page + by)));
  const inOrder = neckPlaces(instrument, first, shown).map((places, string) => ({
    string,
    note: instrument.strings[string]?.note ?? "",
    places,
  }));
  const strings = instrument.leftHanded ? inOrder.reverse() : inOrder;
  const rows = Array.from({ length: shown + 1 }, (_, row) => row);
  const fretOf = (row: number) => (row === 0 ? 0 : first + row - 1);
  return (
    <View role="group" aria-label={`Neck of the ${instrument.name}`} testID={testID} style={{ gap: 8 }}>
      {!only && (
        <View style={{ flexDirection: "row", alignItems: "center", gap: 4 }}>
          <IconButton icon="up" label="Towards the nut" disabled={first <= 1} onPress={() => move(-pageFrets + 1)} />
          <Text variant="label" style={{ minWidth: 112, textAlign: "center" }}>
            {`Frets ${first} to ${Math.min(instrument.frets, first + pageFrets - 1)}`}
          </Text>
          <IconButton icon="down" label="Up the neck" disabled={first >= last} onPress={() => move(pageFrets - 1)} />
        </View>
      )}
      <View style={{ maxWidth: fretColumn + strings.length * 64 }}>
        {rows.map((row) => (
          <View
            key={row}
            style={{
              flexDirection: "row",
              height: rowHigh,
              borderBottomWidth: row === 0 ? (first === 1 ? 4 : 1.5) : 1.5,
              borderColor: row === 0 && first === 1 ? colors.ink : colors.inkSoft,
            }}
          >
            <Text
              variant="small"
              tone="soft"
              aria-hidden
              style={{ width: fretColumn, alignSelf: "center", textAlign: "center", fontWeight: "600" }}
            >
              {row === 0 ? "open" : strings.some(({ places }) => places[row]) ? fretName(instrument, fretOf(row)) : ""}
            </Text>
            {whole ? (
              <WholeFret
                strings={strings.length}
                name={row === 0 ? "No capo" : `Capo at fret ${fretName(instrument, fretOf(row))}`}
                open={row === 0}
                marked={marked?.fret === fretOf(row) ? marked.right : null}
                onPress={() => {
                  const string = strings.find(({ places }) => places[row]);
                  const place = string?.places[row];
                  if (string && place) onPlace({ string: string.string, fret: fretOf(row), midi: place.midi });
                }}
                testID={`fret-${fretOf(row)}`}
              />
            ) : (
              strings.map(({ string, note, places }) => (
                <Place
                  key={string}
                  note={note}
                  place={places[row] ?? null}
                  open={row === 0}
                  named={only === undefined}
                  marked={marked?.string === string && marked.fret === fretOf(row) ? marked.right : null}
                  onNote={(midi) => onPlace({ string, fret: fretOf(row), midi })}
                />
              ))
            )}
          </View>
        ))}
      </View>
    </View>
  );
}

const stringLine = (open: boolean) => (
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

interface PlaceProps {
  note: string;
  place: NeckPlace | null;
  open: boolean;
  /** the note's name stands there */
  named: boolean;
  /** it was pressed: whether rightly */
  marked: boolean | null;
  onNote: (midi: number) => void;
}

function Place({ note, place, open, named, marked, onNote }: PlaceProps) {
  if (!place) return <View style={{ flexGrow: 1, flexBasis: 0 }} />;
  const name = glyphs(noteName(place.midi));
  const where = placeWords(note, place);
  return (
    <Pressable
      role="button"
      aria-label={named ? `${name}. ${where}` : where}
      onPress={() => onNote(place.midi)}
      testID={`place-${note}-${place.fret}`}
      {...webProps(named ? {} : { "aria-pressed": marked !== null })}
      style={{ flexGrow: 1, flexBasis: 0, alignItems: "center", justifyContent: "center" }}
    >
      {stringLine(open)}
      {named ? (
        <View style={{ backgroundColor: colors.paper, borderRadius: 10, paddingHorizontal: 5, paddingVertical: 1 }}>
          <Text variant="small" style={{ fontWeight: open ? "600" : "500" }}>
            {name}
          </Text>
        </View>
      ) : (
        <Mark right={marked} />
      )}
    </Pressable>
  );
}

/** A pressed place: a filled dot with a tick, or a ring with a cross; an empty ring where nothing was pressed. */
function Mark({ right }: { right: boolean | null }) {
  const size = right === null ? 20 : 26;
  const color = right === null ? colors.inkSoft : right ? colors.lagoon : colors.brick;
  return (
    <View
      aria-hidden
      style={[
        {
          width: size,
          height: size,
          borderRadius: size / 2,
          borderWidth: right === null ? 1 : 2,
          borderStyle: right === false ? "dashed" : "solid",
          borderColor: color,
          backgroundColor: right === true ? color : colors.paper,
          alignItems: "center",
          justifyContent: "center",
        },
        webStyle(right === null ? { background: "var(--ground,var(--paper))" } : {}),
      ]}
    >
      {right !== null && <Icon name={right ? "check" : "close"} size={16} color={right ? colors.paper : color} />}
    </View>
  );
}

interface WholeFretProps {
  strings: number;
  name: string;
  open: boolean;
  marked: boolean | null;
  onPress: () => void;
  testID: string;
}

function WholeFret({ strings, name, open, marked, onPress, testID }: WholeFretProps) {
  return (
    <Pressable
      role="button"
      aria-label={name}
      onPress={onPress}
      testID={testID}
      {...webProps({ "aria-pressed": marked !== null })}
      style={{ flexGrow: 1, flexDirection: "row", alignItems: "center" }}
    >
      {Array.from({ length: strings }, (_, k) => (
        <View key={k} style={{ flexGrow: 1, flexBasis: 0, height: "100%" }}>
          {stringLine(open)}
        </View>
      ))}
      {marked !== null && (
        <View
          aria-hidden
          style={{
            position: "absolute",
            left: 4,
            right: 4,
            height: 24,
            borderRadius: 12,
            borderWidth: 2,
            borderStyle: marked ? "solid" : "dashed",
            borderColor: marked ? colors.lagoon : colors.brick,
            backgroundColor: marked ? colors.lagoon : colors.paper,
            alignItems: "center",
            justifyContent: "center",
          }}
        >
          <Icon name={marked ? "check" : "close"} size={16} color={marked ? colors.paper : colors.brick} />
        </View>
      )}
    </Pressable>
  );
}
