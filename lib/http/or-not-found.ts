import { notFound } from "next/navigation";
import { AppError, type ErrorCode } from "@/lib/errors";

/** An identifier of the wrong form names nothing, like any other that isn't there. */
const NOT_THERE: readonly ErrorCode[] = ["not-found", "forbidden", "bad-input"];

/** For pages: what is not there, and what is not yours, looks the same. */
export async function orNotFound<Result>(work: Promise<Result>): Promise<Result> {
  try {
    return await work;
  } catch (error) {
    if (error instanceof AppError && NOT_THERE.includes(error.code)) notFound();
    throw error;
  }
}
