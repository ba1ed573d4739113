import { z } from "zod";

// The browser makes ids too, and must not load zod for it.
export { newId } from "./new-id";

/** An identifier as it may arrive from outside: ours, or better-auth's (letters and digits). */
export const idSchema = z
  .string({ error: "That is not an identifier of ours." })
  .regex(/^[0-9A-Za-z]{16,64}$/, "That is not an identifier of ours.");
