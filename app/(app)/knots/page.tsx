import { KnotCard } from "@/components/knots/knot-drawing";
import { PageHeading } from "@/components/ui/layout";
import { requireContext } from "@/lib/auth/session";
import { KNOT_GUIDE } from "@/lib/domain/knots/knots";

export const metadata = { title: "Knots" };

/** Every knot that a plan can name, and a few more, for anybody signed in. */
export default async function KnotsPage() {
  await requireContext();
  return (
    <>
      <PageHeading
        title="Knots"
        lead="Drawn open, before they are pulled tight. The dark tip is the end you tie with; the arrow is the part that takes the load."
      />
      <nav aria-label="Knots on this page" className="mb-8">
        <ul className="flex flex-wrap gap-x-5">
          {KNOT_GUIDE.map((knot) => (
            <li key={knot.key}>
              <a
                href={`#${knot.key}`}
                className="inline-flex min-h-11 items-center font-semibold text-spruce hover:underline"
              >
                {knot.name}
              </a>
            </li>
          ))}
        </ul>
      </nav>
      {KNOT_GUIDE.map((knot) => (
        <section key={knot.key} id={knot.key} className="mb-12 scroll-mt-4">
          <h2 className="mb-4 border-b border-hair pb-2 text-18 font-bold">{knot.name}</h2>
          <KnotCard knot={knot} />
        </section>
      ))}
      <p className="max-w-[60rem] border-t border-hair pt-3 text-13 text-pencil">
        Common practice of the trade, for shelters only: nothing here is for climbing or for holding people. Practise at
        home; test each knot under load before you rely on it.
      </p>
    </>
  );
}
