import { notFound } from "next/navigation";
import { AppError } from "@/lib/errors";

/** For pages: what is not there, and what is not yours, looks the same. */
export async function orNotFound<Result>(work: Promise<Result>): Promise<Result> {
  try {
    return await work;
  } catch (error) {
    if (error instanceof AppError && (error.code === "not-found" || error.code === "forbidden")) notFound();
    throw error;
  }
}
