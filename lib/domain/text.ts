import { z } from "zod";
import { cleanText } from "./clean-text";

/** One line of text: normalised, without control characters, 1…max characters. */
export function lineText(what: string, max: number) {
  return z
    .string({ error: `Enter ${what}.` })
    .max(max * 4, `${capitalise(what)} is too long: at most ${max} characters.`)
    .transform((text) => cleanText(text, false))
    .pipe(
      z
        .string()
        .min(1, `Enter ${what}.`)
        .max(max, `${capitalise(what)} is too long: at most ${max} characters.`),
    );
}

/** Several lines of text, may be empty. */
export function blockText(what: string, max: number) {
  return z
    .string({ error: `${capitalise(what)} has to be text.` })
    .max(max * 2, `${capitalise(what)} is too long: at most ${max} characters.`)
    .transform((text) => cleanText(text, true))
    .pipe(z.string().max(max, `${capitalise(what)} is too long: at most ${max} characters.`));
}

export function capitalise(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** A finite number in a range; says the range when it is outside. */
export function numberBetween(what: string, min: number, max: number, unit = "") {
  const message = `${capitalise(what)} has to be between ${min} and ${max}${unit ? ` ${unit}` : ""}.`;
  return z.number({ error: message }).min(min, message).max(max, message);
}

/** A mail address: one, plain, lower-cased; no line breaks, no groups, no display name. */
export const emailSchema = z
  .string({ error: "Enter an e-mail address." })
  .max(254, "That e-mail address is too long.")
  .transform((text) => text.normalize("NFC").trim().toLowerCase())
  .pipe(
    z.email({
      error: "That is not an e-mail address.",
      pattern: /^[a-z0-9.!#$%&'*+/=?^_`{|}~-]{1,64}@[a-z0-9-]+(\.[a-z0-9-]+)+$/,
    }),
  );
