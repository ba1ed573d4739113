import type { FormAction } from "@/components/ui/action-form";
import { OneButtonForm } from "@/components/forms/one-button-form";
import { DIRECTION_SPREAD_DEG, type PlannedWind } from "@/lib/domain/forecast/plan-wind";
import type { CampForecastView } from "@/lib/domain/forecast/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatWindRange } from "@/lib/format/angles";
import { formatInstant } from "@/lib/format/days";
import { formatSpeed } from "@/lib/format/speeds";
import { formatTemperature } from "@/lib/format/weather";
import { NightsForecast } from "./nights-forecast";
import { Outlook } from "./outlook";

interface ForecastPanelProps {
  readonly forecast: CampForecastView;
  readonly tripId: string;
  readonly timeZone: string;
  readonly preferences: Preferences;
  readonly placeHref: string;
  readonly fetchAction: FormAction<null>;
  readonly acceptAction: FormAction<null>;
}

/** The weather beside a camp's plan: what came last, what accepting it changes, what is planned with. */
export function ForecastPanel(props: ForecastPanelProps) {
  const { forecast, tripId, timeZone, preferences, placeHref, fetchAction, acceptAction } = props;
  const { latest, accepted, proposal, hindrance, days } = forecast;
  const ids = { tripId, campId: forecast.campId };
  const isLatestAccepted = latest !== null && !proposal && !hindrance;
  const shared = { days, preferences, timeZone };
  return (
    <div className="flex flex-col gap-6">
      <Failure forecast={forecast} timeZone={timeZone} />
      {!forecast.hasPosition ? (
        <p className="text-15">
          A forecast is for a place.{" "}
          <a href={`${placeHref}#where`} className="font-semibold text-spruce underline">
            Enter the camp&rsquo;s position
          </a>{" "}
          first.
        </p>
      ) : (
        latest === null && <p className="text-15">No forecast has been fetched for this camp yet.</p>
      )}
      {proposal && <Outlook outlook={proposal.outlook} unit={preferences.speedUnit} />}
      {hindrance && <p className="text-15 text-ochre">{hindrance}</p>}
      {latest && !isLatestAccepted && <NightsForecast title="Newest forecast" content={latest} {...shared} />}
      {latest && proposal && (
        <div>
          <p className="max-w-[46rem] text-15">{describePlanned(proposal.planned, preferences)}</p>
          <div className="mt-3">
            <OneButtonForm
              action={acceptAction}
              values={{ ...ids, forecastId: latest.id, "version:number": String(forecast.campVersion) }}
              look="primary"
            >
              {latest.isSample ? "Accept the sample into the plan" : "Accept into the plan"}
            </OneButtonForm>
          </div>
        </div>
      )}
      {accepted && (
        <div>
          <NightsForecast
            title={`Accepted by ${accepted.acceptedByName}, ${formatInstant(accepted.acceptedAt, timeZone)}`}
            content={accepted}
            {...shared}
          />
          {!accepted.isPlanned && (
            <p className="mt-2 text-15 text-ochre">
              The plan no longer stands on it: the camp&rsquo;s wind or nights have been changed since.
            </p>
          )}
        </div>
      )}
      {forecast.hasPosition && (
        <OneButtonForm action={fetchAction} values={ids} look="outline">
          Fetch the forecast
        </OneButtonForm>
      )}
    </div>
  );
}

function Failure({ forecast, timeZone }: Pick<ForecastPanelProps, "forecast" | "timeZone">) {
  const { failure, accepted } = forecast;
  if (!failure) return null;
  const kept = accepted
    ? `The plan keeps the values accepted ${formatInstant(accepted.acceptedAt, timeZone)}.`
    : "The plan keeps the wind that it has.";
  return (
    <p role="status" className="border-l-4 border-ochre py-1 pl-4 text-15">
      {failure.sentence} Last tried {formatInstant(failure.failedAt, timeZone)}
      {failure.count > 1 && `, ${failure.count} times in a row`}. {kept}
    </p>
  );
}

function describePlanned(planned: PlannedWind, { speedUnit, lengthUnit }: Preferences): string {
  const { wind, windFromDeg, windToDeg, temperatureC } = planned;
  const strength =
    wind && wind.kind !== "beaufort"
      ? `${wind.kind === "gust" ? "gusts" : "a mean wind"} of ${formatSpeed(wind.speedMs, speedUnit)}`
      : "no wind";
  const range = formatWindRange(windFromDeg, windToDeg);
  const from =
    windFromDeg === null
      ? "from any direction"
      : `from ${range}, the forecast's range and ${DIRECTION_SPREAD_DEG}° either side`;
  const cold = temperatureC === null ? "" : `, in air of ${formatTemperature(temperatureC, lengthUnit)}`;
  return `Accepting it plans this camp for ${strength} ${from}${cold}. Nothing changes until you do.`;
}
