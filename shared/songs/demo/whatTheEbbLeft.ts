import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
E                   A
One odd glove and a garden chair,
E                     B
half a clock with the hands still there,
C#m                          A
tins with their names off, a tangle of twine,
A         B           E
all of it yours if it isn't mine.

Chorus
A                   E
Walk with a bucket, walk with a stick,
B                    C#m
morning is early and pockets are quick;
A            E         B             C#m
what the sea wanted it took with the tide,
A           B           E
this is the rest of it, drying outside.

Verse 2
E                       A
Boot with a crab in it, sole worn through,
E                      B
somebody's chess king, painted blue,
C#m                       A
thirteen good corks and a doll with no hair
A          B               E
looking as though she were glad to be there.

Chorus

Verse 3
E                        A
I came for driftwood and left with a door,
E                       B
brass on the handle, no house any more;
C#m                     A
leaned it up out by the end of the lane,
A            B               E
now the wind knocks and goes round it again.

Chorus`;

/** Pitch and length of each note. */
const notes = `
64 1, 68 1, 71 1, 71 0.5, 71 0.5, 73 1, 71 1, 69 2, 71 1, 69 1, 68 1, 68 0.5, 68 0.5, 66 1, 68 1, 66 2, 64 1,
66 0.5, 68 0.5, 73 1, 71 0.5, 71 0.5, 69 1, 69 0.5, 71 0.5, 73 2, 73 1, 71 0.5, 69 0.5, 71 1, 69 0.5, 66 0.5,
68 1, 66 1, 64 2, 73 1, 73 0.5, 71 0.5, 69 1, 69 1, 71 1, 71 0.5, 69 0.5, 68 2, 66 1, 66 0.5, 68 0.5, 71 1,
71 0.5, 69 0.5, 68 1, 68 0.5, 66 0.5, 64 2, 69 1, 69 0.5, 71 0.5, 71 1, 71 0.5, 68 0.5, 75 1, 73 0.5, 71 0.5,
73 2, 73 1, 71 0.5, 69 0.5, 71 1, 69 0.5, 66 0.5, 68 1, 68 0.5, 66 0.5, 64 2`;

const abc = `X:1
T:What the Ebb Left
M:4/4
L:1/8
Q:1/4=92
K:E
E2G2 B2BB | c2B2 A4 |
w: One odd glove and a gar-den chair,
B2A2 G2GG | F2G2 F4 |
w: half a clock with the hands still there,
E2FG c2BB | A2AB c4 |
w: tins with their names off, a tan-gle of twine,
c2BA B2AF | G2F2 E4 |
w: all of it yours if it is-n't mine.
c2cB A2A2 | B2BA G4 |
w: Walk with a buck-et, walk with a stick,
F2FG B2BA | G2GF E4 |
w: morn-ing is ear-ly and pock-ets are quick;
A2AB B2BG | d2cB c4 |
w: what the sea want-ed it took with the tide,
c2BA B2AF | G2GF E4 |]
w: this is the rest of it, dry-ing out-side.
`;

/** A walking song in a key with four sharps. */
export const whatTheEbbLeft: DemoSong = {
  id: "ebb",
  title: "What the Ebb Left",
  chart,
  writtenKey: { tonic: "E", mode: "major" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 4,
  barLength: 4,
  tempo: 92,
};
