"use server";

import { revalidatePath } from "next/cache";
import { personCreateInput, personDeleteInput, personRefInput, personUpdateInput } from "@/lib/domain/person/schema";
import { action } from "@/lib/http/action";
import { createPerson } from "@/lib/services/people/create-person";
import { deletePerson } from "@/lib/services/people/delete-person";
import { invitePerson } from "@/lib/services/people/invite-person";
import { updatePerson } from "@/lib/services/people/update-person";
import { deleteConfirmed, saveOver } from "../../../_forms/save-over";

const refresh = (tripId: unknown) => revalidatePath(`/trips/${String(tripId)}`, "layout");

export const createPersonAction = action(async ({ ctx, input }) => {
  const person = personCreateInput.parse(input);
  const { state } = await createPerson({ ctx, input: person });
  refresh(input.tripId);
  return {
    message:
      state === "joined"
        ? `${person.name} has an account and is on the trip. A mail says so.`
        : `${person.name} is on the trip. An invitation goes to ${person.email}.`,
  };
});

export const updatePersonAction = action(async ({ ctx, input }) => {
  await saveOver(input, (version) => updatePerson({ ctx, input: personUpdateInput.parse({ ...input, version }) }));
  refresh(input.tripId);
});

export const invitePersonAction = action(async ({ ctx, input }) => {
  await invitePerson({ ctx, input: personRefInput.parse(input) });
  refresh(input.tripId);
  return { message: "A new link is on its way; the old one no longer works." };
});

export const deletePersonAction = action(async ({ ctx, input }) => {
  await deleteConfirmed(deletePerson({ ctx, input: personDeleteInput.parse(input) }));
  refresh(input.tripId);
});
