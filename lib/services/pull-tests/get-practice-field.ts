import { getDb } from "@/db/client";
import type { ReadingInfluence } from "@/lib/calc/learning";
import { groupReadings, learnPatch, listInfluences, placeKey } from "@/lib/domain/pull-test/learn";
import type { PracticeGround, PracticeView } from "@/lib/domain/pull-test/views";
import type { Context } from "@/lib/services/context/context";
import { listPhotoIds, listPracticeAnchors, listPullRows, type PullTestRow } from "./internal";
import { PAGE_SIZE, toFit, toGroundLearningView, toPullTestView } from "./view";

/** Rows of each ground at each place, the place with the newest reading first. */
function groupRows(rows: readonly PullTestRow[]): PullTestRow[][] {
  const groups = new Map<string, PullTestRow[]>();
  for (const row of rows) {
    const key = `${placeKey(row)} ${row.ground.kind}`;
    const list = groups.get(key) ?? [];
    list.push(row);
    groups.set(key, list);
  }
  return [...groups.values()];
}

/** The person's own readings outside any trip, and what they teach of each ground. Nobody else sees them. */
export async function getPracticeField({
  ctx,
  alsoId = null,
}: {
  ctx: Context;
  alsoId?: string | null;
}): Promise<PracticeView> {
  const db = getDb();
  const scope = { kind: "practice", ownerId: ctx.actor.userId } as const;
  const rows = await listPullRows(db, scope);
  const shown = rows.filter((row, index) => index < PAGE_SIZE || row.id === alsoId);
  const ids = new Set(shown.map((row) => row.id));
  const influences = new Map<string, ReadingInfluence>();
  const grounds = groupRows(rows).flatMap((group): PracticeGround[] => {
    const [first] = group;
    if (!first) return [];
    const { kind } = first.ground;
    const learning = learnPatch(groupReadings(rows, kind), placeKey(first), kind, true);
    for (const [id, influence] of listInfluences(group, ids, learning)) influences.set(id, influence);
    return [{ ...toGroundLearningView(kind, learning), key: first.id, place: first.place }];
  });
  const photos = await listPhotoIds(db, scope);
  const anchors = await listPracticeAnchors(ctx);
  return {
    grounds,
    readings: shown.map((row) =>
      toPullTestView(row, toFit(row, row.ground.kind, influences.get(row.id)), photos.has(row.id)),
    ),
    total: rows.length,
    anchors: anchors.map(({ id, name }) => ({ id, name })),
  };
}
