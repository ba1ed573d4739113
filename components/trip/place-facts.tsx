import type { ReactNode } from "react";
import { Section } from "@/components/ui/layout";
import type { CampPlaceView } from "@/lib/domain/places/views";
import { formatChance } from "@/lib/format/numbers";
import { formatDay, formatTime } from "@/lib/format/days";
import { formatDeclination } from "@/lib/format/positions";

/** Where the camp is in each way of writing it, how far north is from the needle's, and the light of its nights. */
export function PlaceFacts({ place }: { readonly place: CampPlaceView | null }) {
  if (!place) {
    return (
      <Section title="Position, sun and moon">
        <p className="text-15 text-pencil">
          Enter a latitude and longitude under Place and save: then grid references, magnetic north and the light of
          each night stand here.
        </p>
      </Section>
    );
  }
  return (
    <Section title="Position, sun and moon">
      <dl className="mb-6 grid gap-x-8 gap-y-3 sm:grid-cols-2 lg:grid-cols-4">
        <Fact term="Latitude, longitude">{place.position}</Fact>
        <Fact term="UTM">{place.utm ?? "UTM does not reach here."}</Fact>
        <Fact term="Grid reference">{place.mgrs ?? "Not within 80° south to 84° north."}</Fact>
        <Fact term="Magnetic north">
          {place.declinationDeg === null
            ? "Not known for this day."
            : `${formatDeclination(place.declinationDeg)} of true north`}
        </Fact>
      </dl>
      <ul>
        {place.nights.map((night) => (
          <li key={night.day} className="grid gap-x-6 border-t border-hair py-3 text-15 sm:grid-cols-[10rem_1fr_1fr]">
            <p className="font-semibold">{formatDay(night.day)}</p>
            <p>{describeSun(night, place.timeZone)}</p>
            <p>{describeMoon(night.moon, place.timeZone)}</p>
          </li>
        ))}
      </ul>
      <p className="mt-2 max-w-[46rem] text-13 text-pencil">
        WGS 84. Magnetic north by WMM2025. Times on the clock of {place.timeZone.replaceAll("_", " ")}, for a level
        horizon: hills bring the dark earlier and the morning later.
      </p>
    </Section>
  );
}

function Fact({ term, children }: { readonly term: string; readonly children: ReactNode }) {
  return (
    <div>
      <dt className="text-13 text-pencil">{term}</dt>
      <dd className="text-15 font-semibold tabular-nums">{children}</dd>
    </div>
  );
}

function describeSun({ evening, morning }: CampPlaceView["nights"][number], timeZone: string): string {
  const at = (instant: string) => formatTime(instant, timeZone);
  if (evening.light === "sun-all-day") return "The sun does not set.";
  if (evening.light === "dark-all-day") return "It does not get light.";
  const sunset = evening.sunset ? `Sunset ${at(evening.sunset)}` : "The sun does not rise";
  const dark = evening.dusk ? `, dark ${at(evening.dusk)}` : ", light all night";
  const light = morning.dawn && evening.dusk ? `; light again ${at(morning.dawn)}` : "";
  return `${sunset}${dark}${light}.`;
}

function describeMoon(moon: CampPlaceView["nights"][number]["moon"], timeZone: string): string {
  const phase = moon.lit < 0.03 ? "New moon" : moon.lit > 0.97 ? "Full moon" : moon.isWaxing ? "Waxing" : "Waning";
  const times = [
    moon.rise ? `rises ${formatTime(moon.rise, timeZone)}` : null,
    moon.set ? `sets ${formatTime(moon.set, timeZone)}` : null,
  ].filter((part) => part !== null);
  const sorted = moon.rise && moon.set && moon.set < moon.rise ? times.toReversed() : times;
  const where = sorted.length > 0 ? sorted.join(", ") : moon.isUpAtMidnight ? "up all night" : "not up";
  return `${phase}, ${formatChance(moon.lit)} lit: ${where}.`;
}
