import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { pullTest } from "@/db/schema";
import type { AnchorSpec } from "@/lib/calc/types";
import type { TestedGround } from "@/lib/domain/pull-test/schema";
import type { Context } from "@/lib/services/context/context";
import type { Reader } from "../../trips/internal";
import { inScope, type PullScope, type TestAnchor } from "../internal";
import type { ReadRow } from "./read-row";

/** A row of the file that can be stored. */
export interface NewPull {
  readonly row: ReadRow;
  readonly ground: TestedGround;
  readonly anchor: TestAnchor;
}

/** Rows that are written at once. */
const BATCH = 2000;

type Known = Awaited<ReturnType<typeof listKnown>>[number];

/** What a row is told apart by: all of its cells. */
export async function listKnown(reader: Reader, scope: PullScope) {
  return reader
    .select({
      pulledAt: pullTest.pulledAt,
      place: pullTest.place,
      patch: pullTest.patch,
      ground: pullTest.ground,
      anchorName: pullTest.anchorName,
      anchor: pullTest.anchor,
      leanDeg: pullTest.leanDeg,
      lineAngleDeg: pullTest.lineAngleDeg,
      depthOutM: pullTest.depthOutM,
      force: pullTest.force,
      forceUnit: pullTest.forceUnit,
      outcome: pullTest.outcome,
      isOff: pullTest.isOff,
      note: pullTest.note,
    })
    .from(pullTest)
    .where(inScope(scope));
}

function keyOf(one: Omit<Known, "pulledAt" | "anchor">, at: number): string {
  const { kind, wetness, looseTopM, stoneDepthM, slopeDeg } = one.ground;
  const ground = `${kind} ${wetness} ${looseTopM} ${stoneDepthM} ${slopeDeg}`;
  const numbers = `${at} ${one.leanDeg} ${one.lineAngleDeg} ${one.depthOutM} ${one.force} ${one.isOff}`;
  return [numbers, ground, one.forceUnit, one.outcome, one.patch ?? "", one.place, one.anchorName, one.note].join(
    "\u0000",
  );
}

function toStored({ row, ground, anchor }: NewPull) {
  const { reading, isOff } = row;
  return {
    ...reading,
    patch: "patch" in reading ? reading.patch : null,
    place: "place" in reading ? reading.place : "",
    anchorName: anchor.name,
    ground,
    isOff,
    at: Date.parse(reading.pulledAt ?? ""),
  };
}
type Stored = ReturnType<typeof toStored> & { readonly anchor: AnchorSpec };

/** Rows of the file that are not there yet: a row that is there twice in the file has to be there twice. */
export function listNew(pulls: readonly NewPull[], known: readonly Known[]): Stored[] {
  const left = new Map<string, number>();
  for (const one of known) {
    const key = keyOf(one, one.pulledAt.getTime());
    left.set(key, (left.get(key) ?? 0) + 1);
  }
  return pulls.flatMap((pull) => {
    const stored = toStored(pull);
    const key = keyOf(stored, stored.at);
    const count = left.get(key) ?? 0;
    if (count > 0) left.set(key, count - 1);
    return count > 0 ? [] : [{ ...stored, anchor: pull.anchor.spec }];
  });
}

/** One statement for many rows: each as a list of JSON, its values in the order of the columns. */
export async function insertStored(
  tx: Transaction,
  ctx: Context,
  scope: PullScope,
  rows: readonly Stored[],
): Promise<void> {
  const now = Date.now();
  const [tripId, campId, ownerId] =
    scope.kind === "camp" ? [scope.tripId, scope.campId, null] : [null, null, scope.ownerId];
  for (let at = 0; at < rows.length; at += BATCH) {
    const values = rows
      .slice(at, at + BATCH)
      .map((one) => [
        one.patch,
        one.place,
        one.anchorName,
        JSON.stringify(one.anchor),
        JSON.stringify(one.ground),
        one.leanDeg,
        one.lineAngleDeg,
        one.depthOutM,
        one.force,
        one.forceUnit,
        one.outcome,
        one.note,
        one.isOff ? 1 : 0,
        one.at,
      ]);
    await tx.run(sql`
      insert into ${pullTest} (id, patch, place, anchor_name, anchor, ground, lean_deg, line_angle_deg, depth_out_m,
        force, force_unit, outcome, note, is_off, pulled_at, trip_id, camp_id, owner_id, logged_by, logged_by_name,
        version, created_at, updated_at)
      select lower(hex(randomblob(16))), value ->> 0, value ->> 1, value ->> 2, value ->> 3, value ->> 4, value ->> 5, value ->> 6, value ->> 7,
        value ->> 8, value ->> 9, value ->> 10, value ->> 11, value ->> 12, value ->> 13,
        ${tripId}, ${campId}, ${ownerId}, ${ctx.actor.userId}, ${ctx.actor.name}, 1, ${now}, ${now}
      from json_each(${JSON.stringify(values)})`);
  }
}
