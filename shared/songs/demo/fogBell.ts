import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
Em                  C
Fog on the estuary, fog on the stair,
Am                     B7
somebody's counting, I know she is there:
Em                      C
one for the harbour and one for the sea,
Am          B7           Em
one for the boat that is looking for me.

Chorus
G                 D
Bell in the grey, bell in the grey,
C           G          B7
tell me how far to the edge of the day;
Em                      C
hold to the railing and hold to the tone,
Am     B7               Em
nobody rows through the morning alone.

Verse 2
Em               C
Old Mr Tamsin is up with the rope,
Am                     B7
pulling it gently, the way people hope;
Em                       C
nine to the minute, he's deaf as a door,
Am         B7          Em
feeling it ring in the planks of the floor.

Chorus

Verse 3
Em                       C
Slowly the chimneys come out of the wool,
Am                       B7
then the red awning, the lorry half full,
Em                      C
then a thin mast with a shirt on the stay,
Am        B7         Em
then you, rowing the last of the way.

Chorus`;

/** Pitch and length of each note. */
const notes = `
71 1, 71 0.5, 71 0.5, 67 0.5, 66 0.5, 64 0.5, 64 0.5, 67 1, 67 0.5, 66 0.5, 64 2, 69 1, 69 0.5, 71 0.5, 72 1,
71 0.5, 69 0.5, 71 1, 71 0.5, 69 0.5, 66 2, 64 1, 66 0.5, 67 0.5, 71 1, 71 0.5, 71 0.5, 72 1, 71 0.5, 69 0.5,
67 2, 72 1, 71 0.5, 69 0.5, 71 1, 69 0.5, 66 0.5, 67 1, 67 0.5, 66 0.5, 64 2, 74 1, 74 0.5, 71 0.5, 74 2, 69 1,
69 0.5, 71 0.5, 69 2, 67 1, 67 0.5, 69 0.5, 71 1, 71 0.5, 69 0.5, 66 1, 67 0.5, 69 0.5, 71 2, 76 1, 76 0.5,
74 0.5, 71 1, 71 0.5, 71 0.5, 72 1, 72 0.5, 71 0.5, 67 2, 72 1, 71 0.5, 69 0.5, 71 1, 69 0.5, 63 0.5, 67 1,
67 0.5, 66 0.5, 64 2`;

const abc = `X:1
T:Fog Bell
M:4/4
L:1/8
Q:1/4=66
K:Em
B2BB GFEE | G2GF E4 |
w: Fog on the es-tu-a-ry, fog on the stair,
A2AB c2BA | B2BA F4 |
w: some-bo-dy's count-ing, I know she is there:
E2FG B2BB | c2BA G4 |
w: one for the har-bour and one for the sea,
c2BA B2AF | G2GF E4 |
w: one for the boat that is look-ing for me.
d2dB d4 | A2AB A4 |
w: Bell in the grey, bell in the grey,
G2GA B2BA | F2GA B4 |
w: tell me how far to the edge of the day;
e2ed B2BB | c2cB G4 |
w: hold to the rail-ing and hold to the tone,
c2BA B2A^D | G2GF E4 |]
w: no-bo-dy rows through the morn-ing a-lone.
`;

/** A slow one in a minor key with its leading note. */
export const fogBell: DemoSong = {
  id: "fog",
  title: "Fog Bell",
  chart,
  writtenKey: { tonic: "E", mode: "minor" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 4,
  barLength: 4,
  tempo: 66,
};
