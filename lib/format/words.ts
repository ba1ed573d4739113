const NUMBERS = [
  "no",
  "one",
  "two",
  "three",
  "four",
  "five",
  "six",
  "seven",
  "eight",
  "nine",
  "ten",
  "eleven",
  "twelve",
];

/** Words up to twelve, figures above: "three", "14". */
export function numberWord(count: number): string {
  return NUMBERS[count] ?? String(count);
}

/** "1 night", "3 nights"; an irregular plural is given. */
export function plural(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** "a", "a and b", "a, b and c". */
export function joinWords(words: readonly string[]): string {
  if (words.length < 2) return words[0] ?? "";
  return `${words.slice(0, -1).join(", ")} and ${words[words.length - 1]}`;
}

/** First letter large. */
export function startSentence(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
