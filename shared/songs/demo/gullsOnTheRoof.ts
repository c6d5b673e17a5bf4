import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
F                      Bb
Seventeen gulls on the chandler's roof,
C                    F
every one asking for personal proof
F                             Bb
that you have nothing wrapped up in your coat,
C                    F
nothing at all for a gull or a goat.

Chorus
Bb             F         C              F
Shout, you old aldermen, shout from the tiles,
Bb          F           C
vote on the herring and argue for miles;
F          C             Dm          Bb
I have one sandwich, and sandwich is mine:
F          C          F
minute it, second it, dinner's at nine.

Verse 2
F                    Bb
One has a limp and a general's eye,
C                         F
one wears the weathercock like a bow tie,
F                         Bb
one keeps the sum of what everyone ate,
C                          F
one has been waiting since quarter past eight.

Chorus

Verse 3
F                        Bb
Sunday the chandler came out with a broom,
C                       F
said that a roof was no council room;
F                     Bb
all seventeen of them rose and were gone,
C                   F
back on a motion at quarter past one.

Chorus`;

/** Pitch and length of each note. */
const notes = `
65 0.5, 67 0.5, 69 0.5, 72 0.5, 69 0.5, 65 0.5, 74 1, 72 0.5, 70 1.5, 72 0.5, 70 0.5, 67 0.5, 64 0.5, 65 0.5,
67 0.5, 69 0.5, 67 0.5, 65 0.5, 72 1.5, 65 0.5, 67 0.5, 69 0.5, 72 0.5, 74 0.5, 72 0.5, 74 0.5, 72 0.5, 74 0.5,
70 1.5, 72 0.5, 70 0.5, 69 0.5, 67 0.5, 69 0.5, 70 0.5, 69 0.5, 67 0.5, 67 0.5, 65 1.5, 74 0.5, 72 0.5, 74 0.5,
72 0.5, 69 0.5, 65 0.5, 67 0.5, 67 0.5, 69 0.5, 69 1.5, 74 0.5, 72 0.5, 70 0.5, 72 0.5, 69 0.5, 65 0.5, 64 0.5,
65 0.5, 67 0.5, 72 1.5, 69 0.5, 67 0.5, 65 0.5, 67 0.5, 69 0.5, 70 0.5, 69 0.5, 67 0.5, 65 0.5, 74 1.5, 72 0.5,
69 0.5, 65 0.5, 67 0.5, 67 0.5, 64 0.5, 69 0.5, 67 0.5, 64 0.5, 65 1.5`;

const abc = `X:1
T:Gulls on the Chandler's Roof
M:6/8
L:1/8
Q:3/8=88
K:F
FGA cAF | d2c B3 |
w: Se-ven-teen gulls on the chand-ler's roof,
cBG EFG | AGF c3 |
w: ev-ery one ask-ing for per-son-al proof
FGA cdc | dcd B3 |
w: that you have no-thing wrapped up in your coat,
cBA GAB | AGG F3 |
w: no-thing at all for a gull or a goat.
dcd cAF | GGA A3 |
w: Shout, you old al-der-men, shout from the tiles,
dcB cAF | EFG c3 |
w: vote on the her-ring and ar-gue for miles;
AGF GAB | AGF d3 |
w: I have one sand-wich, and sand-wich is mine:
cAF GGE | AGE F3 |]
w: mi-nute it, se-cond it, din-ner's at nine.
`;

/** A lively one in six-eight. */
export const gullsOnTheRoof: DemoSong = {
  id: "gulls",
  title: "Gulls on the Chandler's Roof",
  chart,
  writtenKey: { tonic: "F", mode: "major" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 6,
  barLength: 3,
  tempo: 132,
};
