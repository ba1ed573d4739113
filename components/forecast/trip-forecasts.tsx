import Link from "next/link";
import { OneButtonForm } from "@/components/forms/one-button-form";
import type { FormAction } from "@/components/ui/action-form";
import type { CampForecastView } from "@/lib/domain/forecast/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatDayShort, formatInstant } from "@/lib/format/days";
import { formatSpeed } from "@/lib/format/speeds";
import { SampleMark } from "./nights-forecast";

/** One line a camp: what its forecast says against its plan, and what to look at. */
export function TripForecasts({
  forecasts,
  tripId,
  timeZone,
  preferences,
  checkAction,
}: {
  readonly forecasts: readonly CampForecastView[];
  readonly tripId: string;
  readonly timeZone: string;
  readonly preferences: Preferences;
  readonly checkAction: FormAction<null>;
}) {
  const hasSample = forecasts.some((one) => one.latest?.isSample || one.accepted?.isSample);
  return (
    <div>
      {hasSample && <SampleMark />}
      <ul className="mt-2">
        {forecasts.map((forecast) => (
          <li
            key={forecast.campId}
            className="grid gap-x-6 gap-y-1 border-t border-hair py-3 sm:grid-cols-[12rem_minmax(0,1fr)]"
          >
            <div>
              <Link
                href={`/trips/${tripId}/camps/${forecast.campId}/weather`}
                className="inline-flex min-h-11 items-center text-15 font-bold hover:text-spruce hover:underline sm:min-h-0"
              >
                {forecast.campName}
              </Link>
              <span className="block text-13 text-pencil">{forecast.days.map(formatDayShort).join(", ")}</span>
            </div>
            <div className="text-15">
              <Standing forecast={forecast} preferences={preferences} timeZone={timeZone} />
            </div>
          </li>
        ))}
      </ul>
      <div className="mt-3 border-t border-hair pt-3">
        <OneButtonForm action={checkAction} values={{ tripId }} look="outline">
          Check all camps
        </OneButtonForm>
      </div>
    </div>
  );
}

interface StandingProps {
  readonly forecast: CampForecastView;
  readonly preferences: Preferences;
  readonly timeZone: string;
}

function Standing({ forecast, preferences, timeZone }: StandingProps) {
  const { latest, accepted, proposal, failure, hindrance } = forecast;
  const unit = preferences.speedUnit;
  const lines: { text: string; tone: string }[] = [];
  if (proposal) {
    const { sentence, isWorse, before, after } = proposal.outlook;
    const gusts = [before, after].map(({ designGustMs }) =>
      designGustMs === null ? "not known" : formatSpeed(designGustMs, unit),
    );
    lines.push({ text: `${sentence}.`, tone: isWorse ? "font-bold text-rowan" : "" });
    lines.push({ text: `Gust ${gusts[0]} → ${gusts[1]}. Not accepted yet.`, tone: "text-13 text-pencil" });
  } else if (hindrance) {
    lines.push({ text: hindrance, tone: "text-ochre" });
  } else if (accepted?.isPlanned) {
    lines.push({ text: "Planned with the newest forecast.", tone: "" });
  } else if (!latest) {
    lines.push({ text: forecast.hasPosition ? "Not fetched yet." : "No position yet.", tone: "text-pencil" });
  }
  if (latest) {
    const from = `${latest.source}, fetched ${formatInstant(latest.fetchedAt, timeZone)}`;
    const acceptedAt = accepted ? `; accepted ${formatInstant(accepted.acceptedAt, timeZone)}` : "";
    lines.push({ text: `${from}${acceptedAt}.`, tone: "text-13 text-pencil" });
  }
  if (failure) {
    const kept = accepted ? "The accepted values stay." : "The plan keeps the wind that it has.";
    lines.push({ text: `${failure.sentence} ${kept}`, tone: "text-13 text-ochre" });
  }
  return lines.map(({ text, tone }) => (
    <p key={text} className={tone}>
      {text}
    </p>
  ));
}
