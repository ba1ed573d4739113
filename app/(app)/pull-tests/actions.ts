"use server";

import { revalidatePath } from "next/cache";
import {
  practicePullCreateInput,
  practicePullUpdateInput,
  pullTestRefInput,
  pullTestSwitchInput,
} from "@/lib/domain/pull-test/schema";
import { action } from "@/lib/http/action";
import { createPracticePullTest } from "@/lib/services/pull-tests/create-pull-test";
import { deletePullTest } from "@/lib/services/pull-tests/delete-pull-test";
import { switchPullTest } from "@/lib/services/pull-tests/switch-pull-test";
import { updatePracticePullTest } from "@/lib/services/pull-tests/update-pull-test";
import { readPullTest } from "../_forms/read-pull-test";
import { saveOver } from "../_forms/save-over";

export const logPracticePullAction = action<{ pullTestId: string }>(async ({ ctx, input }) => {
  const reading = readPullTest(input.reading);
  const data = await createPracticePullTest({ ctx, input: practicePullCreateInput.parse({ ...input, reading }) });
  revalidatePath("/pull-tests");
  return { message: "Logged.", data };
});

export const updatePracticePullAction = action(async ({ ctx, input }) => {
  const reading = readPullTest(input.reading);
  await saveOver(input, (version) =>
    updatePracticePullTest({ ctx, input: practicePullUpdateInput.parse({ ...input, reading, version }) }),
  );
  revalidatePath("/pull-tests");
});

/** Of any reading, at a camp or in the practice field: margins of a trip may move, so everything is read again. */
export const switchPullTestAction = action(async ({ ctx, input }) => {
  await switchPullTest({ ctx, input: pullTestSwitchInput.parse(input) });
  revalidatePath("/", "layout");
  return { message: "" };
});

export const deletePullTestAction = action(async ({ ctx, input }) => {
  await deletePullTest({ ctx, input: pullTestRefInput.parse(input) });
  revalidatePath("/", "layout");
  return { message: "Deleted." };
});
