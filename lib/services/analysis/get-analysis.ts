import { eq, inArray, lt } from "drizzle-orm";
import { getDb, withTransaction } from "@/db/client";
import { analysisCache } from "@/db/schema";
import { analysisKey } from "@/lib/calc/analyse-shelter";
import type { AnalysisRequest } from "@/lib/calc/camp";
import type { ShelterAnalysis } from "@/lib/calc/types";
import { computeAnalysis } from "@/lib/workers/analysis-task";
import { runInWorker } from "@/lib/workers/run-in-worker";
import { LruCache } from "./lru-cache";

const MEMORY_ENTRIES = 200;
const UNUSED_AFTER_DAYS = 120;
/** Now and then, with a write that happens anyway, what nobody used for long goes. */
const CLEANUP_EVERY_WRITES = 200;

const store = globalThis as typeof globalThis & {
  leesteadAnalyses?: {
    known: LruCache<ShelterAnalysis>;
    running: Map<string, Promise<ShelterAnalysis>>;
    writes: number;
  };
};

function getStore() {
  return (store.leesteadAnalyses ??= { known: new LruCache(MEMORY_ENTRIES), running: new Map(), writes: 0 });
}

async function saveAnalysis(key: string, analysis: ShelterAnalysis): Promise<void> {
  const { writes } = getStore();
  getStore().writes = writes + 1;
  await withTransaction(async (tx) => {
    const usedAt = new Date();
    await tx.insert(analysisCache).values({ key, analysis, usedAt }).onConflictDoUpdate({
      target: analysisCache.key,
      set: { usedAt },
    });
    if (writes % CLEANUP_EVERY_WRITES !== 0) return;
    const limit = new Date(usedAt.getTime() - UNUSED_AFTER_DAYS * 86_400_000);
    const old = tx
      .select({ key: analysisCache.key })
      .from(analysisCache)
      .where(lt(analysisCache.usedAt, limit))
      .limit(500);
    await tx.delete(analysisCache).where(inArray(analysisCache.key, old));
  });
}

async function findOrCompute(key: string, request: AnalysisRequest, isKept: boolean): Promise<ShelterAnalysis> {
  const [row] = await getDb()
    .select({ analysis: analysisCache.analysis })
    .from(analysisCache)
    .where(eq(analysisCache.key, key))
    .limit(1);
  if (row) return row.analysis;
  const analysis = await runInWorker("analysis", request, computeAnalysis);
  // A result that can't be kept is still a result.
  if (isKept) await saveAnalysis(key, analysis).catch(() => undefined);
  return analysis;
}

/**
 * Pull in the lines of a shelter in a wind: from memory, from the table, or worked out now. The same for everybody, so
 * it asks no permission; who asks twice at once waits for one answer. What is only tried out (`isKept` false) stays out
 * of the table.
 */
export async function getAnalysis(request: AnalysisRequest, { isKept } = { isKept: true }): Promise<ShelterAnalysis> {
  const { known, running } = getStore();
  const key = analysisKey(request.spec, request.relativeWindDirectionsDeg, request.pressurePa);
  const found = known.get(key);
  if (found) return found;
  const busy = running.get(key);
  if (busy) return busy;
  const work = findOrCompute(key, request, isKept)
    .then((analysis) => {
      known.set(key, analysis);
      return analysis;
    })
    .finally(() => running.delete(key));
  running.set(key, work);
  return work;
}
