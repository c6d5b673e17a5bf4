import type { DemoSong } from "./demoSong";
import { layNotes } from "./layNotes";

const chart = `Verse 1
A                      G
Haul on the long rope, haul on the short,
D                      A
tar on the bollard and tea in the port,
A                     G
pull till the mooring sings like a wire,
D          G           A
ship after ship coming home by the spire.

Chorus
A             G
Rope and tar, rope and tar,
D                   A
never ask the water how deep you are;
A             G
rope and tar, light and spar,
D         G               A
everybody lands where the kettles are.

Verse 2
A                         G
Wind from the north side, wind from the east,
D                        A
gulls on the gunwale and crumbs from the feast;
A                    G
bend to it, Barnaby, lean to it, Lil,
D         G           A
that is a ship coming over the sill.

Chorus

Verse 3
A                    G
When I am mended and coiled on a hook,
D                      A
somebody's name on the page of a book,
A                       G
say I was rope that had nothing to hide,
D           G           A
held by one hand on the slack of the tide.

Chorus x2`;

/** Pitch and length of each note. */
const notes = `
69 1, 69 0.5, 69 0.5, 73 1, 69 1, 71 1, 71 0.5, 69 0.5, 67 2, 66 1, 66 0.5, 67 0.5, 69 1, 69 0.5, 71 0.5, 73 1,
73 0.5, 71 0.5, 69 2, 76 1, 76 0.5, 74 0.5, 73 1, 69 1, 74 1, 74 0.5, 71 0.5, 67 2, 66 1, 69 0.5, 69 0.5, 71 1,
69 0.5, 67 0.5, 69 1, 71 0.5, 67 0.5, 69 2, 76 1, 74 1, 73 2, 74 1, 73 1, 71 2, 66 0.5, 66 0.5, 67 0.5, 67 0.5,
69 1, 66 1, 73 1, 73 0.5, 71 0.5, 69 2, 76 1, 74 1, 73 2, 74 1, 73 1, 71 2, 66 0.5, 66 0.5, 67 0.5, 69 0.5,
71 1, 69 0.5, 67 0.5, 69 1, 67 1, 69 2`;

const abc = `X:1
T:Rope and Tar
M:4/4
L:1/8
Q:1/4=112
K:Amix
A2AA c2A2 | B2BA G4 |
w: Haul on the long rope, haul on the short,
F2FG A2AB | c2cB A4 |
w: tar on the bol-lard and tea in the port,
e2ed c2A2 | d2dB G4 |
w: pull till the moor-ing sings like a wire,
F2AA B2AG | A2BG A4 |
w: ship af-ter ship com-ing home by the spire.
e2d2 c4 | d2c2 B4 |
w: Rope and tar, rope and tar,
FFGG A2F2 | c2cB A4 |
w: ne-ver ask the wa-ter how deep you are;
e2d2 c4 | d2c2 B4 |
w: rope and tar, light and spar,
FFGA B2AG | A2G2 A4 |]
w: ev-ery-bo-dy lands where the ket-tles are.
`;

/** A hauling song in mixolydian. */
export const ropeAndTar: DemoSong = {
  id: "rope",
  title: "Rope and Tar",
  chart,
  writtenKey: { tonic: "A", mode: "mixolydian" },
  abc,
  notes: layNotes(notes),
  beatsPerBar: 4,
  barLength: 4,
  tempo: 112,
};
