import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
Am                     Dm
Somebody's put all the salt in the kettle,
Am                 E7
nobody owns to it, nobody will;
Am                     Dm
Harbourside Annie says it was the weather,
Am        E7           Am
all of us drank it and sat very still.

Chorus
F           C            G             Am
Kettle, old kettle, what have you been boiling?
F           C           E7
Half of the harbour and half of the sea;
Am        Dm         Am         E7
pour us a mugful and never mind spoiling:
Am           E7          Am
salt for the sailors and salt for the tea.

Verse 2
Am                   Dm
Everyone carried one spoon in their pocket,
Am                      E7
nobody thought that the others would too;
Am                    Dm
nine of us tipping it in by the window,
Am          E7         Am
nine little kindnesses spoiling the brew.

Chorus

Verse 3
Am                        Dm
Now when the kettle sings over the meeting,
Am                   E7
every last pocket is empty and dry;
Am                     Dm
somebody tastes it and says that it's missing
Am             E7          Am
something like rain from a homecoming sky.

Chorus`;

/** Pitch and length of each note. */
const notes = `
69 0.5, 71 0.5, 72 0.5, 76 0.5, 74 0.5, 72 0.5, 74 0.5, 74 0.5, 74 0.5, 77 1, 74 0.5, 76 0.5, 74 0.5, 72 0.5,
69 0.5, 69 0.5, 69 0.5, 71 0.5, 72 0.5, 71 0.5, 68 1.5, 69 0.5, 71 0.5, 72 0.5, 76 0.5, 74 0.5, 72 0.5, 77 0.5,
76 0.5, 74 0.5, 69 1, 74 0.5, 72 0.5, 71 0.5, 69 0.5, 68 0.5, 69 0.5, 71 0.5, 69 0.5, 72 0.5, 71 0.5, 69 1.5,
72 0.5, 71 0.5, 69 0.5, 76 0.5, 74 0.5, 72 0.5, 74 0.5, 72 0.5, 71 0.5, 72 1, 69 0.5, 77 0.5, 76 0.5, 74 0.5,
76 0.5, 74 0.5, 72 0.5, 76 0.5, 74 0.5, 72 0.5, 71 1.5, 69 0.5, 71 0.5, 72 0.5, 77 0.5, 76 0.5, 74 0.5, 76 0.5,
72 0.5, 69 0.5, 71 1, 68 0.5, 69 0.5, 71 0.5, 72 0.5, 71 0.5, 69 0.5, 68 0.5, 69 0.5, 72 0.5, 71 0.5, 69 1.5`;

const abc = `X:1
T:Salt in the Kettle
M:6/8
L:1/8
Q:3/8=72
K:Am
ABc edc | ddd f2d |
w: Some-bo-dy's put all the salt in the ket-tle,
edc AAA | BcB ^G3 |
w: no-bo-dy owns to it, no-bo-dy will;
ABc edc | fed A2d |
w: Har-bour-side An-nie says it was the wea-ther,
cBA ^GAB | AcB A3 |
w: all of us drank it and sat ve-ry still.
cBA edc | dcB c2A |
w: Ket-tle, old ket-tle, what have you been boil-ing?
fed edc | edc B3 |
w: Half of the har-bour and half of the sea;
ABc fed | ecA B2^G |
w: pour us a mug-ful and ne-ver mind spoil-ing:
ABc BA^G | AcB A3 |]
w: salt for the sail-ors and salt for the tea.
`;

/** A jig-like one in a minor key. */
export const saltInTheKettle: DemoSong = {
  id: "salt",
  title: "Salt in the Kettle",
  chart,
  writtenKey: { tonic: "A", mode: "minor" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 6,
  barLength: 3,
  tempo: 108,
};
