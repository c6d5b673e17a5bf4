/**
 * Tunes and chord patterns whose key is common knowledge, written down from memory for these tests. All are
 * traditional or long in the public domain; `source` says where they come from.
 */
export interface KnownSong {
  name: string;
  source: string;
  key: string;
  /** the melody: unit length, notes */
  abc?: { meter: string; unit: string; notes: string };
  /** the chords, a line a phrase */
  chords?: string;
}

export const knownSongs: readonly KnownSong[] = [
  {
    name: "Ah! vous dirai-je, maman",
    source: "French traditional, 18th century",
    key: "C",
    abc: { meter: "4/4", unit: "1/4", notes: "CCGG|AAG2|FFEE|DDC2|GGFF|EED2|GGFF|EED2|CCGG|AAG2|FFEE|DDC2|]" },
  },
  {
    name: "Frère Jacques",
    source: "French traditional round",
    key: "F",
    abc: { meter: "4/4", unit: "1/4", notes: "FGAF|FGAF|ABc2|ABc2|c/d/c/B/AF|c/d/c/B/AF|FCF2|FCF2|]" },
  },
  {
    name: "New Britain (Amazing Grace)",
    source: "American shape-note tune, Southern Harmony, 1835",
    key: "G",
    abc: {
      meter: "3/4",
      unit: "1/8",
      notes: "D2|G4 BG|B4 A2|G4 E2|D4 D2|G4 BG|B4 A2|d6-|d4 B2|d4 BG|B4 A2|G4 E2|D4 D2|G4 BG|B4 A2|G6-|G4|]",
    },
  },
  {
    name: "Ode to Joy",
    source: "Beethoven, Symphony No. 9, 1824",
    key: "D",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "FFGA|AGFE|DDEF|F3/E/E2|FFGA|AGFE|DDEF|E3/D/D2|EEFD|EF/G/FD|EF/G/FE|DEA,2|FFGA|AGFE|DDEF|E3/D/D2|]",
    },
  },
  {
    name: "Greensleeves",
    source: "English traditional, 16th century",
    key: "Am",
    abc: {
      meter: "6/8",
      unit: "1/8",
      notes:
        "A|c2d e>fe|d2B G>AB|c2A A>^GA|B2^G E2A|c2d e>fe|d2B G>AB|c>BA ^G>^F^G|A3 A3|g3 g>fe|d2B G>AB|c2A A>^GA|B2^G E3|g3 g>fe|d2B G>AB|c>BA ^G>^F^G|A3 A2|]",
    },
  },
  {
    name: "Auld Lang Syne",
    source: "Scottish traditional, 18th century",
    key: "F",
    abc: {
      meter: "4/4",
      unit: "1/8",
      notes:
        "C2|F3F F2A2|G3F G2A2|F3F A2c2|d6 d2|c3A A2F2|G3F G2A2|F3D D2C2|F6 d2|c3A A2F2|G3F G2d2|c3A A2c2|d6 d2|c3A A2F2|G3F G2A2|F3D D2C2|F6|]",
    },
  },
  {
    name: "Scarborough Fair",
    source: "English traditional",
    key: "Em",
    abc: {
      meter: "3/4",
      unit: "1/4",
      notes: "E2E|B2B|F3/G/F|E3|zBd|e2d|B^cA|B3|zze|e2e|d2B|BAG|FD2|E2B|A2G|FED|E3|]",
    },
  },
  {
    name: "Silent Night",
    source: "F. X. Gruber, 1818",
    key: "C",
    abc: {
      meter: "6/8",
      unit: "1/8",
      notes: "G>AG E3|G>AG E3|d2d B3|c2c G3|A2A c>BA|G>AG E3|A2A c>BA|G>AG E3|d2d f>dB|c3 e3|cGE G>FD|C6|]",
    },
  },
  {
    name: "God Rest You Merry",
    source: "English carol, 18th century",
    key: "Em",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "E|EBBA|GFED|EFGA|B3E|EBBA|GFED|EFGA|B3B|cABc|deBA|GEFG|A2GA|B2cB|BAGF|E2GF/E/|A2GA|Bcde|BAGF|E3|]",
    },
  },
  {
    name: "When the Saints",
    source: "American traditional",
    key: "G",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "GBc|d4|zGBc|d4|zGBc|d2B2|G2B2|A4|zBBA|G3G|B2d2|dc3|zzBc|d2B2|G2A2|G4|]",
    },
  },
  {
    name: "Au clair de la lune",
    source: "French traditional, 18th century",
    key: "G",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "GGGA|B2A2|GBAA|G4|GGGA|B2A2|GBAA|G4|AAAA|E2E2|AGFE|D4|GGGA|B2A2|GBAA|G4|]",
    },
  },
  {
    name: "London Bridge",
    source: "English nursery rhyme",
    key: "D",
    abc: { meter: "4/4", unit: "1/4", notes: "A3/B/AG|FGA2|EFG2|FGA2|A3/B/AG|FGA2|E2A2|FD3|]" },
  },
  {
    name: "Good King Wenceslas",
    source: "Piae Cantiones, 1582 (Tempus adest floridum)",
    key: "G",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "GGGA|GGD2|EDEF|G2G2|GGGA|GGD2|EDEF|G2G2|dcBA|BAG2|EDEF|G2G2|DDEF|GGA2|dcBA|G2c2|G4|]",
    },
  },
  {
    name: "Drunken Sailor",
    source: "sea shanty, 19th century",
    key: "Dm",
    abc: {
      meter: "2/4",
      unit: "1/8",
      notes: "AA/A/AA/A/|ADFA|GG/G/GG/G/|GCEG|AA/A/AA/A/|ABcd|cAGE|D2D2|A2A>A|ADFA|G2G>G|GCEG|A2A>A|ABcd|cAGE|D2D2|]",
    },
  },
  {
    name: "Joy to the World (Antioch)",
    source: "L. Mason, 1839",
    key: "D",
    abc: {
      meter: "2/4",
      unit: "1/8",
      notes: "d2c>B|A3G|F2E2|D3A|B3B|c3c|d3d|dcBA|A>GFd|dcBA|A>GFF|FFFF/G/|A3G/F/|EEEE/F/|G3F/E/|Dd2B|A>GFG|F2E2|D4|]",
    },
  },
  {
    name: "Old Hundredth",
    source: "Genevan Psalter, 1551",
    key: "G",
    abc: { meter: "4/4", unit: "1/4", notes: "G|GFED|G2AB2|BBBA|G2cB2|A2GAB|c2BA2|G2dB|G2AcBA|G3|]" },
  },
  {
    name: "Loch Lomond",
    source: "Scottish traditional, 1841",
    key: "F",
    abc: {
      meter: "4/4",
      unit: "1/8",
      notes:
        "CC|F3G A2GA|F2FA c2cA|d3d c2A2|G6 cd|c2Ac A2GF|G2FG A2FD|C3F A3/G/ G2|F6 CD|F3G A2GA|F2FA c2dc|d3c A3c|G6 cd|c2Ac A2GF|G2FG A2FD|C3F A3G|F6|]",
    },
  },
  {
    name: "Coventry Carol",
    source: "English, 16th century",
    key: "Gm",
    abc: { meter: "3/4", unit: "1/4", notes: "GG^F|G2B|A2G|^F3|GAB|cA2|G3|dcB|A2B|A2G|^F3|GAB|cA2|=B3|G3|]" },
  },
  {
    name: "Wayfaring Stranger",
    source: "American traditional, 19th century",
    key: "Am",
    abc: {
      meter: "3/4",
      unit: "1/4",
      notes: "EAB|c2A|cBA|G2E|D3|EAB|c2A|GAG|A3|zAc|d2d|eed|c2A|zAc|d2d|edc|e3|eed|c2A|cBA|G2E|D3|EAB|c2A|GAG|A3|]",
    },
  },
  {
    name: "Row, Row, Row Your Boat",
    source: "American round, 1852",
    key: "C",
    abc: { meter: "6/8", unit: "1/8", notes: "C3C3|C2DE3|E2DE2F|G6|cccGGG|EEECCC|G2FE2D|C6|]" },
  },
  {
    name: "twelve-bar blues",
    source: "common practice",
    key: "A",
    chords: "A7 A7 A7 A7\nD7 D7 A7 A7\nE7 D7 A7 E7\nA7 A7 A7 A7\nD7 D7 A7 A7\nE7 D7 A7 A7",
  },
  {
    name: "Canon in D, ground",
    source: "J. Pachelbel, about 1690",
    key: "D",
    chords: "D A Bm F#m\nG D G A\nD A Bm F#m\nG D G A\nD",
  },
  { name: "Andalusian cadence", source: "common practice", key: "Am", chords: "Am G F E\nAm G F E\nAm" },
  {
    name: "La Folía",
    source: "Iberian dance, 17th century",
    key: "Dm",
    chords: "Dm A7 Dm C\nF C Dm A7\nDm A7 Dm C\nF C Dm A7 Dm",
  },
  { name: "Passamezzo antico", source: "Italian dance, 16th century", key: "Gm", chords: "Gm F Gm D\nBb F Gm D Gm" },
  { name: "Romanesca", source: "Italian ground, 16th century", key: "Am", chords: "C G Am E\nC G Am E Am" },
  {
    name: "House of the Rising Sun",
    source: "American traditional, chords as commonly played",
    key: "Am",
    chords: "Am C D F\nAm C E E\nAm C D F\nAm E Am E",
  },
  {
    name: "Amazing Grace, chords",
    source: "common practice",
    key: "G",
    chords: "G G7 C G\nG Em D D7\nG G7 C G\nEm D7 G",
  },
  { name: "Auld Lang Syne, chords", source: "common practice", key: "Eb", chords: "Eb Bb7 Eb Ab\nEb Bb7 Ab Bb7 Eb" },
  { name: "doo-wop turn", source: "common practice", key: "B", chords: "B G#m E F#\nB G#m E F#\nB" },
  { name: "mixolydian vamp", source: "common practice of rock, bVII", key: "D", chords: "D C G D\nD C G D" },
  {
    name: "two-five-one in a minor key",
    source: "common practice of jazz",
    key: "Cm",
    chords: "Cm7 Fm7 Dm7b5 G7\nCm7 Ab7 Dm7b5 G7 Cm6",
  },
  {
    name: "rhythm of secondary dominants",
    source: "common practice, ragtime turn",
    key: "C",
    chords: "C A7 D7 G7\nC A7 D7 G7 C",
  },
  {
    name: "Wayfaring Stranger, chords",
    source: "common practice",
    key: "Em",
    chords: "Em Am Em Em\nAm Em B7 B7\nC G C B7\nEm Am Em",
  },
];
