import type { KnownSong } from "./knownSong";

/** Hymns, carols and chorales, tunes with or without chords. */
export const hymnsAndCarols: readonly KnownSong[] = [
  {
    name: "New Britain (Amazing Grace)",
    source: "American shape-note tune, Southern Harmony, 1835",
    key: "G",
    abc: {
      meter: "3/4",
      unit: "1/8",
      notes: "D2|G4 BG|B4 A2|G4 E2|D4 D2|G4 BG|B4 A2|d6-|d4 B2|d4 BG|B4 A2|G4 E2|D4 D2|G4 BG|B4 A2|G6-|G4|]",
    },
    chords: "G G7 C G\nG Em D D7\nG G7 C G\nEm D7 G",
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
    chords: "D A D A\nD A D\nA D A D A\nD A D",
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
    chords: "C C G7 C\nF C F C\nG7 C C G7 C",
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
    chords: "Em C B7\nEm C B7\nAm G C B7\nG C D7 G B7 Em D G\nB7 Em Am B7 Em",
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
    chords: "G C D G\nG C D G\nG D C D G\nG D C G C G",
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
    chords: "D A7 D\nG A7 D\nD D D D\nD A7\nD A7 D",
  },
  {
    name: "Old Hundredth",
    source: "Genevan Psalter, 1551",
    key: "G",
    abc: { meter: "4/4", unit: "1/4", notes: "G|GFED|G2AB2|BBBA|G2cB2|A2GAB|c2BA2|G2dB|G2AcBA|G3|]" },
  },
  {
    name: "Coventry Carol",
    source: "English, 16th century",
    key: "Gm",
    abc: { meter: "3/4", unit: "1/4", notes: "GG^F|G2B|A2G|^F3|GAB|cA2|G3|dcB|A2B|A2G|^F3|GAB|cA2|=B3|G3|]" },
    chords: "Gm D Gm Cm D\nGm F Gm D G",
  },
  {
    name: "Adeste fideles",
    source: "J. F. Wade, Cantus Diversi, 1751; from memory",
    key: "G",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes:
        "G|G2DG|A2D2|BABc|B2AG|G2FE|FGAB|F2E3/D/|D4|d2cB|c2B2|ABGA|F3/E/DG|GFGA|G2DB|BABc|B2AB|cBAG|F2Gc|B2A3/G/|G4|]",
    },
    chords: "G D G D\nG D Em A D A D\nG D G C G D\nG D G D G D\nG C G D7 G",
  },
  {
    name: "Hark! the herald (Mendelssohn)",
    source: "F. Mendelssohn, Festgesang, 1840, as in Hymns Ancient and Modern, 1861; from memory",
    key: "F",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes:
        "CFF3/E/|FAAG|cccB|AGA2|CFF3/E/|FAAG|cGGE|EDC2|cccF|BAAG|cccF|BAAG|dddc|BAB2|GA/B/cF|FGA2|dddc|BAB2|GA/B/cF|FGF2|]",
    },
    chords: "F C F Bb C F\nF C7 F C G7 C\nF Bb F C7 F C7\nBb Gm D7 Gm\nC7 F C F\nBb Gm C7 F C7 F",
  },
  {
    name: "Deck the Halls (Nos galan)",
    source: "E. Jones, Musical and Poetical Relicks of the Welsh Bards, 1784; from memory",
    key: "F",
    abc: {
      meter: "4/4",
      unit: "1/8",
      notes:
        "c3BA2G2|F2G2A2F2|GABG A3G|F2E2F4|c3BA2G2|F2G2A2F2|GABG A3G|F2E2F4|G3AB2G2|A3Bc2G2|A=Bc2 d=ef2|e2d2c4|c3BA2G2|F2G2A2F2|dddd c3B|A2G2F4|]",
    },
    chords: "F C7 F C F\nF C7 F C F\nC7 F C G7 C\nF Bb F C7 F",
  },
  {
    name: "O Tannenbaum",
    source: "E. Anschütz, 1824, older tune; from memory",
    key: "F",
    abc: {
      meter: "3/4",
      unit: "1/4",
      notes: "C|F3/F/FG|A3/A/AA|GABE|GFFc|cAdc|c2BB|BGcB|B2AC|F3/F/FG|A3/A/AA|GABE|GF2|]",
    },
    chords: "F C7 F\nGm C7 F\nF Bb C7 F\nF C7 F Gm C7 F",
  },
  {
    name: "Es ist ein Ros entsprungen",
    source: "Speyer Gesangbuch, 1599; from memory",
    key: "F",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "c2ccdc|c2A2|B2AG|F2E2F4|c2ccdc|c2A2|B2AG|F2E2F4|A2GEFD|C4|c2ccdc|c2A2|B2AG|F2E2F4|]",
    },
    chords: "F Bb F Dm\nGm F C F\nF C Dm G C\nF Bb F Dm\nBb F C F",
  },
  {
    name: "Ein feste Burg",
    source: "M. Luther, Klug Gesangbuch, 1533; from memory",
    key: "C",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "c|ccG/A/c|BAGc|BAGA|FE/D/Cc|ccG/A/c|BAGc|BAGA|FE/D/CC|GAGF|G2CG|AGFE|cBAG|AFE/D/C|C4|]",
    },
  },
  {
    name: "Veni Emmanuel",
    source: "T. Helmore, The Hymnal Noted, 1851 (15th-century processional); from memory",
    key: "Em",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "E|GBBB|AcBA|G3A|BGEG|AFED|E3A|AEEF|G2FE|D3G|ABBB|AcBA|G3d|d2-dB|B2-BB|AcBA|G3A|BGEG|AFED|E4|]",
    },
    chords: "Em G Em D Em\nAm Em Am Bm Em\nAm Em D\nG Em Am D G\nD Bm Am D Em\nAm Em Bm Em",
  },
  {
    name: "Angels We Have Heard (Gloria)",
    source: "French traditional, Chants populaires, 19th century; from memory",
    key: "F",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes:
        "AAAc|c3/B/A2|AGAc|A3/G/F2|AAAc|c3/B/A2|AGAc|A3/G/F2|c2d/c/B/A/|B2c/B/A/G/|A2B/A/G/F/|G3/C/C2|FGAB|A2G2|c2d/c/B/A/|B2c/B/A/G/|A2B/A/G/F/|G3/C/C2|FGAB|A2G2|F4|]",
    },
    chords: "F C F C F\nF C F C F\nF D7 Gm C F Dm C\nF C F Bb F C\nF D7 Gm C F Dm C F C F",
  },
  {
    name: "Jingle Bells, chorus",
    source: "J. Pierpont, One Horse Open Sleigh, 1857; from memory",
    key: "G",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "BBB2|BBB2|BdG3/A/|B4|ccc3/c/|cBBB/B/|BAAB|A2d2|BBB2|BBB2|BdG3/A/|B4|ccc3/c/|cBBB/B/|ddcA|G4|]",
    },
    chords: "G G G G\nC G A7 D7\nG G G G\nC G D7 G",
  },
  {
    name: "Simple Gifts",
    source: "Shaker dance song, Alfred, Maine, 1848; from memory",
    key: "G",
    abc: {
      meter: "4/4",
      unit: "1/8",
      notes:
        "DD|G2GA BGBc|d2dc B2AG|A2A2 A2AG|A2BA F2D2|G2GA BGBc|d2cB A2AB|A2G2 G2GG|G4 d4|B2AB cBAG|A2AB A2GA|B2BB c2d2|A4 D2D2|G2GA BGBc|d2cB A2AB|A2G2 G4|]",
    },
    chords: "G G D D\nG D G\nG C D\nG D G",
  },
  {
    name: "Holy Manna",
    source: "W. Moore, Columbian Harmony, 1825; from memory",
    key: "G",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "DE|GGGA|BGGE|DDEG|A2GE|GGGA|BGGE|DEGA|G2Bd|eedB|dBAG|BddB|A2DE|GGGA|BGGE|DEGA|G2|]",
    },
  },
];
