import { sql } from "drizzle-orm";
import { index, integer, real, sqliteTable, text, uniqueIndex, type AnySQLiteColumn } from "drizzle-orm/sqlite-core";
import type { CampDetails } from "@/lib/domain/camp/schema";
import type { Role } from "@/lib/domain/permissions/permissions";
import type { Contact } from "@/lib/domain/trip/schema";
import { user } from "./auth";
import { flag, idColumn, instant, versionColumn } from "./columns";

export const trip = sqliteTable("trip", {
  id: idColumn(),
  name: text("name").notNull(),
  /** Calendar day of the first night, yyyy-mm-dd, in the trip's time zone. */
  startDate: text("start_date").notNull(),
  timeZone: text("time_zone").notNull(),
  notes: text("notes").notNull().default(""),
  contacts: text("contacts", { mode: "json" }).$type<Contact[]>().notNull().default([]),
  version: versionColumn(),
  /** Counts up whenever something that is printed changes; cards carry it. */
  paperVersion: integer("paper_version").notNull().default(1),
  createdBy: text("created_by").references(() => user.id, { onDelete: "set null" }),
  createdAt: instant("created_at").notNull(),
  updatedAt: instant("updated_at").notNull(),
});

/** Somebody on a trip, with or without an account yet. */
export const person = sqliteTable(
  "person",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    userId: text("user_id").references(() => user.id, { onDelete: "set null" }),
    name: text("name").notNull(),
    email: text("email").notNull(),
    role: text("role").$type<Role>().notNull(),
    version: versionColumn(),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [
    uniqueIndex("person_trip_email").on(table.tripId, table.email),
    uniqueIndex("person_trip_user")
      .on(table.tripId, table.userId)
      .where(sql`user_id is not null`),
    index("person_user").on(table.userId),
  ],
);

export const invitation = sqliteTable(
  "invitation",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    personId: text("person_id")
      .notNull()
      .references(() => person.id, { onDelete: "cascade" }),
    /** SHA-256 of the token in the link; the token itself is only in the mail. */
    tokenHash: text("token_hash").notNull().unique(),
    expiresAt: instant("expires_at").notNull(),
    usedAt: instant("used_at"),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [index("invitation_person").on(table.personId)],
);

export const camp = sqliteTable(
  "camp",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    position: integer("position").notNull(),
    /**
     * Null: it is in the line of nights. Otherwise the camp in whose place it stands by, in bad weather; it has that
     * camp's nights and days, and no list of the trip counts it.
     */
    alternativeToId: text("alternative_to_id").references((): AnySQLiteColumn => camp.id, { onDelete: "cascade" }),
    name: text("name").notNull(),
    nights: integer("nights").notNull().default(1),
    latitude: real("latitude"),
    longitude: real("longitude"),
    altitudeM: real("altitude_m"),
    ground: text("ground", { mode: "json" }).$type<CampDetails["ground"]>(),
    secondGround: text("second_ground", { mode: "json" }).$type<CampDetails["secondGround"]>(),
    slopeDeg: real("slope_deg").notNull().default(0),
    exposure: text("exposure").$type<CampDetails["exposure"]>(),
    hill: text("hill", { mode: "json" }).$type<CampDetails["hill"]>(),
    windbreak: text("windbreak", { mode: "json" }).$type<CampDetails["windbreak"]>(),
    underTreesSpeedRatio: real("under_trees_speed_ratio"),
    temperatureC: real("temperature_c"),
    wind: text("wind", { mode: "json" }).$type<CampDetails["wind"]>(),
    windFromDeg: real("wind_from_deg"),
    windToDeg: real("wind_to_deg"),
    strongWindHours: real("strong_wind_hours"),
    hasRocks: flag("has_rocks").notNull().default(false),
    hasTrees: flag("has_trees").notNull().default(false),
    hasSticks: flag("has_sticks").notNull().default(false),
    water: text("water").notNull().default(""),
    waterDistanceM: real("water_distance_m"),
    wayOut: text("way_out").notNull().default(""),
    meetingPoint: text("meeting_point").notNull().default(""),
    notes: text("notes").notNull().default(""),
    hazards: text("hazards", { mode: "json" }).$type<CampDetails["hazards"]>().notNull().default([]),
    version: versionColumn(),
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (table) => [index("camp_trip").on(table.tripId, table.position), index("camp_alternative").on(table.alternativeToId)],
);

/** Who changed what on a trip; written in the transaction of the change. */
export const changeLog = sqliteTable(
  "change_log",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    userId: text("user_id").references(() => user.id, { onDelete: "set null" }),
    userName: text("user_name").notNull(),
    action: text("action").notNull(),
    entity: text("entity").notNull(),
    entityId: text("entity_id").notNull(),
    summary: text("summary").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (table) => [index("change_log_trip").on(table.tripId, table.createdAt)],
);
