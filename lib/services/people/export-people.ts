import Papa from "papaparse";
import type { z } from "zod";
import { getDb } from "@/db/client";
import { requirePermission } from "@/lib/auth/permission";
import { ROLES } from "@/lib/domain/permissions/permissions";
import { tripRefInput } from "@/lib/domain/trip/schema";
import type { Context } from "@/lib/services/context/context";
import { listGuests } from "../roster/internal";
import { loadTripRow } from "../trips/internal";
import { parseInput } from "../trips/parse-input";
import { FORMULA_START } from "./read-people-csv";

/** Names, addresses, roles and answers as CSV, as the import reads it. No cell is a formula. */
export async function exportPeople({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof tripRefInput>;
}): Promise<{ fileName: string; content: string }> {
  const { tripId } = parseInput(tripRefInput, input);
  await requirePermission(ctx, tripId, "people.edit");
  const trip = await loadTripRow(getDb(), tripId);
  const guests = [...(await listGuests(getDb(), tripId))].sort(
    (a, b) => ROLES.indexOf(a.person.role) - ROLES.indexOf(b.person.role) || a.person.name.localeCompare(b.person.name),
  );
  const rows = guests.map(({ person, value, isWaiting, note }) => ({
    name: person.name,
    email: person.email,
    role: person.role,
    answer: isWaiting ? "yes, waiting" : (value ?? ""),
    note,
  }));
  const columns = ["name", "email", "role", "answer", "note"];
  const csv = Papa.unparse({ fields: columns, data: rows }, { escapeFormulae: FORMULA_START, newline: "\r\n" });
  return { fileName: `${trip.name}, people.csv`, content: `${csv}\r\n` };
}
