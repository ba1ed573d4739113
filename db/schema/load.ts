import { index, integer, real, sqliteTable, text } from "drizzle-orm/sqlite-core";
import type { KitOutcome } from "@/lib/calc/kit/search-kit";
import type { KitSearchSettings } from "@/lib/domain/kit/search-schema";
import { idColumn, flag, instant } from "./columns";
import { shelter } from "./shelter";
import { person, trip } from "./trip";

/** The last search for a kit of a trip: what was asked, what came out, and whether it was taken over. */
export const kitSearch = sqliteTable("kit_search", {
  tripId: text("trip_id")
    .primaryKey()
    .references(() => trip.id, { onDelete: "cascade" }),
  settings: text("settings", { mode: "json" }).$type<KitSearchSettings>().notNull(),
  outcome: text("outcome", { mode: "json" }).$type<KitOutcome>().notNull(),
  /** Fingerprint of the camps, shelters, anchors and plans that it was worked out from. */
  basis: text("basis").notNull(),
  foundByName: text("found_by_name").notNull(),
  foundAt: instant("found_at").notNull(),
  acceptedAt: instant("accepted_at"),
});

/** What somebody can carry. Body mass is theirs alone; others see only the limit that follows from it. */
export const personLoad = sqliteTable(
  "person_load",
  {
    personId: text("person_id")
      .primaryKey()
      .references(() => person.id, { onDelete: "cascade" }),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    baseMassKg: real("base_mass_kg"),
    bodyMassKg: real("body_mass_kg"),
    /** Of the body mass, 0…0.6; with a body mass it makes the limit. */
    limitShare: real("limit_share"),
    limitKg: real("limit_kg"),
  },
  (table) => [index("person_load_trip").on(table.tripId)],
);

/** How a shelter is taken apart for carrying. */
export const shelterSplit = sqliteTable(
  "shelter_split",
  {
    shelterId: text("shelter_id")
      .primaryKey()
      .references(() => shelter.id, { onDelete: "cascade" }),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    /** Null: its poles stay with the fly, or it has none. */
    polesMassKg: real("poles_mass_kg"),
    staysWithSleepers: flag("stays_with_sleepers").notNull().default(false),
  },
  (table) => [index("shelter_split_trip").on(table.tripId)],
);

/** Something of the group's that is neither shelter nor kit: stove, first aid. */
export const groupThing = sqliteTable(
  "group_thing",
  {
    id: idColumn(),
    tripId: text("trip_id")
      .notNull()
      .references(() => trip.id, { onDelete: "cascade" }),
    position: integer("position").notNull(),
    name: text("name").notNull(),
    massKg: real("mass_kg").notNull(),
  },
  (table) => [index("group_thing_trip").on(table.tripId)],
);
