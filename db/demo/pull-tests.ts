import { newId } from "@/lib/domain/ids";
import type { PullOutcome } from "@/lib/domain/pull-test/schema";
import type { Context } from "@/lib/services/context/context";
import { createCampPullTest, createPracticePullTest } from "@/lib/services/pull-tests/create-pull-test";

interface Pull {
  readonly anchorId: string;
  readonly leanDeg: number;
  readonly lineAngleDeg: number;
  readonly force: number;
  readonly outcome: PullOutcome;
  readonly note: string;
}

const pull = (
  anchorId: string,
  leanDeg: number,
  lineAngleDeg: number,
  force: number,
  outcome: PullOutcome,
  note = "",
): Pull => ({ anchorId, leanDeg, lineAngleDeg, force, outcome, note });

/** A look at the first camp beforehand, and an afternoon of practice: invented readings of a 50 kgf scale. */
const FIRST_CAMP: readonly Pull[] = [
  pull("three-blade-200", 0, 45, 15, "came-out"),
  pull("wide-sand-300", 0, 45, 45, "still-holding"),
  pull("v-160", 20, 30, 9, "came-out"),
  pull("three-blade-150", 20, 30, 2, "came-out", "Came out with a clod of leaves. A root hole?"),
  pull("three-blade-150", 0, 45, 9.5, "came-out"),
  pull("three-blade-200", 15, 45, 14, "still-holding"),
];
const PRACTICE: readonly Pull[] = [
  pull("three-blade-200", 0, 45, 19, "came-out"),
  pull("three-blade-200", 20, 30, 24, "came-out"),
  pull("wide-sand-300", 15, 45, 50, "still-holding", "End of the scale."),
  pull("round-hook-180", 20, 30, 15, "bent"),
  pull("v-160", 20, 30, 14.5, "came-out"),
];

const readingOf = ({ anchorId: _anchor, ...one }: Pull) => ({
  ...one,
  depthOutM: 0,
  forceUnit: "kgf" as const,
  wetness: "usual" as const,
});

export async function seedCampPulls(ctx: Context, tripId: string, campId: string): Promise<void> {
  for (const one of FIRST_CAMP) {
    const reading = { ...readingOf(one), patch: "main" as const };
    const { anchorId } = one;
    await createCampPullTest({ ctx, input: { tripId, campId, pullTestId: newId(), anchorId, reading } });
  }
}

export async function seedPractice(ctx: Context): Promise<void> {
  for (const one of PRACTICE) {
    const reading = { ...readingOf(one), place: "Field behind the barn", kind: "firm-moist-loam" as const };
    await createPracticePullTest({ ctx, input: { pullTestId: newId(), anchorId: one.anchorId, reading } });
  }
}
