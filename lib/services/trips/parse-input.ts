import type { z } from "zod";
import { fromZodError } from "@/lib/errors";

/** The input by its schema, or a refusal that names each field. */
export function parseInput<Schema extends z.ZodType>(schema: Schema, input: unknown): z.output<Schema> {
  const parsed = schema.safeParse(input);
  if (parsed.success) return parsed.data;
  throw fromZodError(parsed.error);
}
