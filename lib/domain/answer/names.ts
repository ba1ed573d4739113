// Apart from the schema: the browser needs these and not zod.
export const ANSWER_VALUES = ["yes", "maybe", "no"] as const;
export type AnswerValue = (typeof ANSWER_VALUES)[number];

export const ANSWER_NAMES: Readonly<Record<AnswerValue, string>> = {
  yes: "Yes, I come",
  maybe: "Maybe",
  no: "No, I can't",
};
