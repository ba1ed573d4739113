/** Control characters (but line breaks and tabs) and marks that turn the reading direction round. */
const UNPRINTABLE = /[\p{Cc}\u202A-\u202E\u2066-\u2069\u200B\uFEFF]/gu;

export function cleanText(text: string, keepsLines: boolean): string {
  const kept = text.normalize("NFC").replace(/\r\n?/g, "\n");
  const cleaned = kept.replace(UNPRINTABLE, (mark) => (keepsLines && (mark === "\n" || mark === "\t") ? mark : ""));
  return cleaned.trim();
}

/** One line, line breaks as spaces. */
export function cleanLine(text: string): string {
  return cleanText(text.replace(/\s+/g, " "), false);
}
