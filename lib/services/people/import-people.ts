import { eq } from "drizzle-orm";
import type { z } from "zod";
import { getDb, withTransaction } from "@/db/client";
import { person } from "@/db/schema";
import { requirePermission } from "@/lib/auth/permission";
import { peopleImportInput } from "@/lib/domain/person/schema";
import { AppError } from "@/lib/errors";
import { plural } from "@/lib/format/words";
import type { Context } from "@/lib/services/context/context";
import { consumeQuota } from "../quota/consume-quota";
import { loadTripRow, type Reader } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { addPerson } from "./internal-add";
import { readPeopleCsv, type CsvFault, type CsvPerson } from "./read-people-csv";

const SHOWN = 12;
const COLUMN_NAMES = { name: "name", email: "e-mail", role: "role" } as const;

function refuseFaults(faults: readonly CsvFault[]): void {
  if (faults.length === 0) return;
  const lines = faults
    .slice(0, SHOWN)
    .map(({ row, column, message }) => `Row ${row}${column ? `, ${COLUMN_NAMES[column]}` : ""}: ${message}`);
  if (faults.length > SHOWN) lines.push(`And ${faults.length - SHOWN} more.`);
  const sentence = `Nobody was added: ${plural(faults.length, "thing", "things")} to put right in the file.`;
  throw new AppError("bad-input", sentence, { fieldErrors: { csv: lines } });
}

async function findPresent(reader: Reader, tripId: string, people: readonly CsvPerson[]): Promise<CsvFault[]> {
  const rows = await reader.select({ email: person.email }).from(person).where(eq(person.tripId, tripId));
  const present = new Set(rows.map((row) => row.email));
  return people
    .filter((one) => present.has(one.email))
    .map(({ row, email }) => ({ row, column: "email" as const, message: `${email} is on this trip already.` }));
}

/** Everybody in the file or nobody. A trial only says who that would be. */
export async function importPeople({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof peopleImportInput>;
}): Promise<{ people: readonly Omit<CsvPerson, "row">[]; isDone: boolean }> {
  const { tripId, csv, isTrial } = parseInput(peopleImportInput, input);
  await requirePermission(ctx, tripId, "people.edit");
  const { people, faults } = readPeopleCsv(csv);
  refuseFaults(faults);
  refuseFaults(await findPresent(getDb(), tripId, people));
  const plain = people.map(({ name, email, role }) => ({ name, email, role }));
  if (isTrial) return { people: plain, isDone: false };
  await consumeQuota("invitation", ctx.actor.userId, people.length);
  await withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "people.edit", tx);
    refuseFaults(await findPresent(tx, tripId, people));
    const trip = await loadTripRow(tx, tripId);
    for (const one of plain) await addPerson(tx, ctx, trip, one);
  });
  return { people: plain, isDone: true };
}
