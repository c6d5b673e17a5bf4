import type { SheetFace, SheetRun, SheetText, SheetTone } from "./sheetPiece";

/** Every letter of the mono faces is so wide, in parts of its size. */
export const cellWidth = 0.58;

/** Signs of the music font stand larger than the letters beside them, and all but the flat a little higher. */
const musicScale = 1.25;
const musicWidths: Readonly<Record<string, number>> = { "♯": 325, "♭": 299, "♮": 276 };
const lift = (sign: string) => (sign === "♭" ? 0.05 : 0.14);

/** For letters that the table does not hold. */
const usualWidth = 600;

/** Advance widths in thousandths of the size, from U+0020 to U+007E and from U+00A0 to U+00FF. */
const widths = {
  title: {
    plain: [
      230, 291, 360, 626, 642, 977, 754, 177, 321, 316, 436, 528, 196, 352, 233, 361, 665, 346, 603, 606, 624, 610, 657,
      509, 656, 652, 243, 220, 528, 528, 528, 421, 987, 698, 683, 680, 700, 621, 593, 721, 723, 293, 373, 687, 508, 939,
      775, 722, 646, 724, 679, 652, 571, 728, 673, 986, 697, 642, 571, 324, 357, 319, 572, 554, 283, 585, 638, 566, 639,
      581, 399, 601, 631, 277, 281, 591, 274, 946, 631, 609, 638, 639, 434, 544, 397, 622, 572, 863, 569, 602, 524, 349,
      271, 342, 528,
    ],
    latin: [
      230, 291, 566, 718, 500, 629, 271, 567, 387, 959, 430, 462, 528, 500, 686, 338, 360, 528, 431, 420, 283, 639, 698,
      233, 299, 260, 423, 462, 939, 940, 1084, 418, 698, 698, 698, 698, 698, 698, 954, 680, 621, 621, 621, 621, 293,
      293, 293, 293, 747, 775, 722, 722, 722, 722, 722, 528, 731, 728, 728, 728, 728, 642, 647, 682, 585, 585, 585, 585,
      585, 585, 927, 566, 581, 581, 581, 581, 277, 276, 276, 276, 612, 631, 609, 609, 609, 609, 609, 528, 609, 622, 622,
      622, 622, 602, 638, 602,
    ],
  },
  text: {
    plain: [
      247, 298, 320, 629, 563, 786, 644, 200, 352, 352, 481, 623, 226, 417, 208, 389, 641, 413, 559, 544, 621, 575, 566,
      537, 614, 566, 253, 259, 623, 623, 623, 504, 989, 677, 611, 721, 688, 592, 543, 760, 751, 271, 515, 610, 520, 846,
      774, 776, 579, 780, 626, 614, 552, 707, 693, 960, 614, 604, 641, 324, 389, 324, 551, 438, 221, 510, 586, 541, 586,
      546, 369, 587, 558, 232, 269, 485, 220, 851, 558, 580, 591, 578, 338, 466, 378, 558, 520, 784, 475, 526, 491, 385,
      257, 385, 567,
    ],
    latin: [
      247, 294, 536, 576, 555, 543, 271, 570, 439, 815, 331, 551, 623, 500, 623, 300, 369, 623, 361, 354, 221, 558, 546,
      254, 214, 281, 365, 551, 828, 860, 901, 463, 677, 677, 677, 677, 677, 677, 1001, 721, 592, 592, 592, 592, 271,
      271, 271, 275, 751, 774, 776, 776, 776, 776, 776, 623, 784, 707, 707, 707, 707, 604, 583, 564, 509, 509, 509, 509,
      509, 509, 878, 541, 547, 547, 547, 547, 232, 232, 232, 232, 584, 558, 580, 580, 580, 580, 580, 623, 579, 558, 558,
      558, 558, 526, 586, 526,
    ],
  },
  textBold: {
    plain: [
      241, 307, 376, 630, 558, 802, 646, 227, 370, 370, 485, 629, 245, 411, 232, 415, 645, 419, 571, 551, 628, 578, 574,
      548, 613, 574, 282, 287, 629, 629, 629, 509, 991, 699, 612, 723, 695, 590, 550, 750, 750, 282, 537, 644, 530, 853,
      774, 783, 594, 785, 637, 610, 572, 705, 711, 975, 653, 630, 635, 336, 415, 336, 569, 436, 247, 524, 592, 544, 591,
      551, 384, 596, 565, 250, 282, 517, 236, 864, 564, 581, 597, 586, 363, 466, 393, 564, 542, 815, 512, 556, 483, 391,
      257, 391, 628,
    ],
    latin: [
      241, 298, 539, 588, 581, 575, 291, 542, 467, 802, 335, 600, 629, 500, 618, 300, 374, 629, 365, 354, 247, 564, 570,
      258, 227, 281, 363, 600, 834, 866, 908, 467, 699, 699, 699, 699, 699, 699, 1011, 723, 590, 590, 590, 590, 282,
      282, 282, 292, 748, 774, 783, 783, 783, 783, 783, 629, 787, 705, 705, 705, 705, 630, 602, 578, 520, 520, 520, 520,
      520, 520, 876, 544, 553, 553, 553, 553, 250, 250, 250, 250, 577, 564, 581, 581, 581, 581, 581, 629, 579, 564, 564,
      564, 564, 556, 592, 556,
    ],
  },
} as const;

