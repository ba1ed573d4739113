import { HAZARDS, type CampDetails } from "@/lib/domain/camp/schema";
import { suggestHazards } from "@/lib/domain/camp/terrain-hints";
import type { Preferences } from "@/lib/domain/preferences";
import { formatAltitude } from "@/lib/format/lengths";

/** What the place can do to people and what to do about it; what is worth a look though nobody ticked it; ways out. */
export function HazardList({
  details,
  placeHref,
  lengthUnit,
}: {
  readonly details: CampDetails;
  readonly placeHref: string;
  readonly lengthUnit: Preferences["lengthUnit"];
}) {
  const ticked = HAZARDS.filter((hazard) => details.hazards.includes(hazard.key));
  const hints = suggestHazards(details);
  const water = [
    details.waterDistanceM === null ? "" : `${formatAltitude(details.waterDistanceM, lengthUnit)} away.`,
    details.water,
  ]
    .filter(Boolean)
    .join(" ");
  const facts = [
    ["Water", water],
    ["Way out", details.wayOut],
    ["Meeting point", details.meetingPoint],
  ] as const;
  return (
    <div className="flex max-w-[46rem] flex-col gap-5">
      {ticked.length === 0 ? (
        <p className="text-15 text-pencil">No hazard is ticked for this place.</p>
      ) : (
        <ul className="flex flex-col gap-2">
          {ticked.map((hazard) => (
            <li key={hazard.key} className="border-l-4 border-ochre py-0.5 pl-4 text-15">
              <b>{hazard.name}.</b> {hazard.caution}
            </li>
          ))}
        </ul>
      )}
      {hints.length > 0 && (
        <div>
          <h3 className="text-15 font-bold">Worth a look</h3>
          <ul className="mt-1 text-15">
            {hints.map((hint) => (
              <li key={hint.key}>
                {hint.name}: {hint.reason.charAt(0).toLowerCase() + hint.reason.slice(1)}
              </li>
            ))}
          </ul>
        </div>
      )}
      <dl className="grid grid-cols-[7.5rem_minmax(0,1fr)] gap-x-3 gap-y-2 text-15">
        {facts.map(([label, text]) => (
          <div key={label} className="contents">
            <dt className="text-pencil">{label}</dt>
            <dd className={text ? "whitespace-pre-line" : "text-pencil"}>{text || "not said yet"}</dd>
          </div>
        ))}
      </dl>
      <p>
        <a
          href={`${placeHref}#hazards`}
          className="inline-flex min-h-11 items-center text-15 font-semibold text-spruce hover:underline"
        >
          Change hazards, water and way out
        </a>
      </p>
    </div>
  );
}
