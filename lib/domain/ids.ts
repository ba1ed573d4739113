import { z } from "zod";

// The browser makes ids too, and must not load zod for it.
export { newId } from "./new-id";

/** An identifier as it may arrive from outside: ours, or better-auth's (letters and digits). */
export const idSchema = z
  .string()
  .min(16)
  .max(64)
  .regex(/^[0-9A-Za-z]+$/, "That is not an identifier of ours.");
