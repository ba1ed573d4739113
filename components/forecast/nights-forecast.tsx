import type { ForecastContent, NightForecast } from "@/lib/domain/forecast/schema";
import type { Preferences } from "@/lib/domain/preferences";
import { formatCompass } from "@/lib/format/angles";
import { formatDayShort, formatInstant } from "@/lib/format/days";
import { formatSpeed } from "@/lib/format/speeds";
import { formatRain, formatTemperature } from "@/lib/format/weather";

type Formats = Pick<Preferences, "speedUnit" | "lengthUnit">;

const said = (value: number | null, format: (value: number) => string) => (value === null ? "not said" : format(value));

const COLUMNS: readonly { label: string; show: (night: NightForecast, formats: Formats) => string }[] = [
  { label: "Gust", show: (night, { speedUnit }) => said(night.gustMs, (value) => formatSpeed(value, speedUnit)) },
  { label: "Mean", show: (night, { speedUnit }) => said(night.meanMs, (value) => formatSpeed(value, speedUnit)) },
  { label: "From", show: (night) => said(night.fromDeg, formatCompass) },
  { label: "Rain", show: (night, { lengthUnit }) => said(night.rainMm, (value) => formatRain(value, lengthUnit)) },
  {
    label: "Coldest",
    show: (night, { lengthUnit }) => said(night.temperatureC, (value) => formatTemperature(value, lengthUnit)),
  },
  {
    label: "Feels like",
    show: ({ windChillC, temperatureC }, { lengthUnit }) =>
      windChillC === null
        ? temperatureC === null
          ? "not said"
          : "no wind chill"
        : formatTemperature(windChillC, lengthUnit),
  },
];

/** What stands beside every value that the sample source made up. */
export function SampleMark() {
  return (
    <p className="text-15 font-semibold text-ochre">
      Sample data for demonstration, not a forecast. Do not plan a real night with it.
    </p>
  );
}

/** A forecast's nights with its source and time. */
export function NightsForecast({
  title,
  content,
  days,
  preferences,
  timeZone,
}: {
  readonly title: string;
  readonly content: ForecastContent;
  readonly days: readonly string[];
  readonly preferences: Formats;
  readonly timeZone: string;
}) {
  const nights = content.nights.filter((night) => days.includes(night.day));
  return (
    <div>
      <h3 className="text-15 font-bold">{title}</h3>
      <p className="mb-2 text-13 text-pencil">
        From {content.source}, fetched {formatInstant(content.fetchedAt, timeZone)}. Each night from 16:00 to 10:00: its
        strongest, its coldest, all its rain.
      </p>
      {content.isSample && <SampleMark />}
      {nights.length === 0 ? (
        <p className="text-15 text-pencil">It was for other nights than the camp has now.</p>
      ) : (
        <table className="mt-1 w-full max-w-[46rem] border-collapse text-left text-15">
          <thead className="sr-only sm:not-sr-only sm:table-header-group">
            <tr className="text-13 text-pencil">
              <th scope="col" className="py-1 pr-4 font-semibold">
                Night
              </th>
              {COLUMNS.map((column) => (
                <th key={column.label} scope="col" className="py-1 pr-4 font-semibold">
                  {column.label}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {nights.map((night) => (
              <tr
                key={night.day}
                className="grid grid-cols-2 gap-x-4 border-t border-hair py-2 sm:table-row sm:py-0 sm:[&>*]:py-2.5"
              >
                <th scope="row" className="col-span-2 pr-4 font-bold whitespace-nowrap">
                  {formatDayShort(night.day)}
                </th>
                {COLUMNS.map((column) => (
                  <td key={column.label} className="pr-4 whitespace-nowrap">
                    <span aria-hidden="true" className="mr-2 text-13 text-pencil sm:hidden">
                      {column.label}
                    </span>
                    {column.show(night, preferences)}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </div>
  );
}
