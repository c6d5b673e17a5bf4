import type { KeyName } from "../music/keyName";

/** A song made up for the demonstration: words, chords and tune are the project's own. */
export interface DemoSong {
  id: "lantern" | "ferry";
  title: string;
  /** chords over words */
  chart: string;
  writtenKey: KeyName;
  /** the tune of a verse and the chorus with their words, ABC notation */
  abc: string;
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
    beatsPerBar: 4,
    tempo: 84,
  },
  {
    id: "ferry",
    title: "The Half-Past-Nine Ferry",
    chart: ferryChart,
    writtenKey: { tonic: "G", mode: "major" },
    abc: ferryTune,
    beatsPerBar: 3,
    tempo: 92,
  },
];
