"use client";

import { FieldError, NumberField, TextField } from "@/components/ui/fields";
import { useFieldErrors } from "@/components/ui/action-form";
import { Section } from "@/components/ui/layout";
import type { TypedLeg } from "@/lib/domain/route/schema";
import type { RouteView } from "@/lib/domain/route/views";
import type { Preferences } from "@/lib/domain/preferences";
import { LONG_UNITS } from "@/lib/format/distances";

interface TypedLegsProps {
  readonly view: RouteView;
  readonly unit: Preferences["lengthUnit"];
  readonly shortM: number;
  readonly longM: number;
  readonly blank: TypedLeg;
  readonly shown: (value: number | null, factor?: number) => string;
  readonly clock: (minute: number | null) => string;
}

/** One row for each leg; lengths typed here count where the line does not say them. */
export function TypedLegs(props: TypedLegsProps) {
  const { view, blank } = props;
  const errors = useFieldErrors("legs");
  if (view.stops.length === 0) return null;
  return (
    <Section
      title="Days of their own"
      lead="Set off at another time on a day, or type a leg&rsquo;s length as measured on a map: it counts where the line does not say it."
    >
      <FieldError errors={errors} />
      {view.stops.map((stop, index) => (
        <div key={stop.campId}>
          <input type="hidden" name={`legs.${index}.campId`} value={stop.campId} />
          <LegRow {...props} path={`legs.${index}.leg`} title={`To ${stop.name}`} leg={stop.leg ?? blank} />
        </div>
      ))}
      <LegRow {...props} path="homeLeg" title="To the end" leg={view.homeLeg ?? blank} />
    </Section>
  );
}

function LegRow({
  path,
  title,
  leg,
  unit,
  shortM,
  longM,
  shown,
  clock,
}: TypedLegsProps & { readonly path: string; readonly title: string; readonly leg: TypedLeg }) {
  return (
    <fieldset className="border-t border-hair py-3">
      <legend className="sr-only">{title}</legend>
      <div className="grid grid-cols-2 items-end gap-3 sm:grid-cols-[10rem_repeat(4,minmax(0,1fr))]">
        <p className="col-span-2 text-15 font-semibold sm:col-span-1 sm:pb-3" aria-hidden="true">
          {title}
        </p>
        <NumberField
          name={`${path}.distanceM`}
          label="Distance"
          unit={LONG_UNITS[unit].name}
          defaultValue={shown(leg.distanceM, longM)}
        />
        <NumberField name={`${path}.ascentM`} label="Up" unit={unit} defaultValue={shown(leg.ascentM, shortM)} />
        <NumberField name={`${path}.descentM`} label="Down" unit={unit} defaultValue={shown(leg.descentM, shortM)} />
        <TextField type="time" name={`${path}.setOffMinute`} label="Set off" defaultValue={clock(leg.setOffMinute)} />
      </div>
    </fieldset>
  );
}
