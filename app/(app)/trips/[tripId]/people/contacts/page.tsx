import { ContactSheet } from "@/components/details/contact-sheet";
import { PaperLink } from "@/components/papers/paper-list";
import { PageBody } from "@/components/trip/page-body";
import { LinkButton } from "@/components/ui/button";
import { PageHeading } from "@/components/ui/layout";
import { plural } from "@/lib/format/words";
import { getContactSheet } from "@/lib/services/details/get-contact-sheet";
import { loadTrip } from "../../_lib/load-trip";

export const metadata = { title: "Contact sheet" };

export default async function ContactsPage({ params }: { readonly params: Promise<{ tripId: string }> }) {
  const { ctx, trip, preferences } = await loadTrip(params, "contacts.read");
  const sheet = await getContactSheet({ ctx, input: { tripId: trip.id } });
  const silent = sheet.people.filter((person) => person.details === null).length;
  return (
    <PageBody>
      <PageHeading
        title="Contact sheet"
        lead={
          silent === 0
            ? "For you who lead: nobody else sees this. Do not leave the paper lying about."
            : `${plural(silent, "person has", "people have")} written nothing yet. Only you who lead see this page.`
        }
      >
        <PaperLink
          href={`/api/trips/${trip.id}/contact-sheet?size=${preferences.paperSize}`}
          label="Contact sheet"
          of="for printing"
        />
        <LinkButton href={`/trips/${trip.id}/emergency`}>Emergency plan</LinkButton>
      </PageHeading>
      <ContactSheet people={sheet.people} />
    </PageBody>
  );
}
