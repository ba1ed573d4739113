/** An alternative for the windiest nights, and the sample's weather beside every camp: all invented. */
import { proposePlan } from "@/lib/calc/plan";
import { blankCamp, type CampDetails } from "@/lib/domain/camp/schema";
import { newId } from "@/lib/domain/ids";
import { toCampInput } from "@/lib/domain/plan/to-camp-input";
import { createAlternative } from "@/lib/services/camps/create-alternative";
import { listCampSummaries } from "@/lib/services/camps/list-camp-summaries";
import { updateCamp } from "@/lib/services/camps/update-camp";
import type { Context } from "@/lib/services/context/context";
import { acceptForecast } from "@/lib/services/forecast/accept-forecast";
import { fetchForecast } from "@/lib/services/forecast/fetch-forecast";
import { getCampForecast } from "@/lib/services/forecast/get-camp-forecast";
import { getCampPlan } from "@/lib/services/plan/get-camp-plan";
import { savePlanIntents } from "@/lib/services/plan/save-plan-intents";
import { sampleSource } from "@/lib/weather/sample-source";

const IN_PLACE_OF = "Skarn Edge";
const ACCEPTED_AT = "Marrow Tarn";

const BIELD: CampDetails = {
  ...blankCamp("Bield below the edge"),
  latitude: 62.0312,
  longitude: 8.9204,
  altitudeM: 548,
  ground: { kind: "firm-moist-loam", wetness: "usual", looseTopM: null, stoneDepthM: null },
  slopeDeg: 2,
  exposure: "III",
  temperatureC: 5,
  wind: { kind: "gust", speedMs: 19 },
  windFromDeg: 270,
  windToDeg: 315,
  strongWindHours: 6,
  hasRocks: true,
  water: "Spring under the boulders.",
  waterDistanceM: 110,
  wayOut: "Same path down to Otterbed, 4 km.",
  meetingPoint: "The old sheepfold.",
  notes: "Hollow in the lee of the edge, 40 minutes below the camp. Decide at the tarn, not on top.",
  hazards: ["rockfall"],
};

async function planAlternative(ctx: Context, tripId: string, campId: string): Promise<void> {
  const plan = await getCampPlan({ ctx, input: { tripId, campId } });
  const input = toCampInput(plan.camp.details, plan.pitches, plan.tray, [], plan.learned);
  const { placements } = proposePlan(input, { allowFound: true, allowDoubling: true });
  const change = { type: "replace" as const, placements: [...placements] };
  await savePlanIntents({ ctx, input: { tripId, campId, intents: [{ intentId: newId(), baseVersion: 0, change }] } });
}

/** One camp is planned with the sample; the others have it beside them, for somebody to look at. */
export async function seedWeather(ctx: Context, tripId: string): Promise<void> {
  const camps = await listCampSummaries({ ctx, input: { tripId } });
  const windiest = camps.find((camp) => camp.name === IN_PLACE_OF);
  if (!windiest) throw new Error("The demo has lost its windiest camp.");
  const { campId } = await createAlternative({ ctx, input: { tripId, campId: windiest.id, name: BIELD.name } });
  await updateCamp({ ctx, input: { tripId, campId, version: 1, details: { ...BIELD, nights: windiest.days.length } } });
  await planAlternative(ctx, tripId, campId);
  for (const camp of camps) {
    const input = { tripId, campId: camp.id };
    await fetchForecast({ ctx, input, source: sampleSource });
    if (camp.name !== ACCEPTED_AT) continue;
    const { latest, campVersion } = await getCampForecast({ ctx, input });
    await acceptForecast({ ctx, input: { ...input, forecastId: latest?.id ?? "", version: campVersion } });
  }
}
