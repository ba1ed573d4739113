import { and, eq, inArray, isNotNull, isNull, ne, or, sql, type SQL } from "drizzle-orm";
import { learningChoice, person, pullTest } from "@/db/schema";
import type { CampDetails } from "@/lib/domain/camp/schema";
import { isAllowed, ROLES } from "@/lib/domain/permissions/permissions";
import { NOTHING_LEARNED, type LearnedGrounds } from "@/lib/domain/pull-test/learned-grounds";
import { groupReadings, learnPatch, type LoggedPull, type PatchLearning } from "@/lib/domain/pull-test/learn";
import { PATCHES, type Patch } from "@/lib/domain/pull-test/schema";
import { LruCache } from "../analysis/lru-cache";
import type { Reader } from "../trips/internal";

/** What is learned of both patches of a camp; null where a patch has no ground. */
export type CampLearning = Readonly<Record<Patch, PatchLearning | null>>;

export const NO_LEARNING: CampLearning = { main: null, second: null };

type CampGround = Pick<CampDetails, "ground" | "secondGround">;
interface CampOfTrip {
  readonly id: string;
  readonly details: CampGround;
}

const MEMORY_ENTRIES = 40;
const store = globalThis as typeof globalThis & { leesteadLearning?: LruCache<ReadonlyMap<string, CampLearning>> };

const COLUMNS = {
  id: pullTest.id,
  campId: pullTest.campId,
  patch: pullTest.patch,
  ownerId: pullTest.ownerId,
  place: pullTest.place,
  anchor: pullTest.anchor,
  ground: pullTest.ground,
  leanDeg: pullTest.leanDeg,
  lineAngleDeg: pullTest.lineAngleDeg,
  depthOutM: pullTest.depthOutM,
  force: pullTest.force,
  forceUnit: pullTest.forceUnit,
  outcome: pullTest.outcome,
  isOff: pullTest.isOff,
};

/** Each change of a reading raises its version and its time, so these three tell any two states apart. */
async function signatureOf(reader: Reader, where: SQL | undefined): Promise<string> {
  const [row] = await reader
    .select({
      count: sql<number>`count(*)`,
      versions: sql<number>`coalesce(sum(${pullTest.version}), 0)`,
      latest: sql<number>`coalesce(max(${pullTest.updatedAt}), 0)`,
    })
    .from(pullTest)
    .where(where);
  return JSON.stringify(row);
}

/** People whose readings elsewhere count for this trip: those who may log here. */
async function listTesterIds(reader: Reader, tripId: string): Promise<string[]> {
  const roles = ROLES.filter((role) => isAllowed(role, "pull-test.edit"));
  const rows = await reader
    .select({ userId: person.userId })
    .from(person)
    .where(and(eq(person.tripId, tripId), inArray(person.role, roles), isNotNull(person.userId)));
  return rows.flatMap(({ userId }) => (userId === null ? [] : [userId])).sort();
}

const groundOf = (camp: CampGround, patch: Patch) => (patch === "main" ? camp.ground : camp.secondGround);

function learnCamp(
  camp: CampOfTrip,
  pulls: readonly LoggedPull[],
  usesElsewhere: (campId: string, patch: Patch) => boolean,
): CampLearning {
  const learn = (patch: Patch): PatchLearning | null => {
    const ground = groundOf(camp.details, patch);
    if (!ground) return null;
    const here = `camp ${camp.id} ${patch}`;
    return learnPatch(groupReadings(pulls, ground.kind), here, ground.kind, usesElsewhere(camp.id, patch));
  };
  return { main: learn("main"), second: learn("second") };
}

/**
 * What pull tests say of each camp's ground: its own readings first, then those of the same kind of ground at the
 * trip's other camps and by its leader and co-leaders on other trips and in their practice fields, then the table.
 */
export async function loadCampLearnings(
  reader: Reader,
  tripId: string,
  camps: readonly CampOfTrip[],
): Promise<ReadonlyMap<string, CampLearning>> {
  const testers = await listTesterIds(reader, tripId);
  const here = eq(pullTest.tripId, tripId);
  const away =
    testers.length === 0
      ? undefined
      : and(inArray(pullTest.loggedBy, testers), or(isNull(pullTest.tripId), ne(pullTest.tripId, tripId)));
  const choices = await reader.select().from(learningChoice).where(eq(learningChoice.tripId, tripId));
  const key = JSON.stringify([
    tripId,
    camps.map(({ id, details }) => [id, PATCHES.map((patch) => groundOf(details, patch)?.kind)]),
    choices.map((one) => [one.campId, one.patch, one.usesElsewhere]),
    await signatureOf(reader, here),
    away ? [testers, await signatureOf(reader, away)] : null,
  ]);
  const memory = (store.leesteadLearning ??= new LruCache(MEMORY_ENTRIES));
  const known = memory.get(key);
  if (known) return known;
  const pulls: LoggedPull[] = await reader
    .select(COLUMNS)
    .from(pullTest)
    .where(away ? or(here, away) : here);
  const usesElsewhere = (campId: string, patch: Patch) =>
    choices.find((one) => one.campId === campId && one.patch === patch)?.usesElsewhere ?? true;
  const learnings = new Map(camps.map((camp) => [camp.id, learnCamp(camp, pulls, usesElsewhere)]));
  memory.set(key, learnings);
  return learnings;
}

const toLearned = (learning: PatchLearning | null) =>
  learning && learning.from !== "table" ? { factor: learning.result.factor, scatter: learning.result.scatter } : null;

/** The part of it that goes into the margins. */
export function toLearnedGrounds(learning: CampLearning | undefined): LearnedGrounds {
  if (!learning) return NOTHING_LEARNED;
  return { main: toLearned(learning.main), second: toLearned(learning.second) };
}
