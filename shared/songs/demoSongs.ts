import type { KeyName } from "../music/keyName";
import type { MelodyNote } from "./melody";

/** A song made up for the demonstration: words, chords and tune are the project's own. */
export interface DemoSong {
  id: "lantern" | "ferry";
  title: string;
  /** chords over words */
  chart: string;
  writtenKey: KeyName;
  /** the tune of a verse and the chorus with their words, ABC notation */
  abc: string;
  /** the same notes, for those who have no need of an ABC reader; times in quarter notes */
  notes: readonly MelodyNote[];
  beatsPerBar: number;
  /** beats a minute */
  tempo: number;
}

const lanternChart = `Verse 1
D              G                D
Lantern on the slipway, burning low,
D           Bm             A
somebody is rowing home, I know,
G           D         Bm         G
four on the water and one at the oar,
D            A                D
counting the lights along the shore.

Chorus
G           D                Bm
Hold up the lantern, hold it long,
    G                 A       D
the quay is dark, the rope is strong,
G           D                Bm
hold up the lantern, hold it long,
              G           A       D
and bring the boats home, song by song.

Verse 2
D             G                    D
Mother of the slipway, strike your match,
D               Bm             A
someone left an oilskin on the latch,
G           D          Bm            G
two for the kettle and three for the stair,
D              A               D
leave them the lamp beside the chair.`;

/** Pitch and length of each note; "-" is a rest. */
const lanternNotes = `
66 0.5, 66 0.5, 64 0.5, 62 0.5, 67 0.5, 67 0.5, 66 0.5, 64 0.5, 66 3, - 1, 66 0.5, 66 0.5, 64 0.5, 62 0.5, 62
0.5, 62 0.5, 59 0.5, 59 0.5, 64 3, - 1, 67 1, 67 0.5, 67 0.5, 69 1, 69 0.5, 66 0.5, 66 1, 62 0.5, 59 0.5, 59
2, 62 1, 62 0.5, 64 0.5, 64 0.5, 61 0.5, 57 0.5, 61 0.5, 62 3, - 1, 67 1, 69 0.5, 71 0.5, 69 1, 66 1, 69 1, 69
1, 66 1.5, 64 0.5, 67 1, 67 1, 71 1.5, 69 0.5, 69 1, 64 1, 66 2, 67 1, 69 0.5, 71 0.5, 69 1, 66 1, 69 1, 69 1,
66 1, 62 1/3, 64 1/3, 66 1/3, 67 1, 71 1, 64 1, 61 1, 62 3`;

const lanternTune = `X:1
T:Lantern on the Slipway
M:4/4
L:1/8
Q:1/4=84
K:D
FFED GGFE | F6 z2 |
w: Lan-tern on the slip-way, burn-ing low,
FFED DDB,B, | E6 z2 |
w: some-bo-dy is row-ing home, I know,
G2GG A2AF | F2DB, B,4 |
w: four on the wa-ter and one at the oar,
D2DE ECA,C | D6 z2 |
w: count-ing the lights a-long the shore.
G2AB A2F2 | A2A2 F3E |
w: Hold up the lan-tern, hold it long, the
G2G2 B3A | A2E2 F4 |
w: quay is dark, the rope is strong,
G2AB A2F2 | A2A2 F2 (3DEF |
w: hold up the lan-tern, hold it long, and bring the
G2B2 E2C2 | D6 z2 |]
w: boats home, song by song.
`;

const ferryChart = `Verse 1
G            C           G
Lamps on the harbour are lit one by one,
Em          C            D
nets in the loft and the hauling is done,
G        C          G           Em
somebody whistles a tune I once knew,
    C              D          G
the half-past-nine ferry will bring me to you.

Chorus
   C           G
So slow, slow, over the bar,
D          Em              C              D
leave me a light where you are, where you are;
G           C             G           Em
count every bell till the last one is through,
    C              D          G
the half-past-nine ferry will bring me to you.

Verse 2
G           C            G
Rope on the bollard goes round and goes round,
Em           C             D
boots on the boards make a homecoming sound,
G            C          G            Em
rain on your collar and salt on your sleeve,
    C      D         G
and nobody here in a hurry to leave.

Verse 3
G            C           G
Say what you like of the towns further on,
Em          C             D
I have been there and the welcome was gone;
G          C           G           Em
one yellow window, one kettle, one door,
        C              D          G
and the half-past-nine ferry puts in at your shore.`;

/** Pitch and length of each note; "-" is a rest. */
const ferryNotes = `
71 1, 71 1, 69 1, 72 1, 71 1, 69 1, 71 1, 69 1, 67 1, 74 3, 64 1, 64 1, 67 1, 67 1, 64 1, 62 1, 66 1, 62 1, 66
1, 69 3, 71 1, 72 1, 74 1, 76 1, 76 1, 74 1, 74 1, 72 1, 71 1, 71 2, 69 1, 72 1, 71 1, 69 1, 69 1, 67 1, 66 1,
67 1, 64 1, 62 1, 67 2, 74 1, 76 3, 72 3, 74 1, 72 1, 71 1, 74 3, 69 1, 71 1, 69 1, 67 1, 69 1, 71 1, 72 1, 71
1, 67 1, 69 3, 71 1, 72 1, 74 1, 76 1, 74 1, 72 1, 74 1, 71 1, 67 1, 71 2, 69 1, 72 1, 71 1, 69 1, 69 1, 67 1,
66 1, 67 1, 64 1, 62 1, 67 3`;

const ferryTune = `X:1
T:The Half-Past-Nine Ferry
M:3/4
L:1/4
Q:1/4=92
K:G
BBA | cBA | BAG | d3 |
w: Lamps on the har-bour are lit one by one,
EEG | GED | FDF | A3 |
w: nets in the loft and the haul-ing is done,
Bcd | eed | dcB | B2A |
w: some-bo-dy whis-tles a tune I once knew, the
cBA | AGF | GED | G2d |
w: half-past-nine fer-ry will bring me to you. So
e3 | c3 | dcB | d3 |
w: slow, slow, o-ver the bar,
ABA | GAB | cBG | A3 |
w: leave me a light where you are, where you are;
Bcd | edc | dBG | B2A |
w: count ev-ery bell till the last one is through, the
cBA | AGF | GED | G3 |]
w: half-past-nine fer-ry will bring me to you.
`;

/** The songs a visitor finds on the shelf, first the one the tour begins with. */
export const demoSongs: readonly DemoSong[] = [
  {
    id: "lantern",
    title: "Lantern on the Slipway",
    chart: lanternChart,
    writtenKey: { tonic: "D", mode: "major" },
    abc: lanternTune,
    notes: laid(lanternNotes),
    beatsPerBar: 4,
    tempo: 84,
  },
  {
    id: "ferry",
    title: "The Half-Past-Nine Ferry",
    chart: ferryChart,
    writtenKey: { tonic: "G", mode: "major" },
    abc: ferryTune,
    notes: laid(ferryNotes),
    beatsPerBar: 3,
    tempo: 92,
  },
];

function laid(line: string): MelodyNote[] {
  let start = 0;
  const notes: MelodyNote[] = [];
  for (const sign of line.split(",")) {
    const [pitch, length] = sign.trim().split(/\s+/);
    const duration = length === "1/3" ? 1 / 3 : Number(length);
    if (pitch !== "-") notes.push({ start, duration, midi: Number(pitch) });
    start += duration;
  }
  return notes;
}
