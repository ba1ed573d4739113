import { z } from "zod";

const ALPHABET = "0123456789abcdefghijkmnpqrstuvwxyz";

/** A random identifier of 26 letters and digits out of 34: 132 bits. Works on the server and in the browser. */
export function newId(): string {
  let id = "";
  while (id.length < 26) {
    for (const byte of crypto.getRandomValues(new Uint8Array(32))) {
      // 238 = 7 × 34: bytes above it would make some letters likelier than others.
      if (byte < 238 && id.length < 26) id += ALPHABET[byte % 34];
    }
  }
  return id;
}

/** An identifier as it may arrive from outside: ours, or better-auth's (letters and digits). */
export const idSchema = z
  .string()
  .min(16)
  .max(64)
  .regex(/^[0-9A-Za-z]+$/, "That is not an identifier of ours.");
