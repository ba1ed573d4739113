import type { z } from "zod";
import { getDb } from "@/db/client";
import { idSchema } from "@/lib/domain/ids";
import { pullTestRefInput } from "@/lib/domain/pull-test/schema";
import type { CampPullTestsView, PracticeView, PullTestView } from "@/lib/domain/pull-test/views";
import { AppError } from "@/lib/errors";
import type { Context } from "@/lib/services/context/context";
import { parseInput } from "../trips/parse-input";
import { getCampPullTests } from "./get-camp-pull-tests";
import { getPracticeField } from "./get-practice-field";
import { loadPullTestFor } from "./internal";

const campPullTestInput = pullTestRefInput.extend({ tripId: idSchema, campId: idSchema });
const notHere = () => new AppError("not-found", "There is no such pull test.");

function findView(readings: readonly PullTestView[], id: string): PullTestView {
  const found = readings.find((one) => one.id === id);
  if (!found) throw notHere();
  return found;
}

/** One reading of a camp, with what the page around it needs. */
export async function getCampPullTest({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campPullTestInput>;
}): Promise<{ view: CampPullTestsView; reading: PullTestView }> {
  const { tripId, campId, pullTestId } = parseInput(campPullTestInput, input);
  const { scope } = await loadPullTestFor(getDb(), ctx, pullTestId, "pull-test.read");
  if (scope.kind !== "camp" || scope.tripId !== tripId || scope.campId !== campId) throw notHere();
  const view = await getCampPullTests({ ctx, input: { tripId, campId }, alsoId: pullTestId });
  return { view, reading: findView(view.readings, pullTestId) };
}

/** One reading of the person's own practice field. */
export async function getPracticePullTest({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof pullTestRefInput>;
}): Promise<{ view: PracticeView; reading: PullTestView }> {
  const { pullTestId } = parseInput(pullTestRefInput, input);
  const { scope } = await loadPullTestFor(getDb(), ctx, pullTestId, "pull-test.read");
  if (scope.kind !== "practice") throw notHere();
  const view = await getPracticeField({ ctx, alsoId: pullTestId });
  return { view, reading: findView(view.readings, pullTestId) };
}
