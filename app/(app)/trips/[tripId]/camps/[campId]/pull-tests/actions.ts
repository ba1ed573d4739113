"use server";

import { revalidatePath } from "next/cache";
import { campPullCreateInput, campPullUpdateInput, elsewhereInput, patchRefInput } from "@/lib/domain/pull-test/schema";
import { describeMove } from "@/lib/format/pull-tests";
import { plural } from "@/lib/format/words";
import { action } from "@/lib/http/action";
import { getPreferences } from "@/lib/services/preferences/get-preferences";
import { chooseElsewhere, startAgainFromTable } from "@/lib/services/pull-tests/choose-learning";
import { logCampPull } from "@/lib/services/pull-tests/log-camp-pull";
import { updateCampPullTest } from "@/lib/services/pull-tests/update-pull-test";
import { readPullTest } from "../../../../../_forms/read-pull-test";
import { saveOver } from "../../../../../_forms/save-over";

const pageOf = (tripId: unknown) => `/trips/${String(tripId)}`;

export const logPullTestAction = action<{ pullTestId: string }>(async ({ ctx, input }) => {
  const reading = readPullTest(input.reading);
  const { pullTestId, before, after } = await logCampPull({
    ctx,
    input: campPullCreateInput.parse({ ...input, reading }),
  });
  const { speedUnit } = await getPreferences({ ctx });
  revalidatePath(pageOf(input.tripId), "layout");
  return { message: `Logged. ${describeMove(before, after, speedUnit)}`.trim(), data: { pullTestId } };
});

export const updatePullTestAction = action(async ({ ctx, input }) => {
  const reading = readPullTest(input.reading);
  await saveOver(input, (version) =>
    updateCampPullTest({ ctx, input: campPullUpdateInput.parse({ ...input, reading, version }) }),
  );
  revalidatePath(pageOf(input.tripId), "layout");
});

export const chooseElsewhereAction = action(async ({ ctx, input }) => {
  const choice = elsewhereInput.parse(input);
  await chooseElsewhere({ ctx, input: choice });
  revalidatePath(pageOf(input.tripId), "layout");
  return { message: choice.usesElsewhere ? "Readings elsewhere count again." : "Readings elsewhere no longer count." };
});

export const startAgainAction = action(async ({ ctx, input }) => {
  const { switchedOff } = await startAgainFromTable({ ctx, input: patchRefInput.parse(input) });
  revalidatePath(pageOf(input.tripId), "layout");
  return { message: `Back to the table. ${plural(switchedOff, "reading")} switched off.` };
});
