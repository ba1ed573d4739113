import type { z } from "zod";
import { withTransaction, type Transaction } from "@/db/client";
import { campRefInput } from "@/lib/domain/camp/schema";
import { testedGroundSchema, type TestedGround } from "@/lib/domain/pull-test/schema";
import { AppError } from "@/lib/errors";
import { plural } from "@/lib/format/words";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { loadCampRow } from "../../camps/internal";
import { consumeQuota } from "../../quota/consume-quota";
import { recordChange } from "../../trips/internal";
import { parseInput } from "../../trips/parse-input";
import {
  groundOfPatch,
  listCampAnchors,
  listPracticeAnchors,
  nameAnchors,
  requireRoom,
  type PullScope,
  type TestAnchor,
} from "../internal";
import { requireStanding } from "../require-standing";
import { decodeTable } from "./decode-table";
import { COLUMN_OF, readRow, type CellFault, type ReadRow } from "./read-row";
import { insertStored, listKnown, listNew, type NewPull } from "./store-rows";

export interface ImportReport {
  readonly added: number;
  /** Were there already, to the last cell. */
  readonly known: number;
}

const MAX_SHOWN = 50;
function refuseFaults(faults: readonly CellFault[]): never {
  const [first] = faults;
  const fieldErrors = Object.fromEntries(
    faults.slice(0, MAX_SHOWN).map(({ row, column, message }) => [`row ${row}, ${column}`, [message]]),
  );
  const count = plural(faults.length, "cell is", "cells are");
  throw new AppError(
    "bad-input",
    `${count} not right; nothing was saved. Row ${first?.row ?? 0}, ${first?.column ?? ""}: ${first?.message ?? ""}`,
    { fieldErrors },
  );
}

/** A refusal of one reading as a fault of its cell. */
function asFault(row: number, error: unknown): CellFault {
  if (!(error instanceof AppError)) throw error;
  const [[field, messages] = ["", []]] = Object.entries(error.fieldErrors);
  const name = field.replace(/^reading\./, "");
  return {
    row,
    column: name === "anchorId" ? "anchor" : (COLUMN_OF[name] ?? "ground"),
    message: messages[0] ?? error.userMessage,
  };
}

interface Reading {
  readonly ctx: Context;
  readonly findAnchor: (name: string) => TestAnchor | undefined;
  readonly groundOf: (row: ReadRow) => TestedGround;
}

async function writeTable(
  tx: Transaction,
  scope: PullScope,
  content: Uint8Array,
  reading: Reading,
): Promise<ImportReport> {
  const faults: CellFault[] = [];
  const pulls: NewPull[] = [];
  const known = await listKnown(tx, scope);
  // An anchor that left the kit is still known by the readings that were made with it.
  const logged = new Map(
    known.map((one) => [one.anchorName.toLowerCase(), { id: "", name: one.anchorName, spec: one.anchor }]),
  );
  for (const cells of decodeTable(content)) {
    const row = readRow(cells, scope.kind);
    if (!("reading" in row)) {
      faults.push(...row);
      continue;
    }
    const anchor = reading.findAnchor(row.anchor) ?? logged.get(row.anchor.toLowerCase());
    if (!anchor) {
      faults.push({
        row: row.row,
        column: "anchor",
        message: `There is no anchor “${row.anchor.slice(0, 60)}” in the kit or the library.`,
      });
      continue;
    }
    try {
      const ground = reading.groundOf(row);
      requireStanding(anchor.spec, ground, row.reading);
      pulls.push({ row, ground, anchor });
    } catch (error) {
      faults.push(asFault(row.row, error));
    }
  }
  if (faults.length > 0) refuseFaults(faults);
  const fresh = listNew(pulls, known);
  await requireRoom(tx, scope, fresh.length);
  await insertStored(tx, reading.ctx, scope, fresh);
  return { added: fresh.length, known: pulls.length - fresh.length };
}

const saidGround = (row: ReadRow, kind: string): TestedGround => {
  const { slopeDeg, looseTopM, stoneDepthM, reading } = row;
  return parseInput(testedGroundSchema, { kind, wetness: reading.wetness, slopeDeg, looseTopM, stoneDepthM });
};

/** A table of readings into one camp: all of it or nothing. What is there already is left alone. */
export async function importCampPullTests({
  ctx,
  input,
  content,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
  content: Uint8Array;
}): Promise<ImportReport> {
  const { tripId, campId } = parseInput(campRefInput, input);
  await requirePermission(ctx, tripId, "pull-test.edit");
  await consumeQuota("import", ctx.actor.userId);
  return withTransaction(async (tx) => {
    await requirePermission(ctx, tripId, "pull-test.edit", tx);
    const camp = await loadCampRow(tx, tripId, campId);
    const report = await writeTable(tx, { kind: "camp", tripId, campId }, content, {
      ctx,
      findAnchor: nameAnchors(await listCampAnchors(tx, tripId, camp)),
      groundOf: (row) => {
        const patch = "patch" in row.reading ? row.reading.patch : "main";
        return row.ground === null ? groundOfPatch(camp, patch, row.reading.wetness) : saidGround(row, row.ground);
      },
    });
    if (report.added > 0) {
      await recordChange(tx, ctx, {
        tripId,
        action: "create",
        entity: "pull-test",
        entityId: campId,
        summary: `${camp.name}: ${plural(report.added, "pull test")} from a table`,
        isPrinted: true,
      });
    }
    return report;
  });
}

/** A table of readings into the person's own practice field. */
export async function importPracticePullTests({
  ctx,
  content,
}: {
  ctx: Context;
  content: Uint8Array;
}): Promise<ImportReport> {
  await consumeQuota("import", ctx.actor.userId);
  const findAnchor = nameAnchors(await listPracticeAnchors(ctx));
  const ownerId = ctx.actor.userId;
  return withTransaction((tx) =>
    writeTable(tx, { kind: "practice", ownerId }, content, {
      ctx,
      findAnchor,
      groundOf: (row) => saidGround(row, "kind" in row.reading ? row.reading.kind : (row.ground ?? "")),
    }),
  );
}
