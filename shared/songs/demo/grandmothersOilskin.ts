import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
Bb            F             Gm           Eb
Grandmother's oilskin hangs stiff on the door,
Bb        F           Eb        F
wide as a sail and as loud as a shore;
Eb        Bb              F        Gm
put it on once and you're ready to row,
Eb      F            Bb
seventy years in the pockets below.

Chorus
Eb           Bb         F         Gm
String and a whistle, a pencil, a stone,
Eb        Bb         F
half of a letter she wrote on her own,
Eb           Bb     F               Gm
nothing that anyone else would have kept,
Eb          F              Bb
warm as the room where the whole of us slept.

Verse 2
Bb           F           Gm        Eb
Now when the gutters run over with rain,
Bb       F            Eb      F
I put my hands in her pockets again,
Eb            Bb          F           Gm
find the same pencil, the point of it bright,
Eb           F          Bb
sign the wet window and walk in the night.

Chorus

Verse 3
Bb       F             Gm         Eb
Somebody small will be wearing it next,
Bb               F           Eb        F
sleeves past her fingers and perfectly vexed;
Eb            Bb           F              Gm
leave her the whistle, the string and the stone,
Eb            F         Bb
let her write half of a letter alone.`;

/** Pitch and length of each note. */
const notes = `
74 1, 72 1, 70 1, 72 1, 69 1, 65 1, 70 1, 69 1, 67 1, 67 3, 70 1, 72 1, 74 1, 72 1, 70 1, 69 1, 67 1, 69 1,
70 1, 72 3, 75 1, 74 1, 72 1, 74 1, 72 1, 70 1, 72 1, 70 1, 69 1, 70 3, 67 1, 69 1, 70 1, 72 1, 70 1, 69 1,
74 1, 72 1, 69 1, 70 3, 75 1, 75 1, 74 1, 74 1, 72 1, 70 1, 72 1, 70 1, 69 1, 67 3, 67 1, 69 1, 70 1, 74 1,
72 1, 70 1, 72 1, 74 1, 75 1, 77 3, 75 1, 74 1, 72 1, 74 1, 72 1, 74 1, 72 1, 70 1, 69 1, 70 3, 67 1, 69 1,
70 1, 72 1, 70 1, 69 1, 74 1, 72 1, 69 1, 70 3`;

const abc = `X:1
T:Grandmother's Oilskin
M:3/4
L:1/4
Q:1/4=96
K:Bb
dcB | cAF | BAG | G3 |
w: Grand-mo-ther's oil-skin hangs stiff on the door,
Bcd | cBA | GAB | c3 |
w: wide as a sail and as loud as a shore;
edc | dcB | cBA | B3 |
w: put it on once and you're rea-dy to row,
GAB | cBA | dcA | B3 |
w: se-ven-ty years in the pock-ets be-low.
eed | dcB | cBA | G3 |
w: String and a whis-tle, a pen-cil, a stone,
GAB | dcB | cde | f3 |
w: half of a let-ter she wrote on her own,
edc | dcd | cBA | B3 |
w: no-thing that an-y-one else would have kept,
GAB | cBA | dcA | B3 |]
w: warm as the room where the whole of us slept.
`;

/** A waltz in a flat key that lies high. */
export const grandmothersOilskin: DemoSong = {
  id: "oilskin",
  title: "Grandmother's Oilskin",
  chart,
  writtenKey: { tonic: "Bb", mode: "major" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 3,
  barLength: 3,
  tempo: 96,
};
