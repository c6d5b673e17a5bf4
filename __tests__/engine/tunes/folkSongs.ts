import type { KnownSong } from "./knownSong";

/** Nursery rhymes, folk songs and parlour songs. */
export const folkSongs: readonly KnownSong[] = [
  {
    name: "Ah! vous dirai-je, maman",
    source: "French traditional, 18th century",
    key: "C",
    abc: { meter: "4/4", unit: "1/4", notes: "CCGG|AAG2|FFEE|DDC2|GGFF|EED2|GGFF|EED2|CCGG|AAG2|FFEE|DDC2|]" },
    chords: "C F C\nF C G7 C\nC F C G7\nC F C G7\nC F C\nF C G7 C",
  },
  {
    name: "Frère Jacques",
    source: "French traditional round",
    key: "F",
    abc: { meter: "4/4", unit: "1/4", notes: "FGAF|FGAF|ABc2|ABc2|c/d/c/B/AF|c/d/c/B/AF|FCF2|FCF2|]" },
    chords: "F C7 F F\nF C7 F F\nF C7 F F\nF C7 F",
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
    chords: "Am G Am E\nAm G Am E Am\nC G Am E\nC G Am E Am",
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
    chords: "F C F Bb\nF C Dm Bb C F\nF C F Bb\nF C Dm Bb C F",
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
    chords: "G G G D7\nG G7 C\nG D7 G",
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
    chords: "D A7 D\nD A7 D",
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
    chords: "F Dm Bb C\nF Dm Bb C F\nF Bb F C\nF Dm Bb C F",
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
    chords: "Am Am Dm Am\nDm Am E7\nAm Dm F C E7\nAm Dm Am",
  },
  {
    name: "Row, Row, Row Your Boat",
    source: "American round, 1852",
    key: "C",
    abc: { meter: "6/8", unit: "1/8", notes: "C3C3|C2DE3|E2DE2F|G6|cccGGG|EEECCC|G2FE2D|C6|]" },
    chords: "C C C G7\nC C G7 C",
  },
  {
    name: "Oh! Susanna",
    source: "S. C. Foster, 1848; from memory",
    key: "G",
    abc: {
      meter: "4/4",
      unit: "1/8",
      notes:
        "GA|B2d2d3e|d2B2G3A|B2B2A2G2|A6GA|B2d2d3e|d2B2G3A|B2B2A2A2|G8|c4c4|e2e4e2|d2d2B2G2|A6GA|B2d2d3e|d2B2G3A|B2B2A2A2|G6|]",
    },
    chords: "G G A7 D7\nG G D7 G\nC G D7\nG G D7 G",
  },
  {
    name: "Camptown Races",
    source: "S. C. Foster, 1850; from memory",
    key: "D",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "AAFA|BAF2|FE2z|FE2z|AAFA|BAF2|EFED|D4|D2D/F/A|d4|B2B/d/B|A4|F/G/AAF|ABA2|FEFG/F/|E2D2|]",
    },
    chords: "D D A7 A7\nD D A7 D\nD D G D\nD D A7 D",
  },
  {
    name: "Michael, Row",
    source: "Slave Songs of the United States, 1867; from memory",
    key: "C",
    abc: { meter: "4/4", unit: "1/4", notes: "CE|G3E|GAG2|EGA2|G4|EGG3/G/|EFED|CDE2|D2C2|]" },
    chords: "C C F C\nC Dm C G7 C",
  },
  {
    name: "Skip to My Lou",
    source: "American play-party song, 19th century; from memory",
    key: "G",
    abc: { meter: "4/4", unit: "1/4", notes: "BBGG|BB/B/d2|AAFF|AA/A/c2|BBGG|BB/B/d2|AB/c/BA|G2G2|]" },
    chords: "G G D7 D7\nG G D7 G",
  },
  {
    name: "Mary Had a Little Lamb",
    source: "L. Mason, about 1832; from memory",
    key: "C",
    abc: { meter: "4/4", unit: "1/4", notes: "EDCD|EEE2|DDD2|EGG2|EDCD|EEEE|DDED|C4|]" },
    chords: "C C G7 C\nC C G7 C",
  },
  {
    name: "Yankee Doodle",
    source: "American, 18th century; from memory",
    key: "G",
    abc: {
      meter: "2/4",
      unit: "1/8",
      notes: "GGAB|GBA2|GGAB|G2F2|GGAB|cBAG|FDEF|G2G2|E>FED|EFG2|D>EDC|B,2D2|E>FED|EFGE|DGFA|G2G2|]",
    },
    chords: "G D G D\nG C D7 G\nC G\nC G D7 G",
  },
  {
    name: "Pop Goes the Weasel",
    source: "English, about 1853; from memory",
    key: "C",
    abc: { meter: "6/8", unit: "1/8", notes: "C2CD2D|EGEC3|C2CD2D|E3C3|C2CD2D|EGEC3|A3D2F|E3C3|]" },
    chords: "C G7 C\nC G7 C\nC G7 C\nF G7 C",
  },
  {
    name: "Red River Valley",
    source: "American traditional, late 19th century; from memory",
    key: "G",
    abc: { meter: "4/4", unit: "1/4", notes: "DG|BBAG|AGEG|z2DG|BGBd|cBA2|z2dc|BBAG|ABdc|z2EE|DFGA|BAG2|]" },
    chords: "G D7 G\nG D7\nG G7 C\nD7 G",
  },
  {
    name: "My Bonnie",
    source: "W. H. Hills, Student Songs, 1881; from memory",
    key: "G",
    abc: {
      meter: "3/4",
      unit: "1/4",
      notes:
        "D|B2A|GAG|E2D|B,2D|B2A|GGF|G2A|z2D|B2A|GAG|E2D|B,2D|E2A|GFE|F2E|G3|D3|G3|E3|A2G|F2F|FEF|G2A|B3|D3|G3|E3|A2G|F2F|FED|E2F|G3|]",
    },
    chords: "G C G\nG A7 D7\nG C G\nC D7 G\nG C D7 G\nG C D7 G",
  },
  {
    name: "Clementine",
    source: "P. Montrose, 1884; from memory",
    key: "F",
    abc: { meter: "3/4", unit: "1/4", notes: "F/F/|FCA/A/|AFF/A/|c3/c/B/A/|G2G/A/|B3/B/A/G/|AFF/A/|GCE/G/|F2|]" },
    chords: "F F F C7\nC7 F C7 F",
  },
  {
    name: "Aura Lee",
    source: "G. R. Poulton, 1861; from memory",
    key: "G",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "DGFG|AEA2|GFEF|G4|DGFG|AEA2|GFEF|G4|BBB2|BBB2|BAGA|B4|BBcB|AEA2|GFBA|G4|]",
    },
    chords: "G A7 D7 G\nG A7 D7 G\nG B7 Em G\nG E7 A7 D7 G",
  },
  {
    name: "Bingo",
    source: "English, 18th century; from memory",
    key: "G",
    abc: { meter: "4/4", unit: "1/4", notes: "D|GGDD|EEDD|GGAA|B2G2|BBc2|AAB2|GGA2|FDEF|G3|]" },
    chords: "G C G\nG D G\nG C D G\nC D G",
  },
  {
    name: "Lavender's Blue",
    source: "English, 17th century; from memory",
    key: "C",
    abc: { meter: "3/4", unit: "1/4", notes: "CGG|G2F|EDC|C3|CAA|A3|CGG|G2F|EDC|C2C|FED|C3|]" },
  },
  {
    name: "Kum ba yah",
    source: "American spiritual, recorded 1926; from memory",
    key: "C",
    abc: { meter: "3/4", unit: "1/4", notes: "CE|G2G|A2A|G3|zCE|G2G|FED2|zCE|G2G|A2A|G3|FEC|D2D|C3|]" },
  },
  {
    name: "Londonderry Air",
    source: "G. Petrie, The Ancient Music of Ireland, 1855; from memory",
    key: "D",
    abc: {
      meter: "4/4",
      unit: "1/8",
      notes:
        "CDE|F3EFBAF|EDB,3DFG|A3BAFDF|E5CDE|F3EFBAF|EDB,3CDE|F3GFEDE|D5ABc|d3ccBAB|AFD3ABc|d3ccBAF|E5AAA|f3eedBd|AFD3CDE|FBAFEDB,C|D5|]",
    },
    chords: "D D7 G\nD Bm Em A7\nD D7 G\nD A7 D\nD G D Bm\nD Bm Em A7\nD G D Bm\nD A7 D",
  },
  {
    name: "Shenandoah",
    source: "American, 19th century; from memory",
    key: "D",
    abc: { meter: "4/4", unit: "1/4", notes: "A,|DDDE|FGBA|z2dc|BABA|FAzA|BBBF|AFED|zDEF2|DFB2|A3D|EFED|E2D2|]" },
    chords: "D G D\nG D\nBm F#m\nG D\nBm D A7 D",
  },
  {
    name: "Irish Washerwoman",
    source: "English and Irish jig, 18th century; from memory",
    key: "G",
    abc: {
      meter: "6/8",
      unit: "1/8",
      notes:
        "dc|BGGDGG|BGBdcB|cAAEAA|cAcedc|BGGDGG|BGBdcB|cBcAdc|BGGG2g|gdggdg|gdgbag|fdffdf|fdfagf|eggdgg|cggBgg|cBcAdc|BGGG|]",
    },
  },
  {
    name: "Kesh Jig",
    source: "Irish jig, 19th century; from memory",
    key: "G",
    abc: {
      meter: "6/8",
      unit: "1/8",
      notes:
        "GAGGAB|AGAABd|eddgdd|edBdBA|GAGGAB|AGAABd|eddgdB|AGFG3|B2BdBd|egedBG|B2BdBG|ABAAGA|BABdBd|egedBd|gfgaga|bggg3|]",
    },
  },
  {
    name: "Soldier's Joy",
    source: "British and American reel, 18th century; from memory",
    key: "D",
    abc: {
      meter: "4/4",
      unit: "1/8",
      notes: "AFDFAFDF|A2d2d2cB|AFDFAFDF|G2E2E2dB|AFDFAFDF|A2d2d2de|f2ffecAc|d2d2d4|]",
    },
  },
];
