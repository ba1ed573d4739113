"use server";

import { revalidatePath } from "next/cache";
import { redirect } from "next/navigation";
import { gearCreateInput, gearDeleteInput, gearUpdateInput } from "@/lib/domain/gear/schema";
import { action } from "@/lib/http/action";
import { createGear } from "@/lib/services/gear/create-gear";
import { deleteGear } from "@/lib/services/gear/delete-gear";
import { updateGear } from "@/lib/services/gear/update-gear";
import { readKitItemDetails } from "../_forms/read-kit-details";
import { readShelterDetails } from "../_forms/read-shelter-details";
import { saveOver } from "../_forms/save-over";
import { asTyped, type Typed } from "../_forms/typed-values";

function readGearDetails(input: Typed): Typed {
  const { type, shelter, anchor } = asTyped(input.details);
  if (type === "shelter") return { type, shelter: readShelterDetails(shelter, input.lengthUnit) };
  return { type, anchor: readKitItemDetails(anchor) };
}

export const createGearAction = action(async ({ ctx, input }) => {
  await createGear({ ctx, input: gearCreateInput.parse({ details: readGearDetails(input) }) });
  revalidatePath("/gear");
  redirect("/gear");
});

export const updateGearAction = action(async ({ ctx, input }) => {
  const details = readGearDetails(input);
  await saveOver(input, (version) => updateGear({ ctx, input: gearUpdateInput.parse({ ...input, details, version }) }));
  revalidatePath("/gear");
});

export const deleteGearAction = action(async ({ ctx, input }) => {
  await deleteGear({ ctx, input: gearDeleteInput.parse(input) });
  revalidatePath("/gear");
});
