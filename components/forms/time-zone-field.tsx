"use client";

import { useSyncExternalStore } from "react";
import { SelectField } from "@/components/ui/fields";

const noSubscription = () => () => {};
const zoneHere = () => Intl.DateTimeFormat().resolvedOptions().timeZone;
const zoneOnServer = () => "";

/** The trip's zone; a new trip starts with the zone of this device, which can be seen and changed. */
export function TimeZoneField({ zones, chosen }: { readonly zones: readonly string[]; readonly chosen?: string }) {
  const here = useSyncExternalStore(noSubscription, zoneHere, zoneOnServer);
  const start = chosen ?? (zones.includes(here) ? here : "");
  return (
    <SelectField
      key={start}
      name="timeZone"
      label="Time zone"
      placeholder="Choose"
      options={zones.map((zone) => ({ value: zone, label: zone.replaceAll("_", " ") }))}
      defaultValue={start}
      hint="Days and times are printed in this zone."
    />
  );
}
