import { render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test, vi } from "vitest";
import { ForecastPanel } from "@/components/forecast/forecast-panel";
import { TripForecasts } from "@/components/forecast/trip-forecasts";
import { HazardList } from "@/components/trip/hazard-list";
import type { ActionState } from "@/lib/domain/action-state";
import { blankCamp } from "@/lib/domain/camp/schema";
import { readFormData } from "@/lib/domain/form-data";
import type { ForecastContent } from "@/lib/domain/forecast/schema";
import type { CampForecastView } from "@/lib/domain/forecast/views";
import { METRIC, type Preferences } from "@/lib/domain/preferences";

const content = (over: Partial<ForecastContent> = {}): ForecastContent => ({
  source: "Hill weather",
  isSample: false,
  fetchedAt: "2027-06-06T16:20:00.000Z",
  nights: [
    {
      day: "2027-06-07",
      gustMs: 25,
      meanMs: 15,
      fromDeg: 270,
      rangeFromDeg: 260,
      rangeToDeg: 280,
      rainMm: 4,
      temperatureC: 3,
      windChillC: null,
    },
  ],
  ...over,
});

const side = (verdict: "holds" | "gives-way", designGustMs: number) => ({ verdict, designGustMs, holdsToGustMs: 22 });
const worse: CampForecastView["proposal"] = {
  planned: { wind: { kind: "gust", speedMs: 25 }, windFromDeg: 230, windToDeg: 310, temperatureC: 3 },
  outlook: {
    sentence: "Camp 3 now gives way: was holds",
    isWorse: true,
    before: side("holds", 20),
    after: side("gives-way", 25),
  },
};

const view = (over: Partial<CampForecastView> = {}): CampForecastView => ({
  campId: "camp000000000000000000",
  campName: "Camp 3",
  campVersion: 4,
  days: ["2027-06-07"],
  hasPosition: true,
  latest: { ...content(), id: "fore000000000000000000" },
  accepted: null,
  failure: null,
  proposal: worse,
  hindrance: null,
  ...over,
});

type Action = (state: ActionState, form: FormData) => Promise<ActionState>;
const done: Action = () => Promise.resolve({ status: "done", message: "", data: null });

function show(forecast: CampForecastView, preferences: Preferences = METRIC, acceptAction = done) {
  return render(
    <ForecastPanel
      forecast={forecast}
      tripId="trip000000000000000000"
      timeZone="Europe/Oslo"
      preferences={preferences}
      placeHref="/place"
      fetchAction={done}
      acceptAction={acceptAction}
    />,
  );
}

test("says what a worse forecast would do, before and after, with source and time, and waits", async () => {
  const accept = vi.fn(done);
  show(view(), METRIC, accept);
  expect(screen.getByText("Camp 3 now gives way: was holds.")).toBeInTheDocument();
  expect(screen.getByText("gust 72 km/h, holds to 79 km/h")).toBeInTheDocument();
  expect(screen.getByText("gust 90 km/h, gives way at 79 km/h")).toBeInTheDocument();
  expect(screen.getByText(/From Hill weather, fetched 6 June 18:20/)).toBeInTheDocument();
  expect(screen.getByText(/gusts of 90 km\/h from SW to NW, .*30° either side, in air of 3 °C/)).toBeInTheDocument();
  const cells = within(screen.getByRole("row", { name: /Mon 7/ })).getAllByRole("cell");
  expect(cells.map((cell) => cell.textContent?.replace(/^(Gust|Mean|From|Rain|Coldest|Feels like)/, ""))).toEqual([
    "90\u2009km/h",
    "54\u2009km/h",
    "W",
    "4\u2009mm",
    "3\u2009°C",
    "no wind chill",
  ]);
  expect(accept).not.toHaveBeenCalled();
  await userEvent.click(screen.getByRole("button", { name: "Accept into the plan" }));
  const form = accept.mock.calls[0]?.[1] ?? new FormData();
  expect(readFormData(form)).toMatchObject({ forecastId: "fore000000000000000000", version: 4 });
});

test("shows each person's units", () => {
  show(view(), { ...METRIC, speedUnit: "mph", lengthUnit: "ft" });
  expect(screen.getByRole("cell", { name: /56.mph/ })).toBeInTheDocument();
  expect(screen.getByRole("cell", { name: /0.16.in/ })).toBeInTheDocument();
  expect(screen.getByRole("cell", { name: /37.°F/ })).toBeInTheDocument();
});

test("sample data can't be taken for a forecast", () => {
  const latest = { ...content({ isSample: true, source: "sample data" }), id: "fore000000000000000000" };
  show(view({ latest }));
  expect(screen.getByText(/^Sample data for demonstration, not a forecast/)).toBeInTheDocument();
  expect(screen.getByRole("button", { name: "Accept the sample into the plan" })).toBeInTheDocument();
});

test("a failure says what stays", () => {
  const failure = { sentence: "The forecast service can't be reached.", failedAt: "2027-06-07T06:00:00Z", count: 2 };
  const accepted = {
    ...content(),
    acceptedAt: "2027-06-06T16:30:00Z",
    acceptedByName: "Runa Amsel",
    isPlanned: true,
  };
  show(view({ failure, accepted, proposal: null }));
  expect(
    screen.getByText(/can't be reached.*7 June 08:00, 2 times in a row.*keeps the values accepted 6 June 18:30/),
  ).toBeInTheDocument();
  expect(screen.queryByRole("button", { name: /^Accept/ })).not.toBeInTheDocument();
});

test("without a position there is nothing to fetch", () => {
  show(view({ hasPosition: false, latest: null, proposal: null }));
  expect(screen.getByRole("link", { name: /Enter the camp.s position/ })).toHaveAttribute("href", "/place#where");
  expect(screen.queryByRole("button")).not.toBeInTheDocument();
});

test("the trip's list names what got worse and what is not known", () => {
  const bare = view({ campId: "b", campName: "Low Barn", hasPosition: false, latest: null, proposal: null });
  render(
    <TripForecasts
      forecasts={[view(), bare]}
      tripId="trip000000000000000000"
      timeZone="Europe/Oslo"
      preferences={METRIC}
      checkAction={done}
    />,
  );
  expect(screen.getByText("Camp 3 now gives way: was holds.")).toBeInTheDocument();
  expect(screen.getByText("Gust 72 km/h → 90 km/h. Not accepted yet.")).toBeInTheDocument();
  expect(screen.getByText("No position yet.")).toBeInTheDocument();
  expect(screen.getByRole("button", { name: "Check all camps" })).toBeInTheDocument();
});

test("hazards come with what to do, hints with why, ways out as they were typed", () => {
  const details = {
    ...blankCamp("Otter Flat"),
    hazards: ["tide" as const],
    hasTrees: true,
    waterDistanceM: 120,
    wayOut: "North to the road.",
  };
  render(<HazardList details={details} placeHref="/place" lengthUnit="m" />);
  expect(screen.getByText(/Pitch above the highest drift line/)).toBeInTheDocument();
  expect(screen.getByText("Dead limbs overhead: there are trees here.")).toBeInTheDocument();
  expect(screen.getByText("120 m away.")).toBeInTheDocument();
  expect(screen.getByText("North to the road.")).toBeInTheDocument();
  expect(screen.getByText("not said yet")).toBeInTheDocument();
});
