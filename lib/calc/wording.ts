/** Words and numbers inside the sentences of the calculation. */

/** Two significant figures, as margins are read. */
export const twoDigits = (value: number): string => String(Number(value.toPrecision(2)));

/** A name inside a sentence: "the wide sand stake" from "Wide sand stake"; short forms like "V section" keep theirs. */
export const inSentence = (name: string): string =>
  /^[A-Z][a-z]/.test(name) ? `${name.charAt(0).toLowerCase()}${name.slice(1)}` : name;
