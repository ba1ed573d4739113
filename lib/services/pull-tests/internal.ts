import { and, desc, eq, sql } from "drizzle-orm";
import { pullPhoto, pullTest } from "@/db/schema";
import { BUILT_IN_ANCHORS } from "@/lib/calc/tables/anchors";
import type { AnchorSpec } from "@/lib/calc/types";
import type { CampDetails } from "@/lib/domain/camp/schema";
import type { Permission } from "@/lib/domain/permissions/permissions";
import { MAX_READINGS, type Patch, type TestedGround } from "@/lib/domain/pull-test/schema";
import { AppError } from "@/lib/errors";
import { requirePermission } from "@/lib/auth/permission";
import type { Context } from "@/lib/services/context/context";
import { listKitRows } from "../kit/internal";
import { toTray } from "../kit/to-tray";
import { listGear } from "../gear/list-gear";
import type { Reader } from "../trips/internal";

export type PullTestRow = typeof pullTest.$inferSelect;

/** One camp of one trip, or one person's practice field: every query is by one of them. */
export type PullScope =
  | { readonly kind: "camp"; readonly tripId: string; readonly campId: string }
  | { readonly kind: "practice"; readonly ownerId: string };

export function inScope(scope: PullScope) {
  return scope.kind === "camp"
    ? and(eq(pullTest.tripId, scope.tripId), eq(pullTest.campId, scope.campId))
    : eq(pullTest.ownerId, scope.ownerId);
}

export async function listPullRows(reader: Reader, scope: PullScope): Promise<PullTestRow[]> {
  return reader.select().from(pullTest).where(inScope(scope)).orderBy(desc(pullTest.pulledAt), desc(pullTest.id));
}

export async function countPullRows(reader: Reader, scope: PullScope): Promise<number> {
  const [row] = await reader
    .select({ count: sql<number>`count(*)` })
    .from(pullTest)
    .where(inScope(scope));
  return row?.count ?? 0;
}

export async function requireRoom(reader: Reader, scope: PullScope, more: number): Promise<void> {
  const count = await countPullRows(reader, scope);
  if (count + more <= MAX_READINGS) return;
  throw new AppError("bad-input", `One place can have at most ${MAX_READINGS} readings; ${count} are there already.`);
}

const NOT_THERE = "There is no such pull test.";

/** A reading that this person may read or change; one of others and one that never was read alike. */
export async function loadPullTestFor(
  reader: Reader,
  ctx: Context,
  pullTestId: string,
  permission: Extract<Permission, "pull-test.read" | "pull-test.edit">,
): Promise<{ readonly row: PullTestRow; readonly scope: PullScope }> {
  const [row] = await reader.select().from(pullTest).where(eq(pullTest.id, pullTestId)).limit(1);
  if (!row) throw new AppError("not-found", NOT_THERE);
  if (row.tripId !== null && row.campId !== null) {
    await requirePermission(ctx, row.tripId, permission, reader).catch((error: unknown) => {
      if (error instanceof AppError && error.code === "not-found") throw new AppError("not-found", NOT_THERE);
      throw error;
    });
    return { row, scope: { kind: "camp", tripId: row.tripId, campId: row.campId } };
  }
  if (row.ownerId !== ctx.actor.userId) throw new AppError("not-found", NOT_THERE);
  return { row, scope: { kind: "practice", ownerId: row.ownerId } };
}

/** Photos of the readings of one place, by reading. */
export async function listPhotoIds(reader: Reader, scope: PullScope): Promise<ReadonlyMap<string, string>> {
  const rows = await reader
    .select({ id: pullPhoto.id, pullTestId: pullPhoto.pullTestId })
    .from(pullPhoto)
    .innerJoin(pullTest, eq(pullTest.id, pullPhoto.pullTestId))
    .where(inScope(scope));
  return new Map(rows.map((row) => [row.pullTestId, row.id]));
}

export interface TestAnchor {
  readonly id: string;
  readonly name: string;
  readonly spec: AnchorSpec;
}

/** Weights, trees and fixings say nothing of the ground. */
const isOfGround = ({ spec }: TestAnchor) => ["stake", "screw-in", "deadman", "snow-plate"].includes(spec.class);

const BUILT_IN: readonly TestAnchor[] = BUILT_IN_ANCHORS.map(({ id, name, spec }) => ({ id, name, spec })).filter(
  isOfGround,
);

function withBuiltIns(first: readonly TestAnchor[]): TestAnchor[] {
  const names = new Set(first.map((one) => one.name));
  return [...first, ...BUILT_IN.filter((one) => !names.has(one.name))].filter(isOfGround);
}

/** What can be pulled at a camp: the trip's kit first, then every built-in anchor. */
export async function listCampAnchors(
  reader: Reader,
  tripId: string,
  camp: Pick<CampDetails, "hasRocks" | "hasTrees" | "hasSticks">,
): Promise<TestAnchor[]> {
  return withBuiltIns(
    toTray(await listKitRows(reader, tripId), camp).map(({ id, name, spec }) => ({ id, name, spec })),
  );
}

/** What can be pulled in the practice field: the person's own anchors first, then every built-in one. */
export async function listPracticeAnchors(ctx: Context): Promise<TestAnchor[]> {
  const own = (await listGear({ ctx })).flatMap(({ id, details }): TestAnchor[] =>
    details.type === "anchor" && details.anchor.type === "anchor"
      ? [{ id, name: details.anchor.name, spec: details.anchor.spec }]
      : [],
  );
  return withBuiltIns(own);
}

/** Finds an anchor as a table names it: by its name, or by the id of a built-in one. */
export function nameAnchors(anchors: readonly TestAnchor[]): (name: string) => TestAnchor | undefined {
  const byName = new Map<string, TestAnchor>();
  for (const one of [...BUILT_IN, ...[...anchors].reverse()]) {
    byName.set(one.id.toLowerCase(), one);
    byName.set(one.name.toLowerCase(), one);
  }
  return (name) => byName.get(name.toLowerCase());
}

export function findAnchor(anchors: readonly TestAnchor[], anchorId: string): TestAnchor {
  // A built-in one of the same name as the kit's is not listed twice, but its id still names it.
  const found = [...anchors, ...BUILT_IN].find((one) => one.id === anchorId);
  if (found) return found;
  const message = "There is no such anchor in the kit or the library. Choose one from the list.";
  throw new AppError("bad-input", message, { fieldErrors: { anchorId: [message] } });
}

/** The ground of a patch as it is on the day. */
export function groundOfPatch(
  camp: Pick<CampDetails, "ground" | "secondGround" | "slopeDeg">,
  patch: Patch,
  wetness: TestedGround["wetness"],
): TestedGround {
  const ground = patch === "main" ? camp.ground : camp.secondGround;
  if (ground) return { ...ground, wetness, slopeDeg: camp.slopeDeg };
  const message =
    patch === "main"
      ? "The camp has no ground yet. Choose it under Ground and wind first."
      : "The camp has no second patch of ground.";
  throw new AppError("bad-input", message, { fieldErrors: { "reading.patch": [message] } });
}
