"use server";

import { revalidatePath } from "next/cache";
import {
  peopleImportInput,
  personCreateInput,
  personDeleteInput,
  personRefInput,
  personUpdateInput,
} from "@/lib/domain/person/schema";
import { requestInput } from "@/lib/domain/post/schema";
import { rosterInput } from "@/lib/domain/roster/schema";
import { plural } from "@/lib/format/words";
import { action } from "@/lib/http/action";
import { remindNow } from "@/lib/services/answers/remind";
import { createPerson } from "@/lib/services/people/create-person";
import { deletePerson } from "@/lib/services/people/delete-person";
import { importPeople } from "@/lib/services/people/import-people";
import { invitePerson } from "@/lib/services/people/invite-person";
import { updatePerson } from "@/lib/services/people/update-person";
import { updateRoster } from "@/lib/services/roster/update-roster";
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

export const updateRosterAction = action(async ({ ctx, input }) => {
  await saveOver(input, (version) => updateRoster({ ctx, input: rosterInput.parse({ ...input, version }) }));
  refresh(input.tripId);
});

export const remindNowAction = action(async ({ ctx, input }) => {
  const { count } = await remindNow({ ctx, input: requestInput.parse(input) });
  refresh(input.tripId);
  return { message: `A reminder goes to ${plural(count, "person", "people")}.` };
});

export const importPeopleAction = action(async ({ ctx, input }) => {
  const result = await importPeople({ ctx, input: peopleImportInput.parse(input) });
  if (result.isDone) refresh(input.tripId);
  const who = plural(result.people.length, "person", "people");
  return { message: result.isDone ? `${who} added and invited.` : `The file is in order: ${who}.`, data: result };
});
