import { ZodError } from "zod";

/** Codes of refusals and their HTTP status; there is no other table. */
export const ERROR_STATUS = {
  "bad-input": 400,
  unauthenticated: 401,
  forbidden: 403,
  "not-found": 404,
  conflict: 409,
  "in-use": 409,
  "too-large": 413,
  "too-many": 429,
  unavailable: 503,
} as const;

export type ErrorCode = keyof typeof ERROR_STATUS;
export type FieldErrors = Readonly<Record<string, readonly string[]>>;

interface ErrorExtras {
  /** By dotted path of the input. */
  readonly fieldErrors?: FieldErrors;
  /** For the screen: what depends on it, what is there now. */
  readonly details?: unknown;
  /** Of "too-many": when to try again. */
  readonly retryAfterS?: number;
  readonly cause?: unknown;
}

/** A refusal with a sentence for people; everything else that is thrown is a fault of ours. */
export class AppError extends Error {
  readonly fieldErrors: FieldErrors;
  readonly details: unknown;
  readonly retryAfterS: number | undefined;

  constructor(
    readonly code: ErrorCode,
    readonly userMessage: string,
    extras: ErrorExtras = {},
  ) {
    super(`${code}: ${userMessage}`, { cause: extras.cause });
    this.name = "AppError";
    this.fieldErrors = extras.fieldErrors ?? {};
    this.details = extras.details;
    this.retryAfterS = extras.retryAfterS;
  }

  get status(): number {
    return ERROR_STATUS[this.code];
  }
}

const DATABASE_TROUBLE: Readonly<Record<string, string>> = {
  SQLITE_BUSY: "The data is in use by another program. Nothing was saved; try again in a moment.",
  SQLITE_LOCKED: "The data is in use by another program. Nothing was saved; try again in a moment.",
  SQLITE_READONLY: "The data can only be read at the moment. Nothing was saved.",
  SQLITE_FULL: "The disk is full. Nothing was saved.",
  SQLITE_IOERR: "The disk could not be read or written. Nothing was saved.",
  SQLITE_CANTOPEN: "The data could not be opened. Nothing was saved.",
};

/** The refusal inside an error, if it is one: ours, of a schema, or of a database that can't work just now. */
export function toAppError(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  if (error instanceof ZodError) return fromZodError(error);
  for (let one = error, depth = 0; one instanceof Error && depth < 5; one = one.cause, depth += 1) {
    const code = "code" in one && typeof one.code === "string" ? one.code : "";
    const sentence = DATABASE_TROUBLE[code];
    if (sentence) return new AppError("unavailable", sentence, { cause: error });
  }
  return null;
}

export function fromZodError(error: ZodError): AppError {
  const fieldErrors: Record<string, string[]> = Object.create(null) as Record<string, string[]>;
  for (const issue of error.issues) {
    const path = issue.path.map(String).join(".");
    const messages = (fieldErrors[path] ??= []);
    if (!messages.includes(issue.message)) messages.push(issue.message);
  }
  const own = fieldErrors[""];
  const sentence = own ? own.join(" ") : "Some of that can't be saved as it is. Look at the marked fields.";
  return new AppError("bad-input", sentence, { fieldErrors: { ...fieldErrors } });
}
