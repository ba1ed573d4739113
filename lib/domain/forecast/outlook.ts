import type { Verdict } from "@/lib/calc/types";

/** Best first. What is not known ranks below what is thin: nobody can say that it holds. */
const ORDER: readonly Verdict[] = ["holds", "thin", "unknown", "gives-way"];

const NOW: Readonly<Record<Verdict, string>> = {
  holds: "now holds",
  thin: "is now thin",
  "gives-way": "now gives way",
  unknown: "is not known now",
};
const STILL: Readonly<Record<Verdict, string>> = {
  holds: "still holds",
  thin: "is still thin",
  "gives-way": "still gives way",
  unknown: "is still not known",
};
const WAS: Readonly<Record<Verdict, string>> = {
  holds: "holds",
  thin: "thin",
  "gives-way": "gives way",
  unknown: "not known",
};

export function isWorse(before: Verdict, after: Verdict): boolean {
  return ORDER.indexOf(after) > ORDER.indexOf(before);
}

/** "Skarn Edge now gives way: was holds", "Skarn Edge still holds". */
export function compareVerdicts(name: string, before: Verdict, after: Verdict): string {
  if (before === after) return `${name} ${STILL[after]}`;
  return `${name} ${NOW[after]}: was ${WAS[before]}`;
}
