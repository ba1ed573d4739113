import { AddPersonForm } from "@/components/people/add-person-form";
import { ImportPeopleForm } from "@/components/people/import-people-form";
import { PersonRow } from "@/components/people/person-row";
import { RolesTable } from "@/components/people/roles-table";
import { RosterForm } from "@/components/people/roster-form";
import { PageBody } from "@/components/trip/page-body";
import { ActionForm, SubmitButton } from "@/components/ui/action-form";
import { LinkButton } from "@/components/ui/button";
import { PageHeading, Section } from "@/components/ui/layout";
import { newId } from "@/lib/domain/new-id";
import type { RosterView } from "@/lib/domain/people-views";
import { PERMISSIONS, ROLE_NAMES, ROLES, type Role } from "@/lib/domain/permissions/permissions";
import { capitalise } from "@/lib/domain/text";
import { formatDayLong } from "@/lib/format/days";
import { plural } from "@/lib/format/words";
import { listPeople } from "@/lib/services/people/list-people";
import { getRoster } from "@/lib/services/roster/get-roster";
import { loadTrip } from "../_lib/load-trip";
import {
  createPersonAction,
  deletePersonAction,
  importPeopleAction,
  invitePersonAction,
  remindNowAction,
  updatePersonAction,
  updateRosterAction,
} from "./actions";

export const metadata = { title: "People" };

const ROLE_DETAILS: Readonly<Record<Role, string>> = {
  leader: "plans, sends, decides who is on the trip",
  "co-leader": "corrects camps, shelters and plans",
  participant: "sees the programme and their own pages",
};
const ROLE_OPTIONS = ROLES.map((role) => ({ value: role, label: ROLE_NAMES[role], detail: ROLE_DETAILS[role] }));

export default async function PeoplePage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, can } = await loadTrip(params, "people.read");
  const input = { tripId: trip.id };
  const [people, roster] = await Promise.all([listPeople({ ctx, input }), getRoster({ ctx, input })]);
  const mayEdit = can("people.edit");
  return (
    <PageBody>
      <PageHeading
        title={describeCounts(roster)}
        lead={describeRoster(roster, people.filter((person) => person.state !== "joined").length)}
      >
        {mayEdit && roster.counts.open + roster.counts.maybe > 0 && (
          <ActionForm action={remindNowAction}>
            <input type="hidden" name="tripId" value={trip.id} />
            <input type="hidden" name="requestId" value={newId()} />
            <SubmitButton look="outline">Remind who has not settled</SubmitButton>
          </ActionForm>
        )}
        <LinkButton href={`/trips/${trip.id}/people/contacts`}>Contact sheet</LinkButton>
        <LinkButton href={`/trips/${trip.id}/emergency`}>Emergency plan</LinkButton>
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
      {mayEdit && (
        <Section title="Answers and places">
          <RosterForm key={roster.version} action={updateRosterAction} tripId={trip.id} roster={roster} />
        </Section>
      )}
      {mayEdit && (
        <Section
          title="Many at once"
          lead="From a file of a spreadsheet. Everybody in it is added and invited, or nobody."
          actions={
            <a
              href={`/api/trips/${trip.id}/people`}
              className="inline-flex min-h-11 items-center font-semibold text-spruce hover:underline"
            >
              Save the list as CSV
            </a>
          }
        >
          <ImportPeopleForm action={importPeopleAction} tripId={trip.id} />
        </Section>
      )}
      <Section title="What each role may do">
        <RolesTable roles={ROLES.map((role) => ({ role, name: ROLE_NAMES[role] }))} rows={Object.values(PERMISSIONS)} />
      </Section>
    </PageBody>
  );
}

function describeCounts({ counts, capacity }: RosterView): string {
  const places = capacity === null ? "" : ` of ${capacity}`;
  return `${counts.coming}${places} ${counts.coming === 1 ? "comes" : "come"} along`;
}

function describeRoster({ counts, answerBy }: RosterView, notJoined: number): string {
  const parts = [
    counts.waiting > 0 && `${counts.waiting} on the waiting list`,
    counts.maybe > 0 && `${counts.maybe} maybe`,
    counts.no > 0 && plural(counts.no, "refusal"),
    counts.open > 0 &&
      `${plural(counts.open, "answer")} missing${answerBy ? `, wanted by ${formatDayLong(answerBy)}` : ""}`,
    notJoined > 0 && `${notJoined} ${notJoined === 1 ? "has" : "have"} no account here yet`,
  ].filter((part) => part !== false);
  return parts.length === 0 ? "Everybody has answered and joined." : `${capitalise(parts.join("; "))}.`;
}
