import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
C                     F
Up past the net loft, second door,
C                    G
nineteen chairs on a painted floor,
C             F       C            F
Maren has the window, Joss has the wall,
C      G        C
nobody here can sing at all.

Chorus
F                        C
Do what you can with the breath you brought,
F                       G
half of the tune is the part you caught;
C                         Am
Tuesday upstairs, and the stove half lit,
F       G         C
sing it badly and mean all of it.

Verse 2
C                       F
Wilf sings the low part under his beard,
C                         G
higher than that and he's disappeared,
C               F            C           F
Nell counts the beats on the back of her hand,
C             G      C
two more than anyone else had planned.

Chorus

Verse 3
C                    F
Rain on the skylight comes in on three,
C                   G
keeping a good deal better than me,
C           F          C            F
somewhere a ferry horn joins on the B,
C      G              C
nobody minds it, it's nearly the key.

Chorus x2`;

/** Pitch and length of each note. */
const notes = `
67 1, 67 0.5, 69 0.5, 67 1, 64 1, 69 1, 69 1, 72 2, 72 1, 71 1, 67 1, 64 0.5, 64 0.5, 62 1, 64 1, 62 2, 64 0.5,
65 0.5, 67 0.5, 67 0.5, 69 1, 69 1, 67 1, 67 0.5, 67 0.5, 69 2, 72 1, 71 0.5, 69 0.5, 67 1, 65 1, 64 1, 62 1,
60 2, 69 1, 69 0.5, 71 0.5, 72 1, 72 0.5, 69 0.5, 67 1, 64 1, 67 2, 69 1, 69 0.5, 71 0.5, 72 1, 72 0.5, 72 0.5,
74 1, 72 1, 71 2, 72 1, 71 0.5, 69 0.5, 67 1, 67 0.5, 67 0.5, 69 1, 72 1, 69 2, 69 1, 69 1, 71 1, 69 0.5,
71 0.5, 72 1, 67 0.5, 64 0.5, 60 2`;

const abc = `X:1
T:Tuesday Upstairs
M:4/4
L:1/8
Q:1/4=100
K:C
G2GA G2E2 | A2A2 c4 |
w: Up past the net loft, se-cond door,
c2B2 G2EE | D2E2 D4 |
w: nine-teen chairs on a paint-ed floor,
EFGG A2A2 | G2GG A4 |
w: Ma-ren has the win-dow, Joss has the wall,
c2BA G2F2 | E2D2 C4 |
w: no-bo-dy here can sing at all.
A2AB c2cA | G2E2 G4 |
w: Do what you can with the breath you brought,
A2AB c2cc | d2c2 B4 |
w: half of the tune is the part you caught;
c2BA G2GG | A2c2 A4 |
w: Tues-day up-stairs, and the stove half lit,
A2A2 B2AB | c2GE C4 |]
w: sing it bad-ly and mean all of it.
`;

/** The evening class sings of itself; plain C major. */
export const tuesdayUpstairs: DemoSong = {
  id: "tuesday",
  title: "Tuesday Upstairs",
  chart,
  writtenKey: { tonic: "C", mode: "major" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 4,
  barLength: 4,
  tempo: 100,
};
