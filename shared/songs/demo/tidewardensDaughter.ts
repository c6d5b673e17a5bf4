import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
Dm             G          Dm
Down where the tidewarden marks up the board,
F      C              G              Dm
nobody knows that his daughter keeps score:
Dm          G          C              Am
high water, low water, chalked by her hand,
Dm            C             Am           Dm
she tells the sea where the sea ought to stand.

Chorus
Dm         G         Dm         C
Ring it at seven and ring it at nine,
F         C          G        Am
every low evening is one in a line;
Dm           G         C            Am
bell for the going and bell for the stay,
Dm     C             Am       Dm
nobody drowns on the warden's day.

Verse 2
Dm           G             Dm
Boats on the mud lean like drunks on a pew,
F           C          G                Dm
waiting for her to say what they should do;
Dm           G         C           Am
chalk on her apron and salt on her shoe,
Dm           C               Am             Dm
half the sea waits while she checks if it's true.

Chorus

Verse 3
Dm             G           Dm
Once she wrote nothing and stood on the stair,
F            C          G           Dm
all the wide water just hung in the air;
Dm            G        C          Am
then she bent over and put down a line,
Dm           C             Am           Dm
and the tide turned with a sigh, and on time.`;

/** Pitch and length of each note. */
const notes = `
69 1, 65 1, 67 1, 71 1, 69 1, 67 1, 69 1, 67 1, 65 1, 62 3, 72 1, 71 1, 69 1, 67 1, 69 1, 71 1, 71 1, 69 1,
67 1, 69 3, 74 1, 72 1, 69 1, 71 1, 69 1, 67 1, 72 1, 71 1, 67 1, 69 3, 65 1, 67 1, 69 1, 67 1, 64 1, 67 1,
69 1, 67 1, 64 1, 62 3, 74 1, 74 1, 72 1, 71 1, 69 1, 71 1, 69 1, 67 1, 65 1, 67 3, 69 1, 67 1, 69 1, 72 1,
71 1, 67 1, 74 1, 72 1, 71 1, 69 3, 74 1, 72 1, 69 1, 71 1, 69 1, 67 1, 67 1, 69 1, 72 1, 76 3, 74 1, 72 1,
69 1, 67 1, 64 1, 62 1, 64 2, 60 1, 62 3`;

const abc = `X:1
T:The Tidewarden's Daughter
M:3/4
L:1/4
Q:1/4=104
K:Ddor
AFG | BAG | AGF | D3 |
w: Down where the tide-war-den marks up the board,
cBA | GAB | BAG | A3 |
w: no-bo-dy knows that his daugh-ter keeps score:
dcA | BAG | cBG | A3 |
w: high wa-ter, low wa-ter, chalked by her hand,
FGA | GEG | AGE | D3 |
w: she tells the sea where the sea ought to stand.
ddc | BAB | AGF | G3 |
w: Ring it at se-ven and ring it at nine,
AGA | cBG | dcB | A3 |
w: ev-ery low eve-ning is one in a line;
dcA | BAG | GAc | e3 |
w: bell for the go-ing and bell for the stay,
dcA | GED | E2C | D3 |]
w: no-bo-dy drowns on the war-den's day.
`;

/** A waltz in dorian. */
export const tidewardensDaughter: DemoSong = {
  id: "warden",
  title: "The Tidewarden's Daughter",
  chart,
  writtenKey: { tonic: "D", mode: "dorian" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 3,
  barLength: 3,
  tempo: 104,
};
