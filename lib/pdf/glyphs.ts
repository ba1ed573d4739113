/**
 * What Nunito Sans can draw. Anything else would come out as wrong or empty boxes, so it is replaced here, where it
 * can be seen: a Latin spelling where a simple one exists, else [?].
 */

/** First and last code points that the registered subsets cover (latin, latin-ext, cyrillic, cyrillic-ext, vietnamese). */
const COVERED: readonly (readonly [number, number])[] = [
  [0x20, 0x7e],
  [0xa0, 0x130],
  [0x132, 0x151],
  [0x152, 0x17e],
  [0x18f, 0x18f],
  [0x192, 0x192],
  [0x1a0, 0x1a1],
  [0x1af, 0x1b0],
  [0x1cd, 0x1ce],
  [0x1e6, 0x1e7],
  [0x1ea, 0x1eb],
  [0x1fa, 0x21b],
  [0x237, 0x237],
  [0x259, 0x259],
  [0x2bb, 0x2bc],
  [0x2c6, 0x2c7],
  [0x300, 0x301],
  [0x303, 0x304],
  [0x308, 0x309],
  [0x323, 0x323],
  [0x400, 0x45f],
  [0x462, 0x463],
  [0x490, 0x4a5],
  [0x4a8, 0x4ff],
  [0x1e0c, 0x1e0d],
  [0x1e24, 0x1e25],
  [0x1e62, 0x1e63],
  [0x1e80, 0x1e85],
  [0x1e9e, 0x1e9e],
  [0x1ea0, 0x1ef9],
  [0x2009, 0x2009],
  [0x2013, 0x2014],
  [0x2018, 0x201a],
  [0x201c, 0x201e],
  [0x2020, 0x2020],
  [0x2022, 0x2022],
  [0x2026, 0x2026],
  [0x2032, 0x2033],
  [0x2039, 0x203a],
  [0x2044, 0x2044],
  [0x20ac, 0x20ac],
  [0x2116, 0x2116],
  [0x2122, 0x2122],
  [0x2212, 0x2212],
];

/** Greek in Latin letters, letter by letter, after ISO 843 (without its marks); digraphs first. */
const GREEK: Readonly<Record<string, string>> = {
  αυ: "av",
  ευ: "ev",
  ου: "ou",
  μπ: "mp",
  ντ: "nt",
  γγ: "ng",
  γξ: "nx",
  γχ: "nch",
  γκ: "gk",
  α: "a",
  β: "v",
  γ: "g",
  δ: "d",
  ε: "e",
  ζ: "z",
  η: "i",
  θ: "th",
  ι: "i",
  κ: "k",
  λ: "l",
  μ: "m",
  ν: "n",
  ξ: "x",
  ο: "o",
  π: "p",
  ρ: "r",
  σ: "s",
  ς: "s",
  τ: "t",
  υ: "y",
  φ: "f",
  χ: "ch",
  ψ: "ps",
  ω: "o",
};

/** Signs that people paste and that have a plain spelling. */
const SPELLED: Readonly<Record<string, string>> = {
  "\u2192": "->",
  "\u2190": "<-",
  "\u2264": "<=",
  "\u2265": ">=",
  "\u2248": "~",
  "\u2010": "-",
  "\u2011": "-",
  "\u2012": "-",
  "\u2015": "\u2014",
  "\u2007": " ",
  "\u2008": " ",
  "\u200a": " ",
  "\u202f": "\u2009",
  "\u2003": " ",
  "\u2002": " ",
  "\u2004": " ",
  "\u2005": " ",
  "\u2006": " ",
  "\u3000": " ",
  "\u2126": "Ohm",
};

const UNKNOWN = "[?]";

/** Controls, marks of direction, joiners, selectors and lone surrogates: nothing of them is ever to be seen. */
const INVISIBLE = /[\p{Cc}\p{Cf}\p{Cs}\u2028\u2029\uFE00-\uFE0F\u{E0100}-\u{E01EF}]/gu;

export function hasGlyph(character: string): boolean {
  const code = character.codePointAt(0) ?? 0;
  return COVERED.some(([first, last]) => code >= first && code <= last);
}

function spellGreek(text: string): string {
  if (!/\p{Script=Greek}/u.test(text)) return text;
  return text.replace(/\p{Script=Greek}[\p{Script=Greek}\p{M}]*/gu, (word) => {
    const plain = word.normalize("NFD").replace(/\p{M}/gu, "");
    const lower = plain.toLowerCase();
    let latin = "";
    for (let i = 0; i < lower.length;) {
      const pair = GREEK[lower.slice(i, i + 2)];
      const length = pair === undefined ? 1 : 2;
      const spelled = pair ?? GREEK[lower.slice(i, i + 1)];
      const isLarge = plain.slice(i, i + 1) !== lower.slice(i, i + 1);
      if (spelled === undefined) latin += plain.slice(i, i + 1);
      else latin += isLarge ? spelled.charAt(0).toUpperCase() + spelled.slice(1) : spelled;
      i += length;
    }
    return latin;
  });
}

/** The letter without what the font cannot draw on it: "ȟ" → "h"; null when there is no such letter. */
function plainLetter(character: string): string | null {
  const base = [...character.normalize("NFKD")].filter((part) => !/\p{M}/u.test(part));
  return base.length > 0 && base.every(hasGlyph) ? base.join("") : null;
}

/** Text that the fonts can draw, line breaks kept. */
export function printable(text: string): string {
  const lines = text.normalize("NFC").replace(/\r\n?/g, "\n").replace(/\t/g, " ").split("\n");
  return lines.map(printableLine).join("\n");
}

function printableLine(line: string): string {
  let result = "";
  let wasUnknown = false;
  for (const character of spellGreek(line.replace(INVISIBLE, ""))) {
    if (hasGlyph(character)) {
      result += character;
      wasUnknown = false;
      continue;
    }
    const known = SPELLED[character] ?? plainLetter(character);
    if (known !== null && known !== undefined) {
      result += known;
      wasUnknown = false;
    } else if (!wasUnknown && !/\p{M}/u.test(character)) {
      result += UNKNOWN;
      wasUnknown = true;
    }
  }
  return result;
}
