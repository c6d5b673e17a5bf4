import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
Eb                 Ab
Pull the shutters, bank the coal,
Eb               Bb
one more biscuit in the bowl,
Cm               Ab
boats are folded on the hard,
Bb                       Eb
cats have the run of the timber yard.

Chorus
Ab          Eb         Ab          Eb
Lamp in the stairwell, coat on the chair,
Ab         Eb          Bb
somebody's humming and doesn't know where;
Cm          Gm         Ab        Bb
let the day go and the dark come in,
Ab        Bb             Eb
all of us home where the chimneys begin.

Verse 2
Eb              Ab
Hang the ladle, wind the clock,
Eb            Bb
every rowboat knows its dock,
Cm                  Ab
even the lighthouse blinks and yawns,
Bb                    Eb
dropping its stitches over the prawns.

Chorus

Verse 3
Eb                    Ab
Sleep, small harbour, sleep, long street,
Eb                         Bb
warm brick wrapped for the coldest feet,
Cm                       Ab
morning will come with a crate on its head,
Bb                      Eb
whistling and early and smelling of bread.`;

/** Pitch and length of each note. */
const notes = `
67 1, 65 1, 63 1, 67 1, 68 1, 70 1, 72 2, 70 1, 67 1, 63 1, 67 1, 65 1, 63 1, 62 2, 63 1, 65 1, 67 1, 63 1,
68 1, 67 1, 63 2, 65 1, 65 0.5, 67 0.5, 70 1, 68 0.5, 65 0.5, 67 1, 65 1, 63 2, 72 1, 72 0.5, 70 0.5, 70 1,
67 1, 72 1, 72 0.5, 74 0.5, 75 2, 72 1, 72 0.5, 70 0.5, 70 1, 67 0.5, 63 0.5, 65 1, 65 0.5, 67 0.5, 65 2, 63 1,
63 0.5, 65 0.5, 67 1, 67 0.5, 65 0.5, 68 1, 67 1, 65 2, 68 1, 68 0.5, 70 0.5, 70 1, 68 0.5, 65 0.5, 67 1,
67 0.5, 65 0.5, 63 2`;

const abc = `X:1
T:Pull the Shutters
M:4/4
L:1/8
Q:1/4=76
K:Eb
G2F2 E2G2 | A2B2 c4 |
w: Pull the shut-ters, bank the coal,
B2G2 E2G2 | F2E2 D4 |
w: one more bis-cuit in the bowl,
E2F2 G2E2 | A2G2 E4 |
w: boats are fold-ed on the hard,
F2FG B2AF | G2F2 E4 |
w: cats have the run of the tim-ber yard.
c2cB B2G2 | c2cd e4 |
w: Lamp in the stair-well, coat on the chair,
c2cB B2GE | F2FG F4 |
w: some-bo-dy's hum-ming and does-n't know where;
E2EF G2GF | A2G2 F4 |
w: let the day go and the dark come in,
A2AB B2AF | G2GF E4 |]
w: all of us home where the chim-neys be-gin.
`;

/** A lullaby in three flats, narrow and low. */
export const pullTheShutters: DemoSong = {
  id: "shutters",
  title: "Pull the Shutters",
  chart,
  writtenKey: { tonic: "Eb", mode: "major" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 4,
  barLength: 4,
  tempo: 76,
};