/**
 * How wide a line of words is.
 *
 * @param text one line, accidentals as glyphs
 * @param face which face
 * @param size of the letters
 * @returns width in the unit of the size
 * @see the advance widths of the shipped fonts, without kerning
 * @example textWidth("F♯m", "mono", 100) // => 174
 */
export function textWidth(text: string, face: SheetFace, size: number): number {
  let thousandths = 0;
  for (const sign of text) thousandths += advance(sign, face);
  return (thousandths * size) / 1000;
}

/** Where a line of words stands. */
interface TextPlace {
  x: number;
  /** of the base line */
  y: number;
  size: number;
  face: SheetFace;
  tone: SheetTone;
  /** which point of the line `x` is */
  anchor?: "start" | "middle" | "end";
  role?: SheetText["role"];
}

/**
 * Sets one line of words: each accidental in a run of its own, in the mono faces on its own column.
 *
 * @param text one line, accidentals as glyphs
 * @param place where and how
 * @returns the line
 */
export function textPiece(text: string, place: TextPlace): SheetText {
  const { size, face, tone, anchor = "start", role = "plain" } = place;
  const width = anchor === "start" ? 0 : textWidth(text, face, size);
  let x = place.x - (anchor === "middle" ? width / 2 : width);
  const runs: SheetRun[] = [];
  for (const [part] of text.matchAll(/[♯♭♮]|[^♯♭♮]+/gu)) {
    const room = textWidth(part, face, size);
    const natural = musicWidths[part];
    if (natural === undefined) runs.push({ text: part, x, y: place.y, size, music: false });
    else {
      const inset = (room - (natural * size * musicScale) / 1000) / 2;
      runs.push({ text: part, x: x + inset, y: place.y - size * lift(part), size: size * musicScale, music: true });
    }
    x += room;
  }
  return { kind: "text", runs, face, tone, role };
}

/**
 * Breaks words into lines, at blanks where there are any, else inside a word.
 *
 * @param text any text
 * @param face which face
 * @param size of the letters
 * @param room greatest width of a line
 * @returns the lines, none of them empty
 */
export function wrapText(text: string, face: SheetFace, size: number, room: number): string[] {
  const lines: string[] = [];
  let line = "";
  const fits = (words: string) => textWidth(words, face, size) <= room;
  for (const word of text.split(/\s+/).filter((part) => part !== "")) {
    const longer = line === "" ? word : `${line} ${word}`;
    if (fits(longer)) {
      line = longer;
      continue;
    }
    if (line !== "") lines.push(line);
    line = "";
    let width = 0;
    for (const sign of word) {
      const wide = textWidth(sign, face, size);
      if (line !== "" && width + wide > room) {
        lines.push(line);
        [line, width] = ["", 0];
      }
      line += sign;
      width += wide;
    }
  }
  return line === "" ? lines : [...lines, line];
}

function advance(sign: string, face: SheetFace): number {
  if (face === "mono" || face === "monoBold") return cellWidth * 1000 * sign.length;
  const music = musicWidths[sign];
  if (music !== undefined) return music * musicScale + 20;
  const point = sign.codePointAt(0)!;
  const { plain, latin } = widths[face];
  return (point < 0xa0 ? plain[point - 0x20] : latin[point - 0xa0]) ?? usualWidth;
}
