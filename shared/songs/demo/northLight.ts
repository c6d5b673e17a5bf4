import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
Bm           G             D              A
Paint me the quay with the light from the north,
Bm           G            A            Bm
leave in the ladders, the back and the forth,
Bm            G               D           A
leave out the rain, though it stood at my sleeve,
G             F#7           Bm
leave out the boat that was ready to leave.

Chorus
D            A            Bm        F#m
North light, north light, thin as a rule,
G         D          A           D
honest as water that stands in a pool;
Bm          G          D           A
show me the town as it is when I'm gone,
G             F#7         Bm
someone still putting the coffee pot on.

Verse 2
Bm          G          D            A
Red for the buoy and a grey for the stone,
Bm            G              A             Bm
green for the door you would paint on your own,
Bm           G             D             A
blue for the hour when the shop signs go blind,
G             F#7          Bm
white for the parts I have left you to find.

Chorus

Verse 3
Bm             G        D            A
Years from the easel it hangs by the till,
Bm         G          A           Bm
people say lovely and pay for the bill;
Bm     G           D         A
nobody asks who is up on the stair,
G             F#7      Bm
one stroke of yellow I happened to spare.

Chorus`;

/** Pitch and length of each note. */
const notes = `
66 1, 66 1, 67 1, 71 1, 69 1, 67 1, 69 1, 67 1, 66 1, 64 3, 66 1, 64 1, 62 1, 67 1, 69 1, 71 1, 69 1, 67 1,
64 1, 66 3, 74 1, 73 1, 71 1, 71 1, 69 1, 67 1, 69 1, 66 1, 62 1, 64 3, 67 1, 69 1, 71 1, 73 1, 70 1, 66 1,
74 1, 73 1, 70 1, 71 3, 74 2, 69 1, 73 2, 69 1, 71 1, 69 1, 66 1, 73 3, 71 1, 69 1, 67 1, 69 1, 66 1, 62 1,
64 1, 66 1, 67 1, 66 3, 74 1, 73 1, 71 1, 74 1, 71 1, 67 1, 69 1, 67 1, 66 1, 64 3, 67 1, 69 1, 71 1, 73 1,
70 1, 66 1, 74 1, 73 1, 70 1, 71 3`;

const abc = `X:1
T:North Light
M:3/4
L:1/4
Q:1/4=88
K:Bm
FFG | BAG | AGF | E3 |
w: Paint me the quay with the light from the north,
FED | GAB | AGE | F3 |
w: leave in the lad-ders, the back and the forth,
dcB | BAG | AFD | E3 |
w: leave out the rain, though it stood at my sleeve,
GAB | c^AF | dc^A | B3 |
w: leave out the boat that was rea-dy to leave.
d2A | c2A | BAF | c3 |
w: North light, north light, thin as a rule,
BAG | AFD | EFG | F3 |
w: ho-nest as wa-ter that stands in a pool;
dcB | dBG | AGF | E3 |
w: show me the town as it is when I'm gone,
GAB | c^AF | dc^A | B3 |]
w: some-one still put-ting the cof-fee pot on.
`;

/** A minor waltz that visits its relative major. */
export const northLight: DemoSong = {
  id: "north",
  title: "North Light",
  chart,
  writtenKey: { tonic: "B", mode: "minor" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 3,
  barLength: 3,
  tempo: 88,
};
