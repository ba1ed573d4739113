import { index, integer, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { ForecastContent } from "@/lib/domain/forecast/schema";
import { idColumn, instant } from "./columns";
import { camp, trip } from "./trip";

const tripRef = () =>
  text("trip_id")
    .notNull()
    .references(() => trip.id, { onDelete: "cascade" });

/** A forecast for the nights of a camp, as it was fetched. The newest few of each camp are kept. */
export const forecast = sqliteTable(
  "forecast",
  {
    id: idColumn(),
    tripId: tripRef(),
    campId: text("camp_id")
      .notNull()
      .references(() => camp.id, { onDelete: "cascade" }),
    content: text("content", { mode: "json" }).$type<ForecastContent>().notNull(),
    fetchedByName: text("fetched_by_name").notNull(),
    fetchedAt: instant("fetched_at").notNull(),
  },
  (table) => [index("forecast_camp").on(table.campId, table.fetchedAt), index("forecast_trip").on(table.tripId)],
);

/** What of a forecast somebody took into a camp's plan; a later one changes it only when somebody says so. */
export const acceptedForecast = sqliteTable(
  "accepted_forecast",
  {
    campId: text("camp_id")
      .primaryKey()
      .references(() => camp.id, { onDelete: "cascade" }),
    tripId: tripRef(),
    /** The fetched one may be gone by now, so what it said is kept here. */
    forecastId: text("forecast_id").notNull(),
    content: text("content", { mode: "json" }).$type<ForecastContent>().notNull(),
    acceptedByName: text("accepted_by_name").notNull(),
    acceptedAt: instant("accepted_at").notNull(),
  },
  (table) => [index("accepted_forecast_trip").on(table.tripId)],
);

/** The last time that a camp's forecast was asked for and did not come. Gone when one comes. */
export const forecastFailure = sqliteTable(
  "forecast_failure",
  {
    campId: text("camp_id")
      .primaryKey()
      .references(() => camp.id, { onDelete: "cascade" }),
    tripId: tripRef(),
    /** For people: "The forecast service did not answer in time." */
    reason: text("reason").notNull(),
    count: integer("count").notNull().default(1),
    failedAt: instant("failed_at").notNull(),
  },
  (table) => [index("forecast_failure_trip").on(table.tripId)],
);
