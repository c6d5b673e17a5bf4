import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const firstVerse = `Verse 1
D              G                D
Lantern on the slipway, burning low,
D           Bm             A
somebody is rowing home, I know,
G           D         Bm         G
four on the water and one at the oar,
D            A                D
counting the lights along the shore.`;

const chorus = `Chorus
G           D                Bm
Hold up the lantern, hold it long,
    G                 A       D
the quay is dark, the rope is strong,
G           D                Bm
hold up the lantern, hold it long,
              G           A       D
and bring the boats home, song by song.`;

const secondVerse = `Verse 2
D             G                    D
Mother of the slipway, strike your match,
D               Bm             A
someone left an oilskin on the latch,
G           D          Bm            G
two for the kettle and three for the stair,
D              A               D
leave them the lamp beside the chair.`;

const chart = [firstVerse, chorus, secondVerse].join("\n\n");

/** The class began with three chords and one verse. */
const earlier = [
  { chart: [firstVerse, chorus].join("\n\n").replaceAll("Bm", "G "), days: 7 },
  { chart: [firstVerse, chorus].join("\n\n"), days: 7 },
];

/** Pitch and length of each note; "-" is a rest. */
const notes = `
66 0.5, 66 0.5, 64 0.5, 62 0.5, 67 0.5, 67 0.5, 66 0.5, 64 0.5, 66 3, - 1, 66 0.5, 66 0.5, 64 0.5, 62 0.5, 62
0.5, 62 0.5, 59 0.5, 59 0.5, 64 3, - 1, 67 1, 67 0.5, 67 0.5, 69 1, 69 0.5, 66 0.5, 66 1, 62 0.5, 59 0.5, 59
2, 62 1, 62 0.5, 64 0.5, 64 0.5, 61 0.5, 57 0.5, 61 0.5, 62 3, - 1, 67 1, 69 0.5, 71 0.5, 69 1, 66 1, 69 1, 69
1, 66 1.5, 64 0.5, 67 1, 67 1, 71 1.5, 69 0.5, 69 1, 64 1, 66 2, 67 1, 69 0.5, 71 0.5, 69 1, 66 1, 69 1, 69 1,
66 1, 62 1/3, 64 1/3, 66 1/3, 67 1, 71 1, 64 1, 61 1, 62 3`;

const abc = `X:1
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

/** The one the tour begins with. */
export const lanternOnTheSlipway: DemoSong = {
  id: "lantern",
  title: "Lantern on the Slipway",
  chart,
  earlier,
  writtenKey: { tonic: "D", mode: "major" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 4,
  barLength: 4,
  tempo: 84,
};
