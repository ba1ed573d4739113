import { redirect } from "next/navigation";
import { BrandMark } from "@/components/shell/brand-mark";
import { ShelterPlan } from "@/components/drawing/shelter-plan";
import { LinkButton } from "@/components/ui/button";
import { Cautions } from "@/components/ui/layout";
import { getContext } from "@/lib/auth/session";
import { buildShelter, defaultShelterSpec } from "@/lib/calc/shelter-kinds";

/** What it is, and the two ways in. */
export default async function StartPage() {
  if (await getContext()) redirect("/trips");
  return (
    <main
      id="main"
      className="mx-auto grid min-h-dvh max-w-[76rem] content-center gap-x-16 gap-y-10 px-4 py-12 sm:px-8 lg:grid-cols-[minmax(0,1fr)_minmax(0,1.1fr)]"
    >
      <div className="flex flex-col items-start justify-center">
        <p className="mb-6 flex items-center gap-3 text-24 font-extrabold">
          <BrandMark size={40} />
          Leestead
        </p>
        <h1 className="text-34 font-bold">Plan camps that hold.</h1>
        <p className="mt-4 max-w-[34rem] text-18">
          Enter each camp&rsquo;s ground and wind, the shelters and the anchors that you carry. Leestead works out what
          every line pulls and what every anchor holds, and sets the best anchor where it matters most. Print the cards
          or send them, so that everybody knows what to bring, where to sleep and how to pitch.
        </p>
        <div className="mt-8 flex flex-wrap gap-3">
          <LinkButton href="/sign-in" look="primary">
            Sign in
          </LinkButton>
          <LinkButton href="/sign-up">Create an account</LinkButton>
        </div>
      </div>
      <div className="self-center rounded-sheet border border-hair bg-sheet">
        <ShelterPlan
          model={buildShelter(defaultShelterSpec("ridge-tarp"))}
          headingDeg={0}
          wind={{ fromDeg: 255, toDeg: 300 }}
          label="A ridge tarp in plan: eight lines, the wind from the west, north and a scale"
        />
      </div>
      <div className="lg:col-span-2">
        <Cautions />
      </div>
    </main>
  );
}
