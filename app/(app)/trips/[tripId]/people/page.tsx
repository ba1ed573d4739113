import { AddPersonForm } from "@/components/people/add-person-form";
import { PersonRow } from "@/components/people/person-row";
import { RolesTable } from "@/components/people/roles-table";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import { PERMISSIONS, ROLE_NAMES, ROLES, type Role } from "@/lib/domain/permissions/permissions";
import { plural } from "@/lib/format/words";
import { listPeople } from "@/lib/services/people/list-people";
import { loadTrip } from "../_lib/load-trip";
import { createPersonAction, deletePersonAction, invitePersonAction, updatePersonAction } from "./actions";

export const metadata = { title: "People" };

const ROLE_DETAILS: Readonly<Record<Role, string>> = {
  leader: "plans, sends, decides who is on the trip",
  "co-leader": "corrects camps, shelters and plans",
  participant: "sees the programme and their own pages",
};
const ROLE_OPTIONS = ROLES.map((role) => ({ value: role, label: ROLE_NAMES[role], detail: ROLE_DETAILS[role] }));

export default async function PeoplePage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, can } = await loadTrip(params, "people.read");
  const people = await listPeople({ ctx, input: { tripId: trip.id } });
  const open = people.filter((person) => person.state !== "joined").length;
  const mayEdit = can("people.edit");
  return (
    <PageBody>
      <PageHeading
        title={plural(people.length, "person", "people")}
        lead={open === 0 ? "Everybody has joined." : `${open} ${open === 1 ? "has" : "have"} not joined yet.`}
      >
        {can("pack.edit") && (
          <LinkButton href={`/trips/${trip.id}/people/packing`}>What they bring and carry</LinkButton>
        )}
      </PageHeading>
      <ul aria-label="People on the trip" className="mb-10">
        {people.map((person) => (
          <PersonRow
            key={person.id}
            tripId={trip.id}
            person={person}
            roleName={ROLE_NAMES[person.role]}
            roles={ROLE_OPTIONS}
            actions={
              mayEdit ? { update: updatePersonAction, invite: invitePersonAction, remove: deletePersonAction } : null
            }
          />
        ))}
      </ul>
      {mayEdit && (
        <Section title="Add somebody" lead="Who has no account here gets a link by mail; it works once.">
          <AddPersonForm action={createPersonAction} tripId={trip.id} roles={ROLE_OPTIONS} />
        </Section>
      )}
      <Section title="What each role may do">
        <RolesTable roles={ROLES.map((role) => ({ role, name: ROLE_NAMES[role] }))} rows={Object.values(PERMISSIONS)} />
      </Section>
    </PageBody>
  );
}
