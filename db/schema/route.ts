import { blob, index, integer, real, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { Profile } from "@/lib/calc/route/types";
import type { RouteSettings, TypedLeg, RouteBreak, RoutePlace, SimplifiedLine } from "@/lib/domain/route/schema";
import { instant, versionColumn } from "./columns";
import { camp, trip } from "./trip";

/** The way of a trip: one line, as it came and simplified. */
export const routeLine = sqliteTable("route_line", {
  tripId: text("trip_id")
    .primaryKey()
    .references(() => trip.id, { onDelete: "cascade" }),
  name: text("name").notNull(),
  /** "file" or "drawn". */
  source: text("source").$type<"file" | "drawn">().notNull(),
  /** Latitude, longitude, height (NaN: not known) and place along the line of every point, doubles in little-endian. */
  points: blob("points", { mode: "buffer" }).notNull(),
  pointCount: integer("point_count").notNull(),
  /** Index of the first point of each piece. */
  starts: text("starts", { mode: "json" }).$type<readonly number[]>().notNull(),
  lengthM: real("length_m").notNull(),
  breaks: text("breaks", { mode: "json" }).$type<readonly RouteBreak[]>().notNull(),
  simplified: text("simplified", { mode: "json" }).$type<SimplifiedLine>().notNull(),
  profile: text("profile", { mode: "json" }).$type<Profile>().notNull(),
  /** Places that the file names. */
  places: text("places", { mode: "json" }).$type<readonly RoutePlace[]>().notNull(),
  remarks: text("remarks", { mode: "json" }).$type<readonly string[]>().notNull(),
  createdAt: instant("created_at").notNull(),
});

/** How the group walks, and the leg home; there also when there is no line. */
export const routeSettings = sqliteTable("route_settings", {
  tripId: text("trip_id")
    .primaryKey()
    .references(() => trip.id, { onDelete: "cascade" }),
  settings: text("settings", { mode: "json" }).$type<RouteSettings>().notNull(),
  homeLeg: text("home_leg", { mode: "json" }).$type<TypedLeg>(),
  version: versionColumn(),
  updatedAt: instant("updated_at").notNull(),
});

/** A camp's place along the line and what was typed of the leg that leads to it. */
export const campStop = sqliteTable(
  "camp_stop",
  {
    campId: text("camp_id")
      .primaryKey()
      .references(() => camp.id, { onDelete: "cascade" }),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    atM: real("at_m"),
    leg: text("leg", { mode: "json" }).$type<TypedLeg>(),
  },
  (table) => [index("camp_stop_trip").on(table.tripId)],
);
