import type { KnownSong } from "./knownSong";

/** Tunes in minor, dorian and mixolydian. */
export const minorTunes: readonly KnownSong[] = [
  {
    name: "Scarborough Fair",
    source: "English traditional",
    key: "E dorian",
    abc: {
      meter: "3/4",
      unit: "1/4",
      notes: "E2E|B2B|F3/G/F|E3|zBd|e2d|B^cA|B3|zze|e2e|d2B|BAG|FD2|E2B|A2G|FED|E3|]",
    },
    chords: "Em D Em\nG Em A Em\nEm G D\nEm D Em",
  },
  {
    name: "Drunken Sailor",
    source: "sea shanty, 19th century",
    key: "D dorian",
    abc: {
      meter: "2/4",
      unit: "1/8",
      notes: "AA/A/AA/A/|ADFA|GG/G/GG/G/|GCEG|AA/A/AA/A/|ABcd|cAGE|D2D2|A2A>A|ADFA|G2G>G|GCEG|A2A>A|ABcd|cAGE|D2D2|]",
    },
    chords: "Dm Dm C C\nDm Dm C Dm\nDm Dm C C\nDm Dm C Dm",
  },
  {
    name: "When Johnny Comes Marching Home",
    source: "P. S. Gilmore, 1863; from memory",
    key: "Em",
    abc: {
      meter: "6/8",
      unit: "1/8",
      notes:
        "B,|E2EE2F|G2FG2A|B3G3|B3z2B,|E2EE2F|G2FG2A|B3G3|B3z2B|d2dd2c|B2AB2B|c2cc2B|A2GA2A|B2GA2F|G2EF2D|E2EE2D|E5|]",
    },
    chords: "Em Em G B7\nEm Em G B7\nG D Am B7\nEm D C B7 Em",
  },
  {
    name: "Korobeiniki",
    source: "Russian, tune of about 1861; from memory",
    key: "Am",
    abc: { meter: "4/4", unit: "1/8", notes: "e2Bcd2cB|A2Ace2dc|B3cd2e2|c2A2A4|zd2fa2gf|e3ce2dc|B2Bcd2e2|c2A2A4|]" },
    chords: "E Am\nE Am\nDm C\nE Am",
  },
  {
    name: "La Mantovana",
    source: "G. Cenci, Fuggi, fuggi, about 1600; from memory",
    key: "Dm",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "DEFG|A2A2|BABd|A4|GGGG|F2F2|EDEF|D4|DEFG|A2A2|BABd|A4|GGGG|F2F2|EDEF|D4|]",
    },
    chords: "Dm Gm Dm\nGm Dm A Dm\nDm Gm Dm\nGm Dm A Dm",
  },
  {
    name: "Belle qui tiens ma vie",
    source: "T. Arbeau, Orchésographie, 1589; from memory",
    key: "Gm",
    abc: { meter: "4/4", unit: "1/4", notes: "G2G^F|G2A2|B2A2|G4|B2BB|A2G2|G2^F2|G4|]" },
    chords: "Gm D Gm F\nBb F Gm\nBb F Gm D Gm",
  },
  {
    name: "Hey, Ho, Nobody Home",
    source: "T. Ravenscroft, Pammelia, 1609; from memory",
    key: "Dm",
    abc: { meter: "4/4", unit: "1/4", notes: "D2C2|DDA,2|D3/D/EE|FFE2|A2G2|A2GF|E2C2|D2C2|D4|]" },
  },
  {
    name: "Shalom chaverim",
    source: "Hebrew round, traditional; from memory",
    key: "Em",
    abc: { meter: "4/4", unit: "1/4", notes: "B,|E2EF|G2EE|GGAB|G3B|e2d2|B2AG|F2B,2|E3B,|E4|]" },
  },
  {
    name: "The Butterfly",
    source: "Irish slip jig, 19th century; from memory",
    key: "Em",
    abc: {
      meter: "9/8",
      unit: "1/8",
      notes:
        "B2EG2EF3|B2EG2EFED|B2EG2EF3|B2dd2BAFD|B2ce2fg3|B2dg2edBA|B2ce2fg2a|b2ag2edBA|B3B2AG2A|B3BABdBA|B3B2AG2A|B2dg2edBA|B2EG2EE3|]",
    },
  },
  {
    name: "Morrison's Jig",
    source: "Irish jig, 19th century; from memory",
    key: "E dorian",
    abc: {
      meter: "6/8",
      unit: "1/8",
      notes:
        "E3B3|EBEAFD|EDEB3|dcBAFD|E3B3|EBEAFD|G3FGA|dAGFED|Beefee|aeefee|Beefee|a2gfed|Beefee|aeefee|gfed2A|BAGFED|E6|]",
    },
  },
  {
    name: "Cooley's Reel",
    source: "Irish reel, 19th century; from memory",
    key: "E dorian",
    abc: {
      meter: "4/4",
      unit: "1/8",
      notes:
        "EBBAB2EB|B2ABdBAG|FDADBDAD|FDADdAFD|EBBAB2EB|B2ABdefg|afecdBAF|DEFDE2gf|eBB2eBgf|eBB2gedB|A2FADAFA|A2FAdefg|eBB2eBgf|eBB2gefg|afecdBAF|DEFDE4|]",
    },
    chords: "Em Em D D\nEm Em D Em\nEm Em D D\nEm Em D Em",
  },
  {
    name: "Swallowtail Jig",
    source: "Irish jig, 19th century; from memory",
    key: "E dorian",
    abc: {
      meter: "6/8",
      unit: "1/8",
      notes:
        "GEEBEE|GEGBAG|FDDADD|dcdAGF|GEEBEE|GEGB2c|dcdAGF|GEEE3|B2cd2e|f2eedB|B2cdBf|edBe3|B2cd2e|f2eedB|dBGAGF|GEEE3|]",
    },
    chords: "Em Em D D\nEm Em D Em\nEm D Em\nEm D Em",
  },
  {
    name: "Noël nouvelet",
    source: "French carol, 15th century; from memory",
    key: "D dorian",
    abc: {
      meter: "4/4",
      unit: "1/4",
      notes: "DAGA|BAG2|AGFG|A2D2|DAGA|BAG2|AGFE|D4|AAGA|BAG2|AAGA|BAG2|DAGA|BAG2|AGFE|D4|]",
    },
    chords: "Dm G\nDm Am Dm\nDm G\nDm C Dm",
  },
  {
    name: "Old Joe Clark",
    source: "American fiddle tune, 19th century; from memory",
    key: "A mixolydian",
    abc: {
      meter: "4/4",
      unit: "1/8",
      notes:
        "e2f2g2fe|d2e2c4|e2f2g2fe|d2B2e4|e2f2g2fe|d2e2c2A2|c2B2A2G2|A8|A2A2c2d2|e4A4|A2B2A2F2|G8|A2A2c2d2|e4c2A2|c2B2A2G2|A8|]",
    },
    chords: "A A A G\nA A G A\nA A A G\nA A G A",
  },
  {
    name: "Banish Misfortune",
    source: "Irish jig, P. W. Joyce, Ancient Irish Music, 1873; from memory",
    key: "D mixolydian",
    abc: {
      meter: "6/8",
      unit: "1/8",
      notes:
        "fedcAG|A2dcAG|F2DDED|FEFGFG|A3cAG|AGAcde|fedcAG|Adcd3|f2dd^cd|f2gagf|e2ccBc|e2fgfe|f2gagf|e2fgfe|fedcAG|Adcd3|]",
    },
    chords: "D C D\nD C G\nD C\nD C D",
  },
  {
    name: "Red-Haired Boy",
    source: "Irish and American reel, 19th century; from memory",
    key: "A mixolydian",
    abc: {
      meter: "4/4",
      unit: "1/8",
      notes: "EG|A2AAABcd|efecd2cd|eAAAA2AB|=c2BAGEFG|A2AAABcd|efecd2cd|eaafgfed|c2A2A2|]",
    },
    chords: "A D\nA G\nA D\nA G A",
  },
];
