/**
 * Keys that published hymnals, carol books and songbooks print a tune in; all from memory, none looked up page by page.
 * Names are those of `knownSongs`; a tonic, in the mode of the song there.
 */
export const printedKeys: readonly { name: string; tonics: readonly string[]; printedIn: string }[] = [
  {
    name: "Old Hundredth",
    tonics: ["G", "A"],
    printedIn: "G: The United Methodist Hymnal, 1989, no. 95; A: Hymns Ancient and Modern, 1861",
  },
  {
    name: "New Britain (Amazing Grace)",
    tonics: ["G", "F"],
    printedIn: "G: The Hymnal 1982, no. 671; F: Evangelical Lutheran Worship, 2006, no. 779",
  },
  { name: "Joy to the World (Antioch)", tonics: ["D"], printedIn: "The Hymnal 1982, no. 100" },
  {
    name: "Adeste fideles",
    tonics: ["G", "A"],
    printedIn: "G: The Hymnal 1982, no. 83; A: Hymns Ancient and Modern, 1861",
  },
  {
    name: "Hark! the herald (Mendelssohn)",
    tonics: ["F", "G"],
    printedIn: "F: The Hymnal 1982, no. 87; G: Hymns Ancient and Modern, 1861",
  },
  { name: "Veni Emmanuel", tonics: ["E"], printedIn: "The Hymnal 1982, no. 56" },
  { name: "Ode to Joy", tonics: ["G"], printedIn: "The Hymnal 1982, no. 376 (Hymn to Joy)" },
  { name: "Silent Night", tonics: ["Bb"], printedIn: "The Hymnal 1982, no. 111" },
  { name: "Good King Wenceslas", tonics: ["G"], printedIn: "Carols for Choirs 1, 1961" },
  { name: "Es ist ein Ros entsprungen", tonics: ["F"], printedIn: "The Hymnal 1982, no. 81" },
  {
    name: "Ein feste Burg",
    tonics: ["C", "D"],
    printedIn: "C: The United Methodist Hymnal, 1989, no. 110; D: Lutheran Book of Worship, 1978",
  },
  { name: "Angels We Have Heard (Gloria)", tonics: ["F"], printedIn: "The Hymnal 1982, no. 96" },
  { name: "Holy Manna", tonics: ["G"], printedIn: "The United Methodist Hymnal, 1989, no. 150" },
  { name: "Simple Gifts", tonics: ["F"], printedIn: "The Hymnal 1982, no. 554" },
  { name: "Greensleeves", tonics: ["E"], printedIn: "The Hymnal 1982, no. 115" },
  { name: "God Rest You Merry", tonics: ["E"], printedIn: "The Hymnal 1982, no. 105" },
  { name: "Coventry Carol", tonics: ["G"], printedIn: "The Oxford Book of Carols, 1928, no. 22" },
  { name: "Noël nouvelet", tonics: ["E"], printedIn: "The Hymnal 1982, no. 204" },
  { name: "Auld Lang Syne", tonics: ["F"], printedIn: "The Golden Book of Favorite Songs, 1923" },
  { name: "Deck the Halls (Nos galan)", tonics: ["F"], printedIn: "The Golden Book of Favorite Songs, 1923" },
  { name: "O Tannenbaum", tonics: ["F"], printedIn: "The Golden Book of Favorite Songs, 1923 (Maryland, my Maryland)" },
];
