import type { Verdict } from "@/lib/calc/types";

/** Best first. What is not known ranks below what is thin: nobody can say that it holds. */
const ORDER: readonly Verdict[] = ["holds", "thin", "unknown", "gives-way"];

const NOW: Readonly<Record<Verdict, string>> = {
  holds: "holds",
  thin: "is thin",
  "gives-way": "gives way",
  unknown: "is not known",
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
  if (before === after) return `${name} still ${NOW[after]}`;
  return `${name} now ${NOW[after]}: was ${WAS[before]}`;
}
