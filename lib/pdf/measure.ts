import type { FontWeight } from "./fonts";
import { printable } from "./glyphs";

/** Advance widths of U+0020…U+007E in Nunito Sans, thousandths of the type size, read from its font files. */
const ADVANCE: Readonly<Record<FontWeight, readonly number[]>> = {
  400: [
    257, 228, 391, 600, 600, 930, 693, 221, 317, 317, 450, 600, 228, 424, 228, 283, 600, 600, 600, 600, 600, 600, 600,
    600, 600, 600, 228, 228, 600, 600, 600, 443, 946, 729, 676, 673, 742, 583, 548, 726, 761, 256, 324, 625, 543, 855,
    740, 767, 633, 767, 669, 615, 602, 728, 689, 1101, 650, 596, 589, 315, 283, 315, 600, 500, 500, 530, 583, 463, 583,
    532, 333, 586, 568, 232, 236, 500, 296, 856, 568, 556, 583, 583, 358, 481, 350, 561, 515, 841, 525, 514, 463, 352,
    265, 352, 600,
  ],
  600: [
    263, 237, 417, 600, 600, 937, 708, 230, 336, 336, 451, 600, 237, 429, 237, 297, 600, 600, 600, 600, 600, 600, 600,
    600, 600, 600, 237, 237, 600, 600, 600, 450, 948, 736, 682, 676, 751, 589, 554, 731, 767, 267, 338, 643, 552, 861,
    743, 775, 642, 775, 677, 622, 611, 733, 700, 1107, 660, 606, 596, 333, 297, 333, 600, 500, 500, 537, 591, 467, 591,
    537, 347, 594, 576, 243, 246, 516, 306, 866, 576, 565, 591, 591, 373, 484, 365, 569, 520, 846, 534, 520, 468, 370,
    276, 370, 600,
  ],
  800: [
    278, 260, 480, 600, 600, 954, 745, 255, 382, 382, 454, 600, 260, 440, 260, 331, 600, 600, 600, 600, 600, 600, 600,
    600, 600, 600, 260, 260, 600, 600, 600, 468, 952, 753, 695, 683, 774, 605, 570, 742, 780, 296, 373, 687, 573, 876,
    753, 796, 664, 796, 696, 641, 632, 743, 727, 1120, 685, 631, 615, 377, 331, 377, 600, 500, 500, 557, 610, 478, 610,
    549, 382, 615, 595, 268, 273, 558, 333, 889, 595, 589, 610, 610, 412, 492, 404, 590, 534, 861, 559, 533, 480, 414,
    302, 414, 600,
  ],
};

/** A little more than most letters take, so that what is estimated to fit does fit. */
const OTHER_LOWER = 640;
const OTHER_UPPER = 860;
const THIN_SPACE = 200;

function advanceOf(character: string, weight: FontWeight): number {
  if (character === "\u2009") return THIN_SPACE;
  const base = character.normalize("NFD").charCodeAt(0);
  const known = ADVANCE[weight][base - 32];
  if (known !== undefined && base >= 32) return known;
  return character === character.toLowerCase() ? OTHER_LOWER : OTHER_UPPER;
}

export function textWidth(text: string, size: number, weight: FontWeight = 400): number {
  let sum = 0;
  for (const character of text) sum += advanceOf(character, weight);
  return (sum * size) / 1000;
}

/** A word wider than its column would run off the paper: it is cut, after a sign that joins words where there is one. */
function cutWord(word: string, width: number, size: number, weight: FontWeight): string[] {
  const pieces: string[] = [];
  let rest = [...word];
  while (rest.length > 1 && textWidth(rest.join(""), size, weight) > width) {
    let count = 1;
    while (count < rest.length && textWidth(rest.slice(0, count + 1).join(""), size, weight) <= width) count += 1;
    const joint = rest.slice(0, count).findLastIndex((character) => "/-._@?&=".includes(character)) + 1;
    const cut = joint > count / 2 ? joint : count;
    pieces.push(rest.slice(0, cut).join(""));
    rest = rest.slice(cut);
  }
  return [...pieces, rest.join("")];
}

/** Printable text laid into lines of a width. What is returned is drawn as it stands, so heights are known beforehand. */
export function layLines(text: string, width: number, size: number, weight: FontWeight = 400): string[] {
  const lines: string[] = [];
  for (const paragraph of printable(text).split("\n")) {
    let line = "";
    for (const word of paragraph.split(/ +/)) {
      const longer = line === "" ? word : `${line} ${word}`;
      if (textWidth(longer, size, weight) <= width) {
        line = longer;
        continue;
      }
      if (line !== "") lines.push(line);
      const pieces = cutWord(word, width, size, weight);
      lines.push(...pieces.slice(0, -1));
      line = pieces[pieces.length - 1] ?? "";
    }
    lines.push(line);
  }
  return lines;
}
