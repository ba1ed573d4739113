import type { z } from "zod";
import type { campRefInput } from "@/lib/domain/camp/schema";
import type { CampPlaceView } from "@/lib/domain/places/views";
import { toMgrs } from "@/lib/calc/places/mgrs";
import { toUtm } from "@/lib/calc/places/utm";
import { addDays } from "@/lib/format/days";
import { formatPosition, formatUtm } from "@/lib/format/positions";
import { declinationDeg } from "@/lib/places/declination";
import { moonOn, sunOn } from "@/lib/places/sun-moon";
import type { Context } from "@/lib/services/context/context";
import { getCamp } from "../camps/get-camp";
import { getTrip } from "../trips/get-trip";

/** Null while the camp has no position. */
export async function getCampPlace({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.input<typeof campRefInput>;
}): Promise<CampPlaceView | null> {
  const { details, days } = await getCamp({ ctx, input });
  const { timeZone } = await getTrip({ ctx, input: { tripId: input.tripId } });
  const { latitude, longitude, altitudeM } = details;
  if (latitude === null || longitude === null) return null;
  const place = { latitude, longitude };
  const utm = toUtm(place);
  return {
    position: formatPosition(latitude, longitude),
    utm: utm && formatUtm(utm),
    mgrs: toMgrs(place),
    declinationDeg: days[0] ? declinationDeg(place, altitudeM, days[0]) : null,
    timeZone,
    nights: days.map((day) => ({
      day,
      evening: sunOn(place, day, timeZone),
      morning: sunOn(place, addDays(day, 1), timeZone),
      moon: moonOn(place, day, timeZone),
    })),
  };
}
