import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
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
const notes = `
71 1, 71 1, 69 1, 72 1, 71 1, 69 1, 71 1, 69 1, 67 1, 74 3, 64 1, 64 1, 67 1, 67 1, 64 1, 62 1, 66 1, 62 1, 66
1, 69 3, 71 1, 72 1, 74 1, 76 1, 76 1, 74 1, 74 1, 72 1, 71 1, 71 2, 69 1, 72 1, 71 1, 69 1, 69 1, 67 1, 66 1,
67 1, 64 1, 62 1, 67 2, 74 1, 76 3, 72 3, 74 1, 72 1, 71 1, 74 3, 69 1, 71 1, 69 1, 67 1, 69 1, 71 1, 72 1, 71
1, 67 1, 69 3, 71 1, 72 1, 74 1, 76 1, 74 1, 72 1, 74 1, 71 1, 67 1, 71 2, 69 1, 72 1, 71 1, 69 1, 69 1, 67 1,
66 1, 67 1, 64 1, 62 1, 67 3`;

const abc = `X:1
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

/** A waltz over eight notes and a bit. */
export const halfPastNineFerry: DemoSong = {
  id: "ferry",
  title: "The Half-Past-Nine Ferry",
  chart,
  writtenKey: { tonic: "G", mode: "major" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 3,
  barLength: 3,
  tempo: 92,
};
